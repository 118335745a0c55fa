'use client';

import Link from 'next/link';
import type { useListFilter } from '@/components/shell/use-list-filter';
import { Difference, MoneyFigure } from '@/components/ui/figures';
import { RuledTable, Td, Th } from '@/components/ui/ruled-table';
import { SortHead } from '@/components/ui/sort-head';
import type { StatementRow } from '@/lib/contracts/statements';
import { routes } from '@/lib/routes';
import { periodText } from '@/lib/text/format';
import { statements as words } from '@/lib/text/messages/en/statements';

interface StatementTableProps {
  rows: readonly StatementRow[];
  filter: ReturnType<typeof useListFilter>;
}

export function StatementTable({ rows, filter }: StatementTableProps) {
  const head = { filter, standard: 'period' };
  return (
    <RuledTable caption={words.list} slipsOnPhone>
      <thead>
        <tr>
          <SortHead sort="supplier" {...head}>
            {words.columns.supplier}
          </SortHead>
          <SortHead sort="number" {...head}>
            {words.columns.number}
          </SortHead>
          <SortHead sort="period" {...head}>
            {words.columns.period}
          </SortHead>
          <Th>{words.columns.settled}</Th>
          <SortHead sort="billed" align="right" copy="billed" {...head}>
            {words.columns.billed}
          </SortHead>
          <SortHead sort="against" align="right" {...head}>
            {words.columns.against}
          </SortHead>
          <Th>{words.columns.status}</Th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={row.id} className="hover:bg-band">
            <Td>
              <Link href={routes.statement(row.id)} className="font-semibold">
                {row.supplierName}
              </Link>
            </Td>
            <Td className="font-code">{row.number}</Td>
            <Td>{periodText(row.periodStart, row.periodEnd)}</Td>
            <Td>
              <Settled row={row} />
            </Td>
            <Td align="right" copy="billed">
              <MoneyFigure value={row.billed} />
            </Td>
            <Td align="right">
              <Difference value={row.against} />
            </Td>
            <Td className={row.status === 'closed' ? 'text-moss' : 'font-semibold'}>
              {words.statuses[row.status]}
            </Td>
          </tr>
        ))}
      </tbody>
    </RuledTable>
  );
}

/** How far the strike-off line has come, as figures and as a line. */
function Settled({ row }: { row: StatementRow }) {
  const share = row.lines === 0 ? 0 : (100 * row.settled) / row.lines;
  return (
    <span className="inline-grid min-w-24 gap-1">
      <span>{words.settledOf(row.settled, row.lines)}</span>
      <span aria-hidden className="block h-1 bg-cured">
        <span className="block h-1 bg-carbon" style={{ width: `${share}%` }} />
      </span>
    </span>
  );
}
