import { z } from 'zod';
import { clockText, parseClock } from '@/lib/domain/time/clock-minutes';

/** A number as typed, a comma allowed; null for nothing. */
export function decimalOrNull(text: string): string | null {
  const plain = text.trim().replace(',', '.').replace(/^\./, '0.').replace(/\.$/, '');
  return plain === '' ? null : plain;
}

/** A time field's text for a moment of the day; empty for none. */
export const timeText = (minutes: number | null) => (minutes === null ? '' : clockText(minutes));
/** The moment of the day that a time field says; null for an empty one. */
export const minutesOf = (text: string) => parseClock(text);

/**
 * A form of text fields that becomes what the API takes: `fields` is the form, `asInput` its
 * translation, `target` the verb's own schema, whose complaints land on the form's fields.
 */
export function typedForm<
  Fields extends z.ZodType<Record<string, unknown>, Record<string, unknown>>,
  Target extends z.ZodType,
>(fields: Fields, target: Target, asInput: (form: z.output<Fields>) => unknown) {
  return fields.transform((form, ctx): z.output<Target> => {
    const parsed = target.safeParse(asInput(form));
    if (parsed.success) return parsed.data;
    for (const issue of parsed.error.issues) {
      const path = issue.path.map((part) => (typeof part === 'number' ? part : String(part)));
      const message = isEmptyAt(form, path) ? 'needed' : issue.message;
      ctx.addIssue({ code: 'custom', path, message });
    }
    return z.NEVER;
  });
}

function isEmptyAt(form: unknown, path: readonly (string | number)[]): boolean {
  let at: unknown = form;
  for (const key of path) {
    if (typeof at !== 'object' || at === null) return false;
    at = (at as Record<string | number, unknown>)[key];
  }
  return typeof at === 'string' && at.trim() === '';
}
