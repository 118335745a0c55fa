'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import { sameQuery } from '@/components/shell/list-query';
import { useListFilter } from '@/components/shell/use-list-filter';
import { Button, LinkButton } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty';
import { SelectField } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Pager } from '@/components/ui/pager';
import { SearchField } from '@/components/ui/search-field';
import type { listStatementsOutput } from '@/lib/contracts/statements';
import { statementsQuery } from '@/lib/queries/statements';
import { routes } from '@/lib/routes';
import { statements as words } from '@/lib/text/messages/en/statements';
import { StatementTable } from './statement-table';

const ROWS = 100;
const FILTERS = ['status', 'supplierId', 'search'];

interface StatementListProps {
  first: z.output<typeof listStatementsOutput>;
  firstQuery: Record<string, string>;
}

/** All statements, newest period first, a page at a time. */
export function StatementList({ first, firstQuery }: StatementListProps) {
  const filter = useListFilter();
  const { data, error } = useQuery({
    ...statementsQuery(filter.query),
    placeholderData: keepPreviousData,
    ...(sameQuery(filter.query, firstQuery) ? { initialData: first } : {}),
  });
  const filtered = FILTERS.some((name) => filter.get(name) !== '');
  const exported = new URLSearchParams(filter.query);
  exported.delete('offset');
  exported.delete('limit');
  const bind = (name: string) => ({
    value: filter.get(name),
    onChange: (event: { target: { value: string } }) => filter.set(name, event.target.value),
  });
  return (
    <>
      <search
        aria-label={words.title}
        className="grid grid-cols-2 gap-3 px-4 py-3 md:grid-cols-[1.4fr_1fr_1.2fr] md:px-6"
      >
        <SearchField
          label={words.search}
          value={filter.get('search')}
          onSearch={(text) => filter.set('search', text)}
          fieldClassName="col-span-2 md:col-span-1"
        />
        <SelectField label={words.status} {...bind('status')}>
          <option value="">{words.allStatuses}</option>
          <option value="open">{words.statuses.open}</option>
          <option value="closed">{words.statuses.closed}</option>
        </SelectField>
        <SelectField label={words.supplier} {...bind('supplierId')}>
          <option value="">{words.allSuppliers}</option>
          {data?.suppliers.map((one) => (
            <option key={one.id} value={one.id}>
              {one.name}
            </option>
          ))}
        </SelectField>
        <div className="col-span-full flex flex-wrap items-center gap-x-4 gap-y-2 text-[14px]">
          <span className="text-ink-soft" role="status">
            {data ? words.count(data.total) : ''}
          </span>
          {filtered && (
            <Button variant="quiet" onClick={filter.clear}>
              {words.clear}
            </Button>
          )}
          <a
            href={`/api/statements/export?${exported.toString()}`}
            download
            className="ml-auto inline-flex min-h-11 items-center"
          >
            {words.export}
          </a>
        </div>
      </search>
      {error && (
        <Notice tone="error" className="mx-4 mb-3 md:mx-6">
          {error.message}
        </Notice>
      )}
      {data && data.total === 0 && (
        <div className="px-4 md:px-6">
          <EmptyState
            title={filtered ? words.noneTitle : words.emptyTitle}
            action={
              filtered ? undefined : (
                <LinkButton variant="primary" href={routes.importStatement()}>
                  {words.import}
                </LinkButton>
              )
            }
          >
            {filtered ? words.noneSays : words.emptySays}
          </EmptyState>
        </div>
      )}
      {data && data.total > 0 && (
        <>
          <StatementTable rows={data.rows} filter={filter} />
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
