import { createHash } from 'node:crypto';
import { quantity } from '@/lib/domain/money/money';
import type { BillLineValues } from '../core/plan';

function plain(text: string | null): string {
  return (text ?? '').trim().replace(/\s+/g, ' ').toUpperCase();
}

/** "10", "10.0" and "10.00" are one number. */
function plainNumber(text: string | null): string {
  return text === null ? '' : quantity(text).toFixed();
}

/**
 * Fingerprint of what a line says, independent of the file's layout, its order of columns and
 * its style of dates and numbers. Truck and unit are left out: one export prints them, the next
 * does not. Job and price are in: two lines that differ only there are two charges, and losing
 * one silently would be worse than showing one twice.
 */
export function lineFingerprint(rowKind: string, values: BillLineValues): string {
  const content = JSON.stringify([
    'bill-line-1',
    rowKind,
    values.date ?? '',
    plain(values.invoiceNumber),
    plain(values.ticketNumber),
    plain(values.jobName),
    plain(values.description),
    plain(values.itemCode),
    plainNumber(values.quantity),
    plainNumber(values.unitPrice),
    plainNumber(values.amount),
  ]);
  return createHash('sha256').update(content).digest('hex').slice(0, 32);
}

/** Fingerprint of a record that could not be read as a line. */
export function rawFingerprint(raw: string): string {
  const digest = createHash('sha256').update(`bill-raw-1\n${raw}`).digest('hex');
  return `raw-${digest.slice(0, 32)}`;
}

/** Numbers equal fingerprints in their order of appearance: "…#1", "…#2". */
export class OccurrenceCounter {
  private readonly seen = new Map<string, { count: number; firstLine: number }>();

  next(fingerprint: string, line: number): { key: string; count: number; firstLine: number } {
    const before = this.seen.get(fingerprint);
    const count = (before?.count ?? 0) + 1;
    const firstLine = before?.firstLine ?? line;
    this.seen.set(fingerprint, { count, firstLine });
    return { key: `${fingerprint}#${count}`, count, firstLine };
  }
}
