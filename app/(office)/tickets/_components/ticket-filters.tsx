'use client';

import { useState } from 'react';
import type { useListFilter } from '@/components/shell/use-list-filter';
import { Button } from '@/components/ui/button';
import { SelectField, TextField } from '@/components/ui/field';
import { SearchField } from '@/components/ui/search-field';
import type { TicketChoices } from '@/lib/contracts/tickets';
import { TICKET_STATUSES } from '@/lib/contracts/tickets';
import { pourDay } from '@/lib/text/messages/en/pour-day';
import { tickets as words } from '@/lib/text/messages/en/tickets';

interface TicketFiltersProps {
  filter: ReturnType<typeof useListFilter>;
  choices: TicketChoices;
  filtered: boolean;
  exportHref: string;
  count: string;
}

export function TicketFilters(props: TicketFiltersProps) {
  const { filter, choices, filtered, exportHref, count } = props;
  const bind = (name: string) => ({
    value: filter.get(name),
    onChange: (event: { target: { value: string } }) => filter.set(name, event.target.value),
  });
  const [open, setOpen] = useState(false);
  // A phone shows the search first; the other filters unfold.
  const folded = open ? {} : { fieldClassName: 'max-md:hidden' };
  return (
    <search
      aria-label={words.title}
      className="grid grid-cols-2 gap-3 px-4 py-3 md:grid-cols-[1.3fr_0.8fr_1.2fr_1.2fr_auto_auto] md:px-6"
    >
      <SearchField
        label={words.search}
        value={filter.get('search')}
        onSearch={(text) => filter.set('search', text)}
        fieldClassName="col-span-2 md:col-span-1"
      />
      <SelectField label={words.status} {...folded} {...bind('status')}>
        <option value="">{words.allStatuses}</option>
        {TICKET_STATUSES.map((status) => (
          <option key={status} value={status}>
            {pourDay.states[status]}
          </option>
        ))}
      </SelectField>
      <SelectField label={words.supplier} {...folded} {...bind('supplierId')}>
        <option value="">{words.allSuppliers}</option>
        {choices.suppliers
          .filter((one) => one.kind === 'readyMix')
          .map((one) => (
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
      <div className="col-span-full flex flex-wrap items-center gap-x-4 gap-y-2 text-[14px]">
        <span className="text-ink-soft" role="status">
          {count}
        </span>
        <Button
          variant="quiet"
          className="md:hidden"
          aria-expanded={open}
          onClick={() => setOpen(!open)}
        >
          {words.filters}
        </Button>
        {filtered && (
          <Button variant="quiet" onClick={filter.clear}>
            {words.clear}
          </Button>
        )}
        <a href={exportHref} download className="ml-auto inline-flex min-h-11 items-center">
          {words.export}
        </a>
      </div>
    </search>
  );
}
