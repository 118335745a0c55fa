'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { z } from 'zod';
import { ListBody, ListFoot } from '@/components/shell/list-parts';
import { sameQuery } from '@/components/shell/list-query';
import { useListFilter } from '@/components/shell/use-list-filter';
import { Button } from '@/components/ui/button';
import { SelectField, TextField } from '@/components/ui/field';
import { SearchField } from '@/components/ui/search-field';
import type { listOrdersOutput } from '@/lib/contracts/orders';
import { ORDER_STATUSES } from '@/lib/contracts/orders';
import type { TicketChoices } from '@/lib/contracts/tickets';
import { ordersQuery } from '@/lib/queries/jobs';
import { orderWords as words } from '@/lib/text/messages/en/jobs';
import { OrderTable } from '../../_components/order-table';

const FILTERS = ['status', 'supplierId', 'jobId', 'placementId', 'from', 'to', 'search'];

interface OrderListProps {
  first: z.output<typeof listOrdersOutput>;
  firstQuery: Record<string, string>;
  choices: TicketChoices;
}

/** All orders, the latest day first. */
export function OrderList({ first, firstQuery, choices }: OrderListProps) {
  const filter = useListFilter();
  const { data, error } = useQuery({
    ...ordersQuery(filter.query),
    placeholderData: keepPreviousData,
    ...(sameQuery(filter.query, firstQuery) ? { initialData: first } : {}),
  });
  const filtered = FILTERS.some((name) => filter.get(name) !== '');
  return (
    <>
      <Filters
        filter={filter}
        choices={choices}
        filtered={filtered}
        count={data ? words.count(data.total) : ''}
      />
      <ListBody filter={filter} filtered={filtered} total={data?.total} error={error} words={words}>
        {data && <OrderTable rows={data.rows} empty={words.emptyTitle} />}
      </ListBody>
    </>
  );
}

interface FiltersProps {
  filter: ReturnType<typeof useListFilter>;
  choices: TicketChoices;
  filtered: boolean;
  count: string;
}

function Filters({ filter, choices, filtered, count }: FiltersProps) {
  const [open, setOpen] = useState(false);
  // A phone shows the search first; the other filters unfold.
  const folded = open ? {} : { fieldClassName: 'max-md:hidden' };
  const bind = (name: string) => ({
    value: filter.get(name),
    onChange: (event: { target: { value: string } }) => filter.set(name, event.target.value),
  });
  return (
    <search
      aria-label={words.title}
      className="grid grid-cols-2 gap-3 px-4 py-3 md:grid-cols-[1.2fr_1fr_1.2fr_1.2fr_auto_auto] md:px-6"
    >
      <SearchField
        label={words.search}
        value={filter.get('search')}
        onSearch={(text) => filter.set('search', text)}
        fieldClassName="col-span-2 md:col-span-1"
      />
      <SelectField label={words.status} {...folded} {...bind('status')}>
        <option value="">{words.all}</option>
        {ORDER_STATUSES.map((status) => (
          <option key={status} value={status}>
            {words.statuses[status]}
          </option>
        ))}
      </SelectField>
      <SelectField label={words.supplier} {...folded} {...bind('supplierId')}>
        <option value="">{words.allSuppliers}</option>
        {choices.suppliers.map((one) => (
          <option key={one.id} value={one.id}>
            {one.name}
          </option>
        ))}
      </SelectField>
      <SelectField label={words.job} {...folded} {...bind('jobId')}>
        <option value="">{words.allJobs}</option>
        {choices.jobs.map((one) => (
          <option key={one.id} value={one.id}>
            {one.number} {one.name}
          </option>
        ))}
      </SelectField>
      <TextField label={words.from} type="date" {...folded} {...bind('from')} />
      <TextField label={words.to} type="date" {...folded} {...bind('to')} />
      <ListFoot
        filter={filter}
        filtered={filtered}
        count={count}
        words={words}
        exportAt="/api/orders/export"
      >
        <Button
          variant="quiet"
          className="md:hidden"
          aria-expanded={open}
          onClick={() => setOpen(!open)}
        >
          {words.filters}
        </Button>
      </ListFoot>
    </search>
  );
}
