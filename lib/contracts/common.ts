import { z } from 'zod';

export const uuid = z.uuid();
export const plainDate = z.iso.date();
/** Minutes after midnight of the record's date; past 1440 when the pour runs into the next day. */
export const clockMinutes = z.int().min(0).max(2879);
/** An amount or a quantity as text, "1234.50": never a binary float. */
export const decimalText = z
  .string()
  .trim()
  .regex(/^-?\d{1,12}(\.\d{1,4})?$/, 'a number such as 12.50');
export const positiveDecimalText = decimalText.refine((text) => Number(text) > 0, 'more than zero');
export const name = z.string().trim().min(1, 'needed').max(120);
export const note = z.string().trim().max(2000);
/** Trimmed before it is judged: phones add a space after a completed word. */
export const email = z
  .string()
  .trim()
  .toLowerCase()
  .pipe(z.email('an e-mail address such as name@company.com').max(254));

/** One page of a list: `rows` from `offset`, and how many there are in all. */
export const pageInput = {
  offset: z.coerce.number().int().min(0).default(0),
  limit: z.coerce.number().int().min(1).max(500).default(100),
};
export const pageOf = <Row extends z.ZodType>(row: Row) =>
  z.object({ rows: z.array(row), total: z.number().int() });

/** What every error answer looks like. */
export const failureBody = z.object({
  error: z.object({
    code: z.string(),
    /** A sentence that says what happened and what to do. */
    message: z.string(),
    issues: z.array(z.object({ path: z.string(), message: z.string() })),
  }),
});
export type FailureBody = z.infer<typeof failureBody>;

/** A file as an answer: a photo to show, or a list to download. */
export const fileAnswer = z.object({
  bytes: z.custom<Uint8Array>((value) => value instanceof Uint8Array),
  mediaType: z.string(),
  fileName: z.string(),
  inline: z.boolean(),
});
