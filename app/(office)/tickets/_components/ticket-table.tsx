'use client';

import Link from 'next/link';
import type { ReactNode } from 'react';
import type { useListFilter } from '@/components/shell/use-list-filter';
import { classNames } from '@/components/ui/class-names';
import { YardsFigure } from '@/components/ui/figures';
import { RuledTable, Td, Th } from '@/components/ui/ruled-table';
import type { TICKET_SORTS, TicketRow } from '@/lib/contracts/tickets';
import { routes } from '@/lib/routes';
import { dayText, yardsFigure } from '@/lib/text/format';
import { pourDay } from '@/lib/text/messages/en/pour-day';
import { tickets as words } from '@/lib/text/messages/en/tickets';

type Filter = ReturnType<typeof useListFilter>;
/** An empty cell keeps its column in the ledger, and no line on a phone's slip. */
const NOT_ON_SLIP = 'max-md:hidden!';

type Sort = (typeof TICKET_SORTS)[number];

/** The tickets' ledger; its heads sort, the way in the address. */
export function TicketTable({ rows, filter }: { rows: TicketRow[]; filter: Filter }) {
  return (
    <RuledTable caption={words.list} slipsOnPhone>
      <thead>
        <tr>
          <SortHead sort="date" filter={filter}>
            {words.columns.date}
          </SortHead>
          <SortHead sort="number" filter={filter}>
            {words.columns.number}
          </SortHead>
          <SortHead sort="supplier" filter={filter}>
            {words.columns.supplier}
          </SortHead>
          <SortHead sort="job" filter={filter}>
            {words.columns.job}
          </SortHead>
          <Th>{words.columns.placement}</Th>
          <Th>{words.columns.mix}</Th>
          <Th>{words.columns.truck}</Th>
          <SortHead sort="quantity" filter={filter} align="right" copy="delivered">
            {words.columns.yards}
          </SortHead>
          <SortHead sort="status" filter={filter}>
            {words.columns.status}
          </SortHead>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <Row key={row.id} row={row} />
        ))}
      </tbody>
    </RuledTable>
  );
}

function Row({ row }: { row: TicketRow }) {
  const { reading } = row;
  const truck = row.truck ?? reading?.truck;
  const aside = row.status === 'rejected';
  return (
    <tr className={classNames('hover:bg-band', aside && 'text-ink-soft line-through')}>
      <Td className="whitespace-nowrap">{dayText(row.date)}</Td>
      <Td>
        <Link
          href={routes.ticket(row.id)}
          className="inline-block py-1 font-code font-semibold md:py-0"
        >
          {row.number || reading?.number || words.noNumber}
        </Link>
        {row.hasPhoto && <span className="text-[12.5px] text-ink-soft"> {words.photo}</span>}
      </Td>
      <Td className={row.supplierName ? undefined : NOT_ON_SLIP}>{row.supplierName ?? '–'}</Td>
      <Td>
        {row.jobNumber} {row.jobName}
      </Td>
      <Td className={row.placementName ? undefined : NOT_ON_SLIP}>{row.placementName ?? '–'}</Td>
      <Td className={classNames('font-code text-[13.5px]', !row.mixCode && NOT_ON_SLIP)}>
        {row.mixCode || '–'}
      </Td>
      <Td className={truck ? undefined : NOT_ON_SLIP}>{truck ?? '–'}</Td>
      <Td align="right" copy="delivered">
        {row.quantityYd3 === null && reading?.quantityYd3 ? (
          <span className="text-ink-soft">{words.read(reading.quantityYd3)}</span>
        ) : (
          <YardsFigure value={row.quantityYd3} unit={false} />
        )}
        <span className="md:hidden"> yd³</span>
        {row.returnedYd3 !== null && Number(row.returnedYd3) > 0 && (
          <span className="block text-[12.5px]">
            {words.returned(yardsFigure(row.returnedYd3))}
          </span>
        )}
      </Td>
      <Td>
        <Status row={row} />
      </Td>
    </tr>
  );
}

function Status({ row }: { row: TicketRow }) {
  if (row.status !== 'toCheck') {
    return (
      <span className={row.status === 'confirmed' ? 'text-moss' : undefined}>
        {pourDay.states[row.status]}
      </span>
    );
  }
  const { reading } = row;
  const more =
    reading?.state === 'failed'
      ? words.unreadable
      : reading?.state === 'read'
        ? reading.doubtful > 0
          ? pourDay.lookAt(reading.doubtful)
          : pourDay.allClear
        : words.unread;
  return (
    <span>
      <span className="font-semibold text-keel">{pourDay.states.toCheck}</span>
      {reading && <span className="block text-[12.5px] text-ink-soft">{more}</span>}
    </span>
  );
}

interface SortHeadProps {
  sort: Sort;
  filter: Filter;
  align?: 'right';
  copy?: 'delivered';
  children: ReactNode;
}

function SortHead({ sort, filter, align, copy, children }: SortHeadProps) {
  const current = (filter.get('sort') || 'date') === sort;
  const way = filter.get('direction') || 'down';
  const nextWay = current && way === 'down' ? 'up' : 'down';
  return (
    <Th
      aria-sort={current ? (way === 'down' ? 'descending' : 'ascending') : undefined}
      {...(align ? { align } : {})}
      {...(copy ? { copy } : {})}
    >
      <button
        type="button"
        className="-my-1 py-1 font-semibold hover:text-ink"
        onClick={() => filter.setAll({ sort, direction: nextWay })}
      >
        {children}
        <span aria-hidden> {current ? (way === 'down' ? '▼' : '▲') : ''}</span>
      </button>
    </Th>
  );
}
