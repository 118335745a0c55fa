import Papa from 'papaparse';
import { z } from 'zod';
import { CHARGE_KINDS } from '../domain/facts';
import { money, quantity } from '../domain/money/money';
import { parseClock } from '../domain/time/clock-minutes';

/** A sentence about one place in one file. Rows are counted from 1, the header being row 1. */
export interface InputProblem {
  readonly file: string;
  readonly row: number | null;
  readonly column: string | null;
  readonly sentence: string;
}

export function problemText({ file, row, column, sentence }: InputProblem): string {
  const place = [
    file,
    row === null ? null : `row ${row}`,
    column === null ? null : `column ${column}`,
  ];
  return `${place.filter((part) => part !== null).join(', ')}: ${sentence}`;
}

const DECIMAL = /^-?\d{1,9}(\.\d{1,4})?$/;
const emptyToNull = (text: string | undefined) => (text?.trim() ? text.trim() : null);

const optionalText = z.string().optional().transform(emptyToNull);
const requiredText = z.string('must be given').trim().min(1, 'must be given');
const day = requiredText.regex(/^\d{4}-\d{2}-\d{2}$/, 'wants a day as YYYY-MM-DD');
const optionalDay = optionalText.refine(
  (text) => text === null || /^\d{4}-\d{2}-\d{2}$/.test(text),
  'wants a day as YYYY-MM-DD',
);
const decimalText = requiredText.regex(DECIMAL, 'wants a number such as 10.50');
const optionalDecimal = optionalText.refine(
  (text) => text === null || DECIMAL.test(text),
  'wants a number such as 10.50',
);
const yd3 = decimalText.transform((text) => quantity(text));
const optionalQuantity = optionalDecimal.transform((text) =>
  text === null ? null : quantity(text),
);
const optionalMoney = optionalDecimal.transform((text) => (text === null ? null : money(text)));
const amount = decimalText.transform((text) => money(text));
const clock = optionalText
  .refine((text) => text === null || parseClock(text) !== null, 'wants a time as HH:MM, 24-hour')
  .transform((text) => (text === null ? null : parseClock(text)));
const wholeNumber = optionalText
  .refine((text) => text === null || /^\d{1,6}$/.test(text), 'wants a whole number')
  .transform((text) => (text === null ? null : Number(text)));
const yesOrNo = optionalText
  .refine((text) => text === null || /^(yes|no)$/i.test(text), 'wants yes or no')
  .transform((text) => text?.toLowerCase() !== 'no');

export const ticketRow = z.object({
  supplier: optionalText,
  number: requiredText,
  date: day,
  mixCode: requiredText,
  quantityYd3: yd3,
  returnedYd3: optionalQuantity,
  truck: optionalText,
  plant: optionalText,
  job: optionalText,
  order: optionalText,
  load: wholeNumber,
  batchedAt: clock,
  arrivedAt: clock,
  startedAt: clock,
  finishedAt: clock,
  leftAt: clock,
});

export const pumpRow = z.object({
  supplier: optionalText,
  number: requiredText,
  date: day,
  pumpedYd3: yd3,
  setUps: wholeNumber,
  job: optionalText,
  order: optionalText,
  leftYardAt: clock,
  arrivedAt: clock,
  finishedAt: clock,
  leftAt: clock,
  backInYardAt: clock,
});

export const orderRow = z.object({
  supplier: optionalText,
  number: requiredText,
  date: day,
  orderedYd3: yd3,
  mixCode: optionalText,
  job: optionalText,
  firstTruckAt: clock,
  spacingMinutes: wholeNumber,
  taxable: yesOrNo,
});

export const billRow = z.object({
  supplier: optionalText,
  invoice: optionalText,
  date: optionalDay,
  ticket: optionalText,
  truck: optionalText,
  job: optionalText,
  charge: z.enum(CHARGE_KINDS, `wants one of ${CHARGE_KINDS.join(', ')}`),
  description: optionalText,
  mixCode: optionalText,
  quantity: optionalQuantity,
  unit: optionalText,
  unitPrice: optionalMoney,
  amount,
});

export interface Row<T> {
  readonly row: number;
  readonly value: T;
}

function headerProblems(
  file: string,
  found: readonly string[],
  known: readonly string[],
): InputProblem[] {
  const unknown = found.filter((column) => !known.includes(column));
  return unknown.map((column) => ({
    file,
    row: 1,
    column,
    sentence: `is not a column that is read here; those are ${known.join(', ')}.`,
  }));
}

/** Reads a CSV whose first row names the columns; every bad cell is a problem, none is skipped. */
export function readTable<Shape extends z.ZodRawShape>(
  file: string,
  text: string,
  schema: z.ZodObject<Shape>,
): { readonly rows: Row<z.output<z.ZodObject<Shape>>>[]; readonly problems: InputProblem[] } {
  const parsed = Papa.parse<Record<string, string>>(text.replace(/^\uFEFF/, ''), {
    header: true,
    skipEmptyLines: 'greedy',
    transformHeader: (header) => header.trim(),
  });
  const rows: Row<z.output<z.ZodObject<Shape>>>[] = [];
  const problems = headerProblems(file, parsed.meta.fields ?? [], Object.keys(schema.shape));
  for (const { row, message } of parsed.errors) {
    if (row !== undefined)
      problems.push({ file, row: row + 2, column: null, sentence: `${message}.` });
  }
  if (problems.length > 0) return { rows, problems };
  parsed.data.forEach((cells, at) => {
    const read = schema.safeParse(cells);
    if (read.success) rows.push({ row: at + 2, value: read.data });
    else {
      for (const { path, message } of read.error.issues) {
        const column = String(path[0]);
        const got = cells[column];
        const said = got ? `${message}, got "${got}".` : `${message}.`;
        problems.push({ file, row: at + 2, column, sentence: said });
      }
    }
  });
  return { rows, problems };
}
