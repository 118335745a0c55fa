'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import Link from 'next/link';
import type { z } from 'zod';
import { ListBody } from '@/components/shell/list-parts';
import { sameQuery } from '@/components/shell/list-query';
import { useListFilter } from '@/components/shell/use-list-filter';
import { Button } from '@/components/ui/button';
import { SelectField } from '@/components/ui/field';
import { YardsFigure } from '@/components/ui/figures';
import { OnSlip } from '@/components/ui/on-slip';
import { RuledTable, Td, Th } from '@/components/ui/ruled-table';
import { SearchField } from '@/components/ui/search-field';
import { StatusText } from '@/components/ui/status-text';
import type { JobRow, listJobsOutput } from '@/lib/contracts/jobs';
import { jobsQuery } from '@/lib/queries/jobs';
import { routes } from '@/lib/routes';
import { jobWords as words } from '@/lib/text/messages/en/jobs';

interface JobListProps {
  first: z.output<typeof listJobsOutput>;
  firstQuery: Record<string, string>;
}

/** All jobs with their yards, a page at a time. */
export function JobList({ first, firstQuery }: JobListProps) {
  const filter = useListFilter();
  const { data, error } = useQuery({
    ...jobsQuery(filter.query),
    placeholderData: keepPreviousData,
    ...(sameQuery(filter.query, firstQuery) ? { initialData: first } : {}),
  });
  const filtered = filter.get('status') !== '' || filter.get('search') !== '';
  return (
    <>
      <search
        aria-label={words.title}
        className="grid grid-cols-2 gap-3 px-4 py-3 md:grid-cols-[1fr_14rem_auto] md:items-end md:px-6"
      >
        <SearchField
          label={words.search}
          value={filter.get('search')}
          onSearch={(text) => filter.set('search', text)}
        />
        <SelectField
          label={words.status}
          value={filter.get('status')}
          onChange={(event) => filter.set('status', event.target.value)}
        >
          <option value="">{words.all}</option>
          <option value="open">{words.statuses.open}</option>
          <option value="finished">{words.statuses.finished}</option>
        </SelectField>
        <div className="col-span-full flex flex-wrap items-center gap-4 text-[14px] md:col-span-1 md:min-h-9">
          <span className="text-ink-soft" role="status">
            {data ? words.count(data.total) : ''}
          </span>
          {filtered && (
            <Button variant="quiet" onClick={filter.clear}>
              {words.clear}
            </Button>
          )}
        </div>
      </search>
      <ListBody filter={filter} filtered={filtered} total={data?.total} error={error} words={words}>
        {data && <JobTable rows={data.rows} />}
      </ListBody>
    </>
  );
}

function JobTable({ rows }: { rows: readonly JobRow[] }) {
  const { columns } = words;
  return (
    <RuledTable caption={words.list} slipsOnPhone>
      <thead>
        <tr>
          <Th>{columns.number}</Th>
          <Th>{columns.name}</Th>
          <Th>{columns.customer}</Th>
          <Th>{columns.crew}</Th>
          <Th align="right">{columns.figured}</Th>
          <Th align="right" copy="ordered">
            {columns.ordered}
          </Th>
          <Th align="right" copy="delivered">
            {columns.delivered}
          </Th>
          <Th>{columns.status}</Th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={row.id} className="hover:bg-band">
            <Td className="font-code">{row.number}</Td>
            <Td>
              <Link href={routes.job(row.id)} className="font-semibold">
                {row.name}
              </Link>
            </Td>
            <Td>{row.customer || '–'}</Td>
            <Td>{row.crew.map((one) => one.name).join(', ') || words.noCrew}</Td>
            <Td align="right">
              <OnSlip>{columns.figured}</OnSlip>
              <YardsFigure value={row.figuredYd3} />
            </Td>
            <Td align="right" copy="ordered">
              <OnSlip>{columns.ordered}</OnSlip>
              <YardsFigure value={row.orderedYd3} />
            </Td>
            <Td align="right" copy="delivered">
              <OnSlip>{columns.delivered}</OnSlip>
              <YardsFigure value={row.deliveredYd3} />
            </Td>
            <Td>
              <StatusText look={row.status === 'open' ? 'waiting' : 'done'}>
                {words.statuses[row.status]}
              </StatusText>
            </Td>
          </tr>
        ))}
      </tbody>
    </RuledTable>
  );
}
