import type { TicketField } from '../reading';
import { readClock } from './clock';
import { readCode, readMixCode, readWholeNumber } from './code';
import { readDate } from './date';
import { readGallons, readYards } from './measure';
import { readJobName, readName } from './name';

/** What a field's text comes to. */
export interface FieldValue {
  readonly value: string;
  /** A character was put right on the way, so the engine's word alone is not enough. */
  readonly repaired: boolean;
}

/** Reads a field from the text of a segment; null where the text cannot be that field. */
export type FieldKind = (text: string) => FieldValue | null;

export const FIELD_KINDS: Readonly<Record<TicketField, FieldKind>> = {
  ticketNumber: readCode,
  supplierName: readName,
  date: readDate,
  plant: readName,
  truck: readCode,
  orderNumber: readCode,
  poNumber: readCode,
  jobName: readJobName,
  mixCode: readMixCode,
  quantityYd3: readYards,
  orderedYd3: readYards,
  toDateYd3: readYards,
  loadNumber: readWholeNumber,
  batchedAt: readClock,
  arrivedAt: readClock,
  startedAt: readClock,
  finishedAt: readClock,
  leftAt: readClock,
  waterAddedGal: readGallons,
};
