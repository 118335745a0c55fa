import type { TicketField } from '../../../../importers/ocr/reading';
import type { Notation, Printer } from '../printed-ticket';

/** One layout of delivery ticket: its paper, its notation and its HTML. */
export interface TicketForm {
  readonly name: string;
  readonly notation: Notation;
  readonly paper: 'white' | 'canary' | 'pink';
  readonly widthPx: number;
  readonly css: string;
  html(printer: Printer): string;
}

/** A label over a printed value, as one box of a form. */
export function box(label: string, value: string, style = ''): string {
  return `<div class="box" style="${style}"><span class="label">${label}</span><span class="value">${value}</span></div>`;
}

/** A label beside a printed value, or nothing where the ticket has no value. */
export function beside(label: string, value: string): string {
  if (value === '') return '';
  return `<div class="pair"><span class="label">${label}</span><span class="value">${value}</span></div>`;
}

/** A ruled table of one row: labels as column headings. */
export function columns(printer: Printer, cells: readonly (readonly [string, TicketField])[]) {
  const headings = cells.map(([label]) => `<th>${label}</th>`).join('');
  const values = cells.map(([, field]) => `<td>${printer.text(field)}</td>`).join('');
  return `<table><tr>${headings}</tr><tr>${values}</tr></table>`;
}
