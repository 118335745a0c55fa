import type { FieldValue } from './field-kind';

/** A name as printed, without what the engine made of dust at its ends. */
export function readName(text: string): FieldValue | null {
  const value = text
    .replace(/\s+/g, ' ')
    .replace(/^[^A-Za-z0-9(]+|[^A-Za-z0-9).]+$/g, '')
    .trim();
  if (!/[A-Za-z0-9]/.test(value) || value.length > 80) return null;
  return { value, repaired: false };
}

/** A job's name: at least three letters in a row, or it is some other field's value. */
export function readJobName(text: string): FieldValue | null {
  return /[A-Za-z]{3}/.test(text) ? readName(text) : null;
}
