'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import { ListBody, ListFoot } from '@/components/shell/list-parts';
import { sameQuery } from '@/components/shell/list-query';
import { useListFilter } from '@/components/shell/use-list-filter';
import { useRefreshedFindings } from '@/components/shell/use-refreshed-findings';
import { SelectField } from '@/components/ui/field';
import type { listVariancesOutput } from '@/lib/contracts/variances';
import { AGES, VARIANCE_STATUSES } from '@/lib/contracts/variances';
import { variancesQuery } from '@/lib/queries/statements';
import { moneyFigure } from '@/lib/text/format';
import { variances as words } from '@/lib/text/messages/en/statements';
import { varianceKinds } from '@/lib/text/messages/en/variance-kinds';
import { VarianceTable } from './variance-table';

const FILTERS = ['status', 'supplierId', 'kind', 'age', 'statementId'];
type Answer = z.output<typeof listVariancesOutput>;

interface VarianceListProps {
  first: Answer;
  firstQuery: Record<string, string>;
}

/** What does not agree, in dollars: by supplier, kind and age, each leading to its row. */
export function VarianceList({ first, firstQuery }: VarianceListProps) {
  const filter = useListFilter();
  useRefreshedFindings(true);
  const { data, error } = useQuery({
    ...variancesQuery(filter.query),
    placeholderData: keepPreviousData,
    ...(sameQuery(filter.query, firstQuery) ? { initialData: first } : {}),
  });
  const filtered = FILTERS.some((name) => filter.get(name) !== '');
  return (
    <>
      <Filters filter={filter} data={data} filtered={filtered} />
      <ListBody filter={filter} filtered={filtered} total={data?.total} error={error} words={words}>
        {data && <VarianceTable rows={data.rows} totals={data.totals} filter={filter} />}
      </ListBody>
    </>
  );
}

interface FiltersProps {
  filter: ReturnType<typeof useListFilter>;
  data: Answer | undefined;
  filtered: boolean;
}

function Filters({ filter, data, filtered }: FiltersProps) {
  const bind = (name: string) => ({
    value: filter.get(name),
    onChange: (event: { target: { value: string } }) => filter.set(name, event.target.value),
  });
  const counted = (text: string, group: { against: string; count: number }) =>
    `${text} (${group.count}, ${moneyFigure(group.against)})`;
  return (
    <search
      aria-label={words.title}
      className="grid grid-cols-2 gap-3 px-4 py-3 md:grid-cols-4 md:px-6"
    >
      <SelectField label={words.status} {...bind('status')}>
        <option value="">{words.statuses.unsettled}</option>
        {[...VARIANCE_STATUSES, 'all' as const].map((status) => (
          <option key={status} value={status}>
            {words.statuses[status]}
          </option>
        ))}
      </SelectField>
      <SelectField label={words.supplier} {...bind('supplierId')}>
        <option value="">{words.allSuppliers}</option>
        {data?.suppliers.map((one) => (
          <option key={one.id} value={one.id}>
            {counted(one.name, one)}
          </option>
        ))}
      </SelectField>
      <SelectField label={words.finding} {...bind('kind')}>
        <option value="">{words.allKinds}</option>
        {data?.kinds.map((one) => (
          <option key={one.kind} value={one.kind}>
            {counted(varianceKinds[one.kind], one)}
          </option>
        ))}
      </SelectField>
      <SelectField label={words.age} {...bind('age')}>
        <option value="">{words.allAges}</option>
        {AGES.map((age) => {
          const group = data?.ages.find((one) => one.age === age);
          return (
            <option key={age} value={age}>
              {group ? counted(words.ages[age], group) : words.ages[age]}
            </option>
          );
        })}
      </SelectField>
      <ListFoot
        filter={filter}
        filtered={filtered}
        count={data ? words.count(data.total) : ''}
        words={words}
        exportAt="/api/variances/export"
      />
    </search>
  );
}
