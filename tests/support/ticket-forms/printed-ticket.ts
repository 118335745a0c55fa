import type { TicketField } from '../../../importers/ocr/reading';

export type FieldText = Partial<Record<TicketField, string>>;

/** What a batching office knows about one load, and thus what its form may print. */
export interface PrintedTicket {
  /** Values in the reader's own notation: dates YYYY-MM-DD, clock times HH:MM. */
  readonly fields: FieldText;
  readonly supplierAddress: string;
  readonly customer: string;
  readonly jobAddress: string;
  readonly driver: string;
  readonly mixWords: string;
  readonly slumpIn: string;
  readonly waterAllowedGal: string;
}

/** How one form writes dates and clock times. */
export interface Notation {
  readonly date: (plainDate: string) => string;
  readonly clock: (clock: string) => string;
}

const CLOCK_FIELDS: ReadonlySet<TicketField> = new Set([
  'batchedAt',
  'arrivedAt',
  'startedAt',
  'finishedAt',
  'leftAt',
]);

/**
 * Hands a form its texts and remembers which fields were printed, so that the truth of a
 * photograph is by construction what stands on it.
 */
export class Printer {
  private readonly printed = new Set<TicketField>();

  constructor(
    readonly ticket: PrintedTicket,
    private readonly notation: Notation,
  ) {}

  /** The text of a field, or nothing where the ticket does not have it. */
  text(field: TicketField): string {
    const value = this.ticket.fields[field];
    if (value === undefined) return '';
    this.printed.add(field);
    if (field === 'date') return this.notation.date(value);
    if (CLOCK_FIELDS.has(field)) return this.notation.clock(value);
    return value;
  }

  truth(): FieldText {
    const entries = Object.entries(this.ticket.fields) as [TicketField, string][];
    return Object.fromEntries(entries.filter(([field]) => this.printed.has(field)));
  }
}

const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

function parts(plainDate: string): { year: string; month: string; day: string; name: string } {
  const [year = '', month = '', day = ''] = plainDate.split('-');
  return { year, month, day, name: MONTHS[Number(month) - 1] ?? '' };
}

/** "11/12/2026" */
export function slashedDate(plainDate: string): string {
  const { year, month, day } = parts(plainDate);
  return `${month}/${day}/${year}`;
}

/** "12/1/26" */
export function shortDate(plainDate: string): string {
  const { year, month, day } = parts(plainDate);
  return `${Number(month)}/${Number(day)}/${year.slice(2)}`;
}

/** "19-Nov-2026" */
export function dashedNameDate(plainDate: string): string {
  const { year, name, day } = parts(plainDate);
  return `${day}-${name}-${year}`;
}

/** "NOV 19, 2026" */
export function namedDate(plainDate: string): string {
  const { year, name, day } = parts(plainDate);
  return `${name.toUpperCase()} ${day}, ${year}`;
}

/** "7:05 AM" */
export function halfDayClock(clock: string): string {
  const [hours = 0, minutes = 0] = clock.split(':').map(Number);
  const half = hours < 12 ? 'AM' : 'PM';
  return `${((hours + 11) % 12) + 1}:${String(minutes).padStart(2, '0')} ${half}`;
}

/** "07:05A" */
export function terseHalfDayClock(clock: string): string {
  const [text = '', half = ''] = halfDayClock(clock).split(' ');
  return `${text.padStart(5, '0')}${half.slice(0, 1)}`;
}

export function asPrinted(text: string): string {
  return text;
}
