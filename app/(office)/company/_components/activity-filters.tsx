'use client';

import type { useListFilter } from '@/components/shell/use-list-filter';
import { SelectField, TextField } from '@/components/ui/field';
import { SearchField } from '@/components/ui/search-field';
import { company } from '@/lib/text/messages/en/company';
import { entityName } from './entities';

const words = company.activity;

interface ActivityFiltersProps {
  filter: ReturnType<typeof useListFilter>;
  people: readonly { id: string; name: string }[];
  entities: readonly string[];
}

export function ActivityFilters({ filter, people, entities }: ActivityFiltersProps) {
  const bind = (name: string) => ({
    value: filter.get(name),
    onChange: (event: { target: { value: string } }) => filter.set(name, event.target.value),
  });
  return (
    <search
      data-no-print
      aria-label={words.title}
      className="grid grid-cols-2 gap-3 md:grid-cols-[1.4fr_1fr_1fr_auto_auto]"
    >
      <SearchField
        label={words.search}
        value={filter.get('search')}
        onSearch={(text) => filter.set('search', text)}
        fieldClassName="col-span-2 md:col-span-1"
      />
      <SelectField label={words.who} {...bind('actorId')}>
        <option value="">{words.anyone}</option>
        {people.map((person) => (
          <option key={person.id} value={person.id}>
            {person.name}
          </option>
        ))}
      </SelectField>
      <SelectField label={words.what} {...bind('entity')}>
        <option value="">{words.anything}</option>
        {entities.map((entity) => (
          <option key={entity} value={entity}>
            {entityName(entity)}
          </option>
        ))}
      </SelectField>
      <TextField label={words.from} type="date" {...bind('from')} />
      <TextField label={words.to} type="date" {...bind('to')} />
    </search>
  );
}
