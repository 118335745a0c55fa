import { distance } from 'fastest-levenshtein';
import type { Rect } from './image/grey';
import { around, type Line, right } from './lines';
import type { TicketField } from './reading';
import type { Word } from './words';

/** What forms call their fields. "No", "#" and "number" are tried after each by themselves. */
const SYNONYMS: Readonly<Record<Exclude<TicketField, 'supplierName'>, readonly string[]>> = {
  ticketNumber: ['ticket', 'tkt', 'delivery ticket', 'docket', 'load ticket'],
  date: ['date', 'ticket date', 'delivery date', 'load date', 'date delivered'],
  plant: ['plant', 'batch plant', 'plant id', 'from plant'],
  truck: ['truck', 'truck id', 'mixer', 'vehicle', 'unit', 'trk'],
  orderNumber: ['order', 'order id', 'sales order', 'our order', 'ord'],
  poNumber: ['po', 'purchase order', 'customer po', 'cust po', 'your po', 'purchase order po'],
  jobName: [
    'job',
    'job name',
    'project',
    'project name',
    'job site',
    'site',
    'job description',
    'delivered to job',
  ],
  mixCode: [
    'mix',
    'mix code',
    'mix design',
    'mix id',
    'product',
    'product code',
    'design',
    'class',
  ],
  quantityYd3: [
    'this load yds',
    'this load',
    'load qty',
    'qty this load',
    'yards this load',
    'cubic yards',
    'load size',
    'load quantity',
    'quantity this load',
    'quantity',
    'qty',
    'yards',
    'yds',
    'cu yds',
    'load yards',
    'load yds',
    'conc this truck',
    'yards delivered',
    'amount',
  ],
  orderedYd3: [
    'ordered yds',
    'ordered',
    'order qty',
    'qty ordered',
    'total ordered',
    'yards ordered',
    'order quantity',
    'quantity ordered',
    'ordered qty',
    'ordered yards',
    'yds ordered',
    'total order',
  ],
  toDateYd3: [
    'delivered to date',
    'to date',
    'qty to date',
    'total delivered',
    'cumulative',
    'yards so far',
    'cumulative qty',
    'cumulative yards',
    'yards to date',
    'yds to date',
    'delivered',
    'accumulated',
    'running total',
    'delivered so far',
    'total to date',
    'quantity to date',
    'cum qty',
    'cum yds',
    'delivered yds',
  ],
  loadNumber: ['load', 'load no', 'load number', 'load count', 'truck load', 'trip'],
  batchedAt: [
    'batched',
    'batch time',
    'time batched',
    'time loaded',
    'load time',
    'loaded',
    'loaded at',
    'time',
    'batched at',
    'loading time',
    'start load',
    'ticket time',
  ],
  arrivedAt: [
    'arrived',
    'arrive job',
    'arrived job',
    'on job',
    'on site',
    'arrival',
    'at job',
    'time arrived',
    'arrive site',
    'arrived site',
    'arrival time',
    'arrive',
    'time on job',
    'arrived at job',
  ],
  startedAt: [
    'start unload',
    'begin pour',
    'start disch',
    'begin unloading',
    'pour start',
    'start discharge',
    'begin unload',
    'start pour',
    'start unloading',
    'begin discharge',
    'unload start',
    'discharge start',
    'unloading started',
    'start pouring',
    'pour started',
  ],
  finishedAt: [
    'finish unload',
    'end pour',
    'end disch',
    'end unloading',
    'pour end',
    'finish discharge',
    'end discharge',
    'finish pour',
    'finish unloading',
    'end unload',
    'unload end',
    'discharge end',
    'finished',
    'unloading finished',
    'pour finish',
    'finish pouring',
    'stop unload',
    'pour ended',
  ],
  leftAt: [
    'leave job',
    'left site',
    'departed',
    'left job',
    'leave site',
    'depart job',
    'depart',
    'time left job',
    'leaving job',
    'time left',
    'departed job',
    'depart site',
  ],
  waterAddedGal: [
    'water added gal',
    'water added',
    'gallons added',
    'gal added',
    'water added on job',
    'added water',
    'water added on site',
    'job water',
    'water added gallons',
    'gals added',
    'water added at job',
  ],
};

/** Labels of what we do not read; knowing them keeps their values from being taken for ours. */
const OTHERS = [
  'driver',
  'sold to',
  'customer',
  'customer name',
  'delivery address',
  'deliver to',
  'address',
  'ship to',
  'bill to',
  'description',
  'mix description',
  'slump',
  'water allowed',
  'water allowed gal',
  'max water',
  'added by',
  'authorized by',
  'received by',
  'signed',
  'signature',
  'material',
  'required',
  'batch',
  'unit of measure',
  'account',
  'account no',
  'customer no',
  'customer number',
  'zone',
  'usage',
  'returned',
  'return plant',
  'time due',
  'due on job',
  'age',
  'air',
  'temperature',
  'temp',
  'phone',
  'terms',
  'tax',
  'price',
  'extension',
  'subtotal',
  'total',
  'notes',
  'remarks',
  'instructions',
  'special instructions',
  'delivery instructions',
  'leave plant',
  'left plant',
  'return to plant',
  'returned to plant',
  'concrete temp',
  'air content',
  'water in truck',
  'water allowed to add',
  'revolutions',
  'rev counter',
  'uom',
  'target',
  'actual',
  'moisture',
  'caution',
  'warning',
] as const;

