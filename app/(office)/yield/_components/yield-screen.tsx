'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import dynamic from 'next/dynamic';
import { Fragment } from 'react';
import { sameQuery } from '@/components/shell/list-query';
import { useListFilter } from '@/components/shell/use-list-filter';
import { Button } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty';
import { SelectField, TextField } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Section } from '@/components/ui/section';
import type { YieldAnswer } from '@/lib/contracts/yield';
import { yieldQuery } from '@/lib/queries/yield';
import { yieldWords as words } from '@/lib/text/messages/en/yield';
import { YieldTable } from './yield-table';

const YieldChart = dynamic(() => import('./yield-chart').then((part) => part.YieldChart), {
  ssr: false,
});

const FILTERS = ['from', 'to', 'jobId', 'supplierId'];

interface YieldScreenProps {
  first: YieldAnswer;
  firstQuery: Record<string, string>;
}

/** Which jobs ran over, and what a yard came to: a table, and the same as a chart. */
export function YieldScreen({ first, firstQuery }: YieldScreenProps) {
  const filter = useListFilter();
  const { data, error } = useQuery({
    ...yieldQuery(filter.query),
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
        data-no-print={filtered ? undefined : true}
        className="grid grid-cols-2 gap-3 px-4 py-3 md:grid-cols-[auto_auto_1fr_1fr] md:px-6"
      >
        <TextField label={words.from} type="date" {...bind('from')} />
        <TextField label={words.to} type="date" {...bind('to')} />
        <SelectField
          label={words.job}
          fieldClassName="col-span-2 md:col-span-1 md:max-w-md"
          {...bind('jobId')}
        >
          <option value="">{words.allJobs}</option>
          {data?.jobs.map((one) => (
            <option key={one.id} value={one.id}>
              {one.number} {one.name}
            </option>
          ))}
        </SelectField>
        <SelectField
          label={words.supplier}
          fieldClassName="col-span-2 md:col-span-1 md:max-w-md"
          {...bind('supplierId')}
        >
          <option value="">{words.allSuppliers}</option>
          {data?.suppliers.map((one) => (
            <option key={one.id} value={one.id}>
              {one.name}
            </option>
          ))}
        </SelectField>
        <div className="col-span-full flex flex-wrap items-center gap-x-4 gap-y-2 text-[14px]">
          <span className="text-ink-soft" role="status">
            {data ? words.count(data.rows.length) : ''}
          </span>
          {filtered && (
            <Button variant="quiet" onClick={filter.clear}>
              {words.clear}
            </Button>
          )}
          <a
            href={`/api/yield/export?${new URLSearchParams(filter.query).toString()}`}
            download
            data-no-print
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
      {data && data.rows.length === 0 && (
        <div className="px-4 md:px-6">
          <EmptyState title={filtered ? words.noneTitle : words.emptyTitle}>
            {filtered ? words.noneSays : words.emptySays}
          </EmptyState>
        </div>
      )}
      {data && data.rows.length > 0 && (
        <>
          <YieldTable data={data} filter={filter} />
          <p className="px-4 py-2 text-[13.5px] text-ink-soft md:px-6">{words.says}</p>
          <Legend />
          <Section title={words.chartTitle}>
            <YieldChart rows={data.rows} />
          </Section>
        </>
      )}
    </>
  );
}

/** What each figure says, for whoever has no pointer to hover a column's head with. */
function Legend() {
  const names = Object.keys(words.explain) as (keyof typeof words.explain)[];
  return (
    <details data-no-print className="px-4 pb-4 text-[13.5px] md:px-6">
      <summary className="inline-flex min-h-11 cursor-pointer items-center text-carbon">
        {words.explainTitle}
      </summary>
      <dl className="grid max-w-3xl gap-x-4 gap-y-1 md:grid-cols-[10rem_1fr]">
        {names.map((name) => (
          <Fragment key={name}>
            <dt className="font-semibold">{words.columns[name]}</dt>
            <dd className="text-ink-soft max-md:mb-2">{words.explain[name]}</dd>
          </Fragment>
        ))}
      </dl>
    </details>
  );
}
