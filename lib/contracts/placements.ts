import { z } from 'zod';
import { ELEMENTS } from '../domain/elements';
import {
  clockMinutes,
  decimalText,
  name,
  note,
  pageInput,
  pageOf,
  plainDate,
  positiveDecimalText,
  uuid,
} from './common';

export const PLACEMENT_STATUSES = ['planned', 'poured', 'cancelled'] as const;

export const placementFields = {
  name,
  element: z.enum(ELEMENTS),
  subgrade: z.string().trim().max(80),
  pourDate: plainDate,
  firstTruckAt: clockMinutes.nullable(),
  /** From the drawing, without waste. */
  figuredYd3: positiveDecimalText,
  areaFt2: positiveDecimalText.nullable(),
  thicknessIn: positiveDecimalText.nullable(),
  wastePercent: decimalText.refine((text) => Number(text) >= 0 && Number(text) <= 50, '0 to 50'),
  notes: note,
};
export const placementRow = z.object({
  id: uuid,
  jobId: uuid,
  jobNumber: z.string(),
  jobName: z.string(),
  name: z.string(),
  element: z.enum(ELEMENTS),
  subgrade: z.string(),
  pourDate: plainDate,
  firstTruckAt: clockMinutes.nullable(),
  figuredYd3: z.string(),
  areaFt2: z.string().nullable(),
  thicknessIn: z.string().nullable(),
  wastePercent: z.string(),
  notes: z.string(),
  status: z.enum(PLACEMENT_STATUSES),
  /** Of its orders that were not cancelled; null where nothing was ordered. */
  orderedYd3: z.string().nullable(),
  /** Of its tickets, checked or not yet, that were not set aside. */
  deliveredYd3: z.string(),
  loads: z.number().int(),
});
export type PlacementRow = z.infer<typeof placementRow>;

export const listPlacementsInput = z.strictObject({ ...pageInput, jobId: uuid });
export const listPlacementsOutput = pageOf(placementRow);
export const getPlacementInput = z.strictObject({ placementId: uuid });
export const createPlacementInput = z.strictObject({ jobId: uuid, ...placementFields });
export const updatePlacementInput = z.strictObject({
  placementId: uuid,
  ...placementFields,
  status: z.enum(PLACEMENT_STATUSES),
});