export interface Label {
  /** Null for a label of something that we do not read. */
  readonly field: TicketField | null;
  readonly words: readonly Word[];
  readonly box: Rect;
  readonly hasColon: boolean;
  /** 0 for an exact match; the letters that differ otherwise. */
  readonly differs: number;
  /** Letters of the synonym: of two labels for one field the longer says more. */
  readonly length: number;
}

interface Phrase {
  readonly letters: string;
  readonly field: TicketField | null;
}

function squeeze(text: string): string {
  return text.toUpperCase().replace(/[^A-Z0-9]/g, '');
}

const NUMBERED: ReadonlySet<TicketField> = new Set([
  'ticketNumber',
  'plant',
  'truck',
  'orderNumber',
  'poNumber',
  'loadNumber',
  'mixCode',
]);

const PHRASES: readonly Phrase[] = [
  ...Object.entries(SYNONYMS).flatMap(([name, synonyms]) => {
    const field = name as TicketField;
    const endings = NUMBERED.has(field) ? ['', 'no', 'number', 'num', 'nbr'] : [''];
    return synonyms.flatMap((synonym) =>
      endings.map((ending) => ({ letters: squeeze(synonym + ending), field })),
    );
  }),
  ...OTHERS.map((name) => ({ letters: squeeze(name), field: null })),
];
const BY_LETTERS = new Map(PHRASES.map((phrase) => [phrase.letters, phrase]));

/** Letters that the engine takes for one another in small capitals, each written as the first. */
const LOOKALIKES: readonly [RegExp, string][] = [
  [/[O0QD]/g, '0'],
  [/[I1LJ]/g, '1'],
  [/[S58B]/g, '5'],
];

function fold(letters: string): string {
  return LOOKALIKES.reduce((text, [from, to]) => text.replace(from, to), letters);
}

const BY_FOLD = new Map(PHRASES.map((phrase) => [fold(phrase.letters), phrase]));

function allowedDifference(length: number): number {
  if (length >= 10) return 2;
  return length >= 5 ? 1 : 0;
}

/** The phrase that some words spell, exactly or as the engine may have misread them. */
function phraseOf(words: readonly Word[]): { phrase: Phrase; differs: number } | null {
  const text = words.map((word) => word.text).join('');
  const letters = squeeze(text);
  if (letters.length < 2) return null;
  const exact = BY_LETTERS.get(letters);
  if (exact) return { phrase: exact, differs: 0 };
  // Digits alone may look like the letters of a label, but are a value.
  const folded = /^[A-Z]/.test(letters) ? BY_FOLD.get(fold(letters)) : undefined;
  if (folded) return { phrase: folded, differs: 1 };
  if (/\d{2}/.test(letters)) return null;
  let best: { phrase: Phrase; differs: number } | null = null;
  for (const phrase of PHRASES) {
    const allowed = allowedDifference(phrase.letters.length);
    if (Math.abs(phrase.letters.length - letters.length) > allowed) continue;
    const differs = distance(letters, phrase.letters);
    if (differs <= allowed && (!best || differs < best.differs)) best = { phrase, differs };
  }
  return best;
}

const MOST_WORDS = 5;

function labelAt(words: readonly Word[], from: number): Label | null {
  for (let count = Math.min(MOST_WORDS, words.length - from); count >= 1; count -= 1) {
    const some = words.slice(from, from + count);
    if (!closeTogether(some)) continue;
    const found = phraseOf(some);
    if (!found) continue;
    return {
      field: found.phrase.field,
      words: some,
      box: around(some),
      hasColon: /:\s*$/.test(some[some.length - 1]?.text ?? ''),
      differs: found.differs,
      length: found.phrase.letters.length,
    };
  }
  return null;
}

/**
 * Whether a label may begin at a word: at the head of a cell, not in the middle of a sentence
 * ("added on the job") or of a value ("North Yard"), unless a colon says that it is a label.
 */
function startsCell(words: readonly Word[], from: number, label: Label, before: LinePart): boolean {
  if (label.hasColon || before.kind === 'label') return true;
  return !closeTogether(words.slice(from - 1, from + 1));
}

function closeTogether(words: readonly Word[]): boolean {
  return words.every((word, index) => {
    const last = words[index - 1];
    if (!last) return true;
    return word.box.x - right(last.box) <= 1.3 * Math.max(last.box.height, word.box.height);
  });
}

/** A line taken apart: its labels, and the words that are none, in order from left to right. */
export type LinePart =
  | { readonly kind: 'label'; readonly label: Label }
  | { readonly kind: 'word'; readonly word: Word };

/** Finds the labels of a line; at each place the longest that fits. */
export function partsOf(line: Line): LinePart[] {
  const parts: LinePart[] = [];
  for (let at = 0; at < line.words.length; ) {
    const found = labelAt(line.words, at);
    const before = parts[parts.length - 1];
    const label = found && (!before || startsCell(line.words, at, found, before)) ? found : null;
    const word = line.words[at];
    if (label) parts.push({ kind: 'label', label });
    else if (word) parts.push({ kind: 'word', word });
    at += label ? label.words.length : 1;
  }
  return parts;
}
