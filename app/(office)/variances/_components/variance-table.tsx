'use client';

import Link from 'next/link';
import type { useListFilter } from '@/components/shell/use-list-filter';
import { Difference, MoneyFigure } from '@/components/ui/figures';
import { OnSlip } from '@/components/ui/on-slip';
import { RuledTable, Td, Th } from '@/components/ui/ruled-table';
import { SortHead } from '@/components/ui/sort-head';
import type { VarianceRow } from '@/lib/contracts/variances';
import { routes } from '@/lib/routes';
import { variances as words } from '@/lib/text/messages/en/statements';
import { varianceKinds } from '@/lib/text/messages/en/variance-kinds';

interface VarianceTableProps {
  rows: readonly VarianceRow[];
  totals: { readonly against: string; readonly inOurFavour: string };
  filter: ReturnType<typeof useListFilter>;
}

export function VarianceTable({ rows, totals, filter }: VarianceTableProps) {
  const head = { filter, standard: 'difference' };
  return (
    <RuledTable caption={words.list} slipsOnPhone>
      <thead>
        <tr>
          <SortHead sort="kind" {...head}>
            {words.columns.finding}
          </SortHead>
          <SortHead sort="supplier" {...head}>
            {words.columns.where}
          </SortHead>
          <Th>{words.columns.ticket}</Th>
          <Th align="right">{words.columns.expected}</Th>
          <Th align="right" copy="billed">
            {words.columns.billed}
          </Th>
          <SortHead sort="difference" align="right" {...head}>
            {words.columns.difference}
          </SortHead>
          <SortHead sort="age" align="right" {...head}>
            {words.columns.age}
          </SortHead>
          <Th>{words.columns.status}</Th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <Row key={row.id} row={row} />
        ))}
      </tbody>
      <tfoot>
        <tr>
          <Td colSpan={5} align="right">
            {words.against} · {words.favour}
          </Td>
          <Td align="right">
            <Difference value={totals.against} />
            <br />
            <Difference value={totals.inOurFavour} />
          </Td>
          <Td colSpan={2} />
        </tr>
      </tfoot>
    </RuledTable>
  );
}

function Row({ row }: { row: VarianceRow }) {
  return (
    <tr className="hover:bg-band">
      <Td className="md:max-w-96">
        <Link
          href={`${routes.statement(row.statementId)}?row=${encodeURIComponent(row.rowKey)}`}
          className="font-semibold"
        >
          {varianceKinds[row.kind]}
        </Link>
        <span className="block text-[13px] text-ink-soft">{row.sentence}</span>
      </Td>
      <Td>
        {row.supplierName}
        <span className="block font-code text-[13px] text-ink-soft">{row.statementNumber}</span>
      </Td>
      <Td>
        {row.jobName ?? '–'}
        {row.ticketNumber && (
          <span className="block font-code text-[13px] text-ink-soft">{row.ticketNumber}</span>
        )}
      </Td>
      <Td align="right">
        <OnSlip>{words.columns.expected}</OnSlip>
        <MoneyFigure value={row.expected} />
      </Td>
      <Td align="right" copy="billed">
        <OnSlip>{words.columns.billed}</OnSlip>
        <MoneyFigure value={row.billed} />
      </Td>
      <Td align="right">
        <OnSlip>{words.columns.difference}</OnSlip>
        <Difference value={row.difference} />
      </Td>
      <Td align="right" className="whitespace-nowrap">
        {row.ageDays < 0 ? words.notDue : words.days(row.ageDays)}
      </Td>
      <Td>
        {words.statuses[row.status]}
        {row.reason && <span className="block text-[13px] text-ink-soft">“{row.reason}”</span>}
      </Td>
    </tr>
  );
}
