import type { z } from 'zod';
import { dayIn } from '../clock';
import type { fileAnswer } from '../contracts/common';
import type { Ctx } from './context';
import { csvText } from './csv-text';

/** A column of an exported list: its title and what stands in it. */
export type CsvColumn<Row> = readonly [string, (row: Row) => string | number | null];

/** Rows as a CSV file to download, named for what it holds and the company's day. */
export function csvFile<Row>(
  ctx: Pick<Ctx, 'clock' | 'company'>,
  name: string,
  columns: readonly CsvColumn<Row>[],
  rows: readonly Row[],
): z.output<typeof fileAnswer> {
  const lines = rows.map((row) => columns.map(([, read]) => read(row)));
  return {
    bytes: new TextEncoder().encode(csvText([columns.map(([title]) => title), ...lines])),
    mediaType: 'text/csv; charset=utf-8',
    fileName: `${name}-${dayIn(ctx.company.timeZone, ctx.clock.now())}.csv`,
    inline: false,
  };
}
