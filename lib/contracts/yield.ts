import { z } from 'zod';
import { COST_PARTS } from '../domain/yield/summary';
import { plainDate, uuid } from './common';

export const YIELD_SORTS = ['overrun', 'job', 'cost', 'delivered', 'waiting'] as const;

const filters = {
  /** Pour days; both count. */
  from: plainDate.optional(),
  to: plainDate.optional(),
  jobId: uuid.optional(),
  /** Only placements that this supplier brought concrete or a pump to, with all of their figures. */
  supplierId: uuid.optional(),
  sort: z.enum(YIELD_SORTS).default('overrun'),
  direction: z.enum(['up', 'down']).default('down'),
};
export const listYieldInput = z.strictObject(filters);

const figure = z.string().nullable();

/**
 * Where the cost comes from: bills, the rate sheets where nothing is billed yet, or both; `none`
 * where neither says anything.
 */
export const COST_SOURCES = ['billed', 'expected', 'both', 'none'] as const;

const figures = {
  loads: z.number().int(),
  figuredYd3: figure,
  orderedYd3: figure,
  deliveredYd3: z.string(),
  returnedYd3: z.string(),
  billedYd3: figure,
  /** Delivered − returned − figured. */
  overrunYd3: figure,
  /** The same as a share of the figured yards: "0.0525". */
  overrunShare: figure,
  /** Area-weighted over the placements that say how thick they were to be. */
  plannedThicknessIn: figure,
  impliedThicknessIn: figure,
  timedLoads: z.number().int(),
  onSiteMinutes: z.number().int(),
  minutesPerLoad: figure,
  minutesPerYd3: figure,
  cost: z.string(),
  costPerYd3: figure,
  costParts: z.array(
    z.object({ part: z.enum(COST_PARTS), amount: z.string(), perYd3: z.string().nullable() }),
  ),
  costFrom: z.enum(COST_SOURCES),
  /** Loads and pump tickets neither billed nor on a rate sheet: the cost is without them. */
  unpriced: z.number().int(),
  /** Too few loads to read anything into. */
  smallSample: z.boolean(),
};
export const yieldFigures = z.object(figures);
export type YieldFigures = z.infer<typeof yieldFigures>;

export const yieldPlacement = z.object({
  placementId: uuid,
  name: z.string(),
  pourDate: plainDate,
  ...figures,
});

export const yieldJob = z.object({
  jobId: uuid,
  jobNumber: z.string(),
  jobName: z.string(),
  ...figures,
  placements: z.array(yieldPlacement),
});
export type YieldJob = z.infer<typeof yieldJob>;

export const listYieldOutput = z.object({
  rows: z.array(yieldJob),
  totals: yieldFigures,
  jobs: z.array(z.object({ id: uuid, number: z.string(), name: z.string() })),
  /** Those who deliver concrete or pump it. */
  suppliers: z.array(z.object({ id: uuid, name: z.string() })),
});
export type YieldAnswer = z.infer<typeof listYieldOutput>;
