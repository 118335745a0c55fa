import { distance } from 'fastest-levenshtein';
import type { PlainDate } from '../time/clock-minutes';
import { MAX_LOAD_YD3 } from './limits';

/** One field as the reader found it. */
export interface FieldRead<Box> {
  readonly value: string;
  readonly doubtful: boolean;
  readonly box: Box | null;
}

/** What is known about the pour that the ticket belongs to. */
export interface PourContext {
  readonly pourDate: PlainDate;
  readonly suppliers: readonly { readonly id: string; readonly name: string }[];
  readonly orders: readonly {
    readonly id: string;
    readonly number: string;
    readonly supplierReference: string;
    readonly supplierId: string;
    readonly mixCodes: readonly string[];
  }[];
}

/** The ticket's fields that a reading gives as they stand on the paper. */
const TAKEN_AS_READ = {
  number: 'ticketNumber',
  date: 'date',
  plant: 'plant',
  truck: 'truck',
  mixCode: 'mixCode',
  quantityYd3: 'quantityYd3',
  orderedYd3: 'orderedYd3',
  toDateYd3: 'toDateYd3',
  loadNumber: 'loadNumber',
  batchedAt: 'batchedAt',
  arrivedAt: 'arrivedAt',
  startedAt: 'startedAt',
  finishedAt: 'finishedAt',
  leftAt: 'leftAt',
  waterAddedGal: 'waterAddedGal',
} as const;

type TakenField = keyof typeof TAKEN_AS_READ;
export type TicketField = TakenField | 'supplierId';
export type ReadName = (typeof TAKEN_AS_READ)[TakenField] | 'supplierName' | 'orderNumber';

export interface TicketSuggestion<Box> {
  readonly values: Partial<Record<TicketField, string>>;
  readonly orderId: string | null;
  readonly doubtful: TicketField[];
  readonly boxes: Partial<Record<TicketField, Box>>;
}

/** Without these a ticket says nothing: when the reader lacks one, a person has to look. */
const NEEDED: readonly TicketField[] = ['number', 'supplierId', 'quantityYd3'];

/**
 * What a reading would put into a ticket, and which fields a person has to look at: those that
 * the reader doubts, those that it lacks, and those that do not fit the pour's orders and day.
 */
export function suggestTicket<Box>(
  read: Partial<Record<ReadName, FieldRead<Box>>>,
  context: PourContext,
): TicketSuggestion<Box> {
  const values: Partial<Record<TicketField, string>> = {};
  const boxes: Partial<Record<TicketField, Box>> = {};
  const doubtful = new Set<TicketField>();
  for (const [field, name] of Object.entries(TAKEN_AS_READ) as [TakenField, ReadName][]) {
    const found = read[name];
    if (!found) continue;
    values[field] = found.value;
    if (found.box) boxes[field] = found.box;
    if (found.doubtful) doubtful.add(field);
  }
  const supplier = supplierOf(read.supplierName, context);
  if (supplier.id) values.supplierId = supplier.id;
  if (supplier.doubtful) doubtful.add('supplierId');
  if (read.supplierName?.box) boxes.supplierId = read.supplierName.box;
  values.date ??= context.pourDate;
  if (daysBetween(values.date, context.pourDate) > 1) doubtful.add('date');
  if (Number(values.quantityYd3) > MAX_LOAD_YD3) doubtful.add('quantityYd3');
  for (const field of NEEDED) if (!values[field]) doubtful.add(field);
  const order = orderOf(read.orderNumber?.value, values, context);
  const mixes = order?.mixCodes ?? [];
  if (values.mixCode && mixes.length > 0 && !mixes.map(bare).includes(bare(values.mixCode))) {
    doubtful.add('mixCode');
  }
  return { values, orderId: order?.id ?? null, doubtful: [...doubtful], boxes };
}

/** Letters and digits only, in one case: how two spellings of one thing are compared. */
function bare(text: string): string {
  return text.toUpperCase().replace(/[^A-Z0-9]/g, '');
}

/** A firm's name without its legal form, which tickets print and people leave out. */
function bareName(name: string): string {
  return bare(name.replace(/\b(inc|llc|ltd|co|corp|company)\b\.?/gi, ''));
}

const SAME_NAME = 0.9;
const LIKELY_NAME = 0.7;

function supplierOf(
  read: FieldRead<unknown> | undefined,
  context: PourContext,
): { id: string | null; doubtful: boolean } {
  const ordered = new Set(context.orders.map((order) => order.supplierId));
  const onlyOrdered = ordered.size === 1 ? ([...ordered][0] ?? null) : null;
  if (!read) return { id: onlyOrdered, doubtful: onlyOrdered === null };
  const wanted = bareName(read.value);
  const ranked = context.suppliers
    .map(({ id, name }) => ({ id, likeness: likeness(wanted, bareName(name)) }))
    .sort((a, b) => b.likeness - a.likeness || a.id.localeCompare(b.id));
  const best = ranked[0];
  if (!best || best.likeness < LIKELY_NAME) return { id: onlyOrdered, doubtful: true };
  const unexpected = ordered.size > 0 && !ordered.has(best.id);
  return { id: best.id, doubtful: read.doubtful || unexpected || best.likeness < SAME_NAME };
}

/** 1 for the same text, 0 for nothing in common. */
function likeness(a: string, b: string): number {
  const longer = Math.max(a.length, b.length);
  return longer === 0 ? 0 : 1 - distance(a, b) / longer;
}

function orderOf(
  number: string | undefined,
  values: Partial<Record<TicketField, string>>,
  context: PourContext,
): PourContext['orders'][number] | null {
  const ofSupplier = context.orders.filter((order) => order.supplierId === values.supplierId);
  const wanted = bare(number ?? '');
  const named = ofSupplier.filter(
    (order) =>
      wanted !== '' && [bare(order.number), bare(order.supplierReference)].includes(wanted),
  );
  const mix = bare(values.mixCode ?? '');
  const ofMix = ofSupplier.filter((order) => mix !== '' && order.mixCodes.map(bare).includes(mix));
  for (const choice of [named, ofSupplier, ofMix]) {
    if (choice.length === 1) return choice[0] ?? null;
  }
  return null;
}

function daysBetween(a: PlainDate, b: PlainDate): number {
  return Math.abs(Date.parse(`${a}T00:00Z`) - Date.parse(`${b}T00:00Z`)) / 86_400_000;
}
