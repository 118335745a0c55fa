'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import { ListBody, ListFoot } from '@/components/shell/list-parts';
import { sameQuery } from '@/components/shell/list-query';
import { useListFilter } from '@/components/shell/use-list-filter';
import { LinkButton } from '@/components/ui/button';
import { SelectField } from '@/components/ui/field';
import { SearchField } from '@/components/ui/search-field';
import type { listStatementsOutput } from '@/lib/contracts/statements';
import { statementsQuery } from '@/lib/queries/statements';
import { routes } from '@/lib/routes';
import { statements as words } from '@/lib/text/messages/en/statements';
import { StatementTable } from './statement-table';

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
        <ListFoot
          filter={filter}
          filtered={filtered}
          count={data ? words.count(data.total) : ''}
          words={words}
          exportAt="/api/statements/export"
        />
      </search>
      <ListBody
        filter={filter}
        filtered={filtered}
        total={data?.total}
        error={error}
        words={words}
        emptyAction={
          <LinkButton variant="primary" href={routes.importStatement()}>
            {words.import}
          </LinkButton>
        }
      >
        {data && <StatementTable rows={data.rows} filter={filter} />}
      </ListBody>
    </>
  );
}
