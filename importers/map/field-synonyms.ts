import type { TargetField } from '../core/layout';

/** Titles that suppliers' exports give to each field, normalised; the first is the plainest. */
const SYNONYMS: Readonly<Record<TargetField, readonly string[]>> = {
  date: [
    'date',
    'ticket date',
    'delivery date',
    'deliv date',
    'ship date',
    'shipped',
    'service date',
    'invoice date',
    'inv date',
    'trans date',
    'transaction date',
    'tran date',
    'tkt date',
    'doc date',
    'posting date',
    'work date',
    'datum',
    'date delivered',
    'delivered on',
  ],
  ticketNumber: [
    'ticket',
    'ticket number',
    'ticket no',
    'tkt',
    'tkt no',
    'tkt number',
    'delivery ticket',
    'delivery no',
    'delivery number',
    'load ticket',
    'slip',
    'slip no',
    'bol',
    'bill of lading',
    'docket',
    'docket no',
    'job ticket',
    'pump ticket',
  ],
  invoiceNumber: [
    'invoice',
    'invoice number',
    'invoice no',
    'inv',
    'inv no',
    'inv number',
    'document',
    'document no',
    'document number',
    'doc no',
    'reference',
    'ref',
    'ref no',
    'reference no',
    'bill no',
  ],
  jobName: [
    'job',
    'job name',
    'job site',
    'jobsite',
    'project',
    'project name',
    'site',
    'delivery address',
    'deliver to',
    'delivered to',
    'ship to',
    'address',
    'job address',
    'job description',
    'location',
    'job no',
    'job number',
    'po job',
  ],
  truck: ['truck', 'truck no', 'truck number', 'trk', 'unit no', 'vehicle', 'mixer', 'pump unit'],
  description: [
    'description',
    'desc',
    'item description',
    'product description',
    'product',
    'material',
    'charge',
    'charge type',
    'service',
    'details',
    'detail',
    'transaction',
    'type',
    'line description',
    'memo',
    'mix description',
    'item name',
    'activity',
  ],
  mixCode: [
    'mix',
    'mix code',
    'mix no',
    'mix design',
    'mix id',
    'item',
    'item code',
    'item no',
    'product code',
    'product no',
    'prod code',
    'code',
    'sku',
    'material code',
  ],
  quantity: [
    'quantity',
    'qty',
    'yards',
    'yds',
    'yd',
    'cy',
    'cubic yards',
    'cu yds',
    'cu yd',
    'yardage',
    'units',
    'hours',
    'hrs',
    'qty delivered',
    'qty shipped',
    'delivered',
    'quantity delivered',
    'yd3',
  ],
  unit: ['unit', 'uom', 'u m', 'um', 'unit of measure', 'units of measure', 'measure'],
  unitPrice: [
    'unit price',
    'price',
    'rate',
    'unit cost',
    'cost',
    'price per unit',
    'price yd',
    'price per yard',
    'price each',
    'unit rate',
    'u price',
  ],
  amount: [
    'amount',
    'extension',
    'ext',
    'ext amount',
    'extended',
    'extended amount',
    'extended price',
    'ext price',
    'line total',
    'line amount',
    'total',
    'charges',
    'debit',
    'debits',
    'amt',
    'net amount',
    'total amount',
    'invoice amount',
    'charge amount',
  ],
  creditAmount: [
    'credit',
    'credits',
    'credit amount',
    'payments',
    'payment',
    'payments credits',
    'credits payments',
    'payment credit',
    'payments and credits',
  ],
  taxAmount: ['tax', 'sales tax', 'tax amount', 'tax amt'],
  balance: ['balance', 'running balance', 'balance due', 'open balance', 'amount due', 'bal'],
};

const EXACT = new Map<string, TargetField>(
  (Object.keys(SYNONYMS) as TargetField[]).flatMap((field) =>
    SYNONYMS[field].map((title): [string, TargetField] => [title, field]),
  ),
);

/** "Ticket #" → "ticket no"; "Ext. Amount ($)" → "ext amount". */
export function normaliseTitle(title: string): string {
  return title
    .toLowerCase()
    .replace(/#/g, ' no ')
    .replace(/³/g, '3')
    .replace(/[^a-z0-9]+/g, ' ')
    .trim()
    .replace(/\bnum\b|\bnbr\b/g, 'no')
    .replace(/ +/g, ' ');
}

export interface TitleMatch {
  readonly field: TargetField;
  /** True where the whole title is a known one; else a known one is contained in it. */
  readonly exact: boolean;
  /** Length of the known title that was found: the longer says more. */
  readonly weight: number;
  /** True where it stands at the end: in "Mix Price" the price is what is meant. */
  readonly last: boolean;
}

/** What a column's title says that it holds, best first. */
export function titleMatches(title: string): TitleMatch[] {
  const wanted = normaliseTitle(title);
  if (wanted === '') return [];
  const exact = EXACT.get(wanted);
  if (exact) return [{ field: exact, exact: true, weight: wanted.length, last: true }];
  const padded = ` ${wanted} `;
  const best = new Map<TargetField, number>();
  const endings = new Set<TargetField>();
  for (const [synonym, field] of EXACT) {
    if (!padded.includes(` ${synonym} `)) continue;
    if (padded.endsWith(` ${synonym} `)) endings.add(field);
    best.set(field, Math.max(best.get(field) ?? 0, synonym.length));
  }
  return [...best]
    .map(([field, weight]) => ({ field, exact: false, weight, last: endings.has(field) }))
    .sort((left, right) => right.weight - left.weight || (left.field < right.field ? -1 : 1));
}

/** How far from the plainest title of its field this one is; 0 for the plainest. */
export function synonymRank(title: string): number {
  const wanted = normaliseTitle(title);
  const field = EXACT.get(wanted);
  return field === undefined ? 0 : SYNONYMS[field].indexOf(wanted);
}

/** How many different fields the cells name, were they a row of titles. */
export function recognisedTitles(cells: readonly string[]): number {
  const fields = new Set<TargetField>();
  for (const cell of cells) {
    if (cell.length > 40) continue;
    const exact = EXACT.get(normaliseTitle(cell));
    if (exact) fields.add(exact);
  }
  return fields.size;
}
