'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useListFilter } from '@/components/shell/use-list-filter';
import { EmptyState } from '@/components/ui/empty';
import { Notice } from '@/components/ui/notice';
import { Pager } from '@/components/ui/pager';
import type { TicketChoices, TicketRow } from '@/lib/contracts/tickets';
import { ticketsQuery } from '@/lib/queries/tickets';
import { tickets as words } from '@/lib/text/messages/en/tickets';
import { TicketFilters } from './ticket-filters';
import { TicketTable } from './ticket-table';

const ROWS = 100;
const FILTERS = ['status', 'supplierId', 'jobId', 'placementId', 'from', 'to', 'search'];

interface TicketListProps {
  first: { rows: TicketRow[]; total: number };
  firstQuery: Record<string, string>;
  choices: TicketChoices;
}

/** All tickets, a page at a time; filters, order and page are in the address. */
export function TicketList({ first, firstQuery, choices }: TicketListProps) {
  const filter = useListFilter();
  const isFirst =
    new URLSearchParams(filter.query).toString() === new URLSearchParams(firstQuery).toString();
  const { data, error } = useQuery({
    ...ticketsQuery(filter.query),
    placeholderData: keepPreviousData,
    ...(isFirst ? { initialData: first } : {}),
  });
  const filtered = FILTERS.some((name) => filter.get(name) !== '');
  const exported = new URLSearchParams(filter.query);
  exported.delete('offset');
  exported.delete('limit');
  return (
    <>
      <TicketFilters
        filter={filter}
        choices={choices}
        filtered={filtered}
        exportHref={`/api/tickets/export?${exported.toString()}`}
        count={data ? words.count(data.total) : ''}
      />
      {error && (
        <Notice tone="error" className="mx-4 mb-3 md:mx-6">
          {error.message}
        </Notice>
      )}
      {data && data.total === 0 && (
        <div className="px-4 md:px-6">
          <EmptyState title={filtered ? words.noneTitle : words.emptyTitle}>
            {filtered ? words.noneSays : words.emptySays}
          </EmptyState>
        </div>
      )}
      {data && data.total > 0 && (
        <>
          <TicketTable rows={data.rows} filter={filter} />
          <Pager
            offset={Number(filter.get('offset')) || 0}
            limit={Number(filter.get('limit')) || ROWS}
            total={data.total}
            onGo={(offset) => filter.set('offset', offset === 0 ? '' : String(offset))}
          />
        </>
      )}
    </>
  );
}
