'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import Link from 'next/link';
import { useListFilter } from '@/components/shell/use-list-filter';
import { EmptyState } from '@/components/ui/empty';
import { SelectField, TextField } from '@/components/ui/field';
import { YardsFigure } from '@/components/ui/figures';
import { Notice } from '@/components/ui/notice';
import { Pager } from '@/components/ui/pager';
import { RuledTable, Td, Th } from '@/components/ui/ruled-table';
import { SearchField } from '@/components/ui/search-field';
import { useWhere } from '@/components/ui/where';
import type { PumpTicketRow } from '@/lib/contracts/pump-tickets';
import type { TicketChoices } from '@/lib/contracts/tickets';
import { pumpTicketsQuery } from '@/lib/queries/tickets';
import { routes } from '@/lib/routes';
import { clockFigure, dayText } from '@/lib/text/format';
import { tickets as words } from '@/lib/text/messages/en/tickets';

const ROWS = 100;

interface PumpListProps {
  first: { rows: PumpTicketRow[]; total: number };
  firstQuery: Record<string, string>;
  choices: TicketChoices;
}

/** The pump tickets, a page at a time; filters and page are in the address. */
export function PumpList({ first, firstQuery, choices }: PumpListProps) {
  const filter = useListFilter();
  const isFirst =
    new URLSearchParams(filter.query).toString() === new URLSearchParams(firstQuery).toString();
  const { data, error } = useQuery({
    ...pumpTicketsQuery(filter.query),
    placeholderData: keepPreviousData,
    ...(isFirst ? { initialData: first } : {}),
  });
  const filtered = Object.keys(filter.query).length > 0;
  return (
    <>
      <PumpFilters filter={filter} choices={choices} />
      {error && (
        <Notice tone="error" className="mx-4 mb-3 md:mx-6">
          {error.message}
        </Notice>
      )}
      {data && data.total === 0 && (
        <div className="px-4 md:px-6">
          <EmptyState title={filtered ? words.noneTitle : words.emptyPumpTitle}>
            {filtered ? words.noneSays : words.emptyPumpSays}
          </EmptyState>
        </div>
      )}
      {data && data.total > 0 && (
        <>
          <PumpTable rows={data.rows} />
          <Pager
            offset={Number(filter.get('offset')) || 0}
            limit={ROWS}
            total={data.total}
            onGo={(offset) => filter.set('offset', offset === 0 ? '' : String(offset))}
          />
        </>
      )}
    </>
  );
}

interface PumpFiltersProps {
  filter: ReturnType<typeof useListFilter>;
  choices: TicketChoices;
}

function PumpFilters({ filter, choices }: PumpFiltersProps) {
  const bind = (name: string) => ({
    value: filter.get(name),
    onChange: (event: { target: { value: string } }) => filter.set(name, event.target.value),
  });
  return (
    <search
      aria-label={words.pumpTitle}
      className="grid grid-cols-2 gap-3 px-4 py-3 md:grid-cols-[1fr_1.2fr_1.2fr_auto_auto] md:px-6"
    >
      <SearchField
        label={words.searchNumber}
        value={filter.get('search')}
        onSearch={(text) => filter.set('search', text)}
        fieldClassName="col-span-2 md:col-span-1"
      />
      <SelectField label={words.supplier} {...bind('supplierId')}>
        <option value="">{words.allSuppliers}</option>
        {choices.suppliers
          .filter((one) => one.kind === 'pump')
          .map((one) => (
            <option key={one.id} value={one.id}>
              {one.name}
            </option>
          ))}
      </SelectField>
      <SelectField label={words.job} {...bind('jobId')}>
        <option value="">{words.allJobs}</option>
        {choices.jobs.map((one) => (
          <option key={one.id} value={one.id}>
            {one.number} {one.name}
          </option>
        ))}
      </SelectField>
      <TextField label={words.from} type="date" {...bind('from')} />
      <TextField label={words.to} type="date" {...bind('to')} />
    </search>
  );
}

function PumpTable({ rows }: { rows: PumpTicketRow[] }) {
  const { clock } = useWhere();
  const time = (minutes: number | null) => (minutes === null ? '?' : clockFigure(minutes, clock));
  return (
    <RuledTable caption={words.pumpTitle} slipsOnPhone>
      <thead>
        <tr>
          <Th>{words.columns.date}</Th>
          <Th>{words.columns.number}</Th>
          <Th>{words.columns.supplier}</Th>
          <Th>{words.columns.job}</Th>
          <Th>{words.columns.onSite}</Th>
          <Th align="right" copy="delivered">
            {words.columns.pumped}
          </Th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={row.id} className="hover:bg-band">
            <Td className="whitespace-nowrap">{dayText(row.date)}</Td>
            <Td>
              <Link
                href={routes.pumpTicket(row.id)}
                className="inline-block py-1 font-code font-semibold md:py-0"
              >
                {row.number}
              </Link>
            </Td>
            <Td>{row.supplierName}</Td>
            <Td>
              {row.jobNumber} {row.jobName}
            </Td>
            <Td className="whitespace-nowrap">
              {time(row.arrivedAt)} – {time(row.leftAt)}
            </Td>
            <Td align="right" copy="delivered">
              <YardsFigure value={row.pumpedYd3} unit={false} />
              <span className="md:hidden"> yd³</span>
            </Td>
          </tr>
        ))}
      </tbody>
    </RuledTable>
  );
}
