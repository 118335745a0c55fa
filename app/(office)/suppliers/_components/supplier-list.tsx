'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import Link from 'next/link';
import type { z } from 'zod';
import { ListBody, ListFoot } from '@/components/shell/list-parts';
import { sameQuery } from '@/components/shell/list-query';
import { useListFilter } from '@/components/shell/use-list-filter';
import { SelectField } from '@/components/ui/field';
import { Difference } from '@/components/ui/figures';
import { RuledTable, Td, Th } from '@/components/ui/ruled-table';
import { SearchField } from '@/components/ui/search-field';
import type { listSuppliersOutput, SupplierRow } from '@/lib/contracts/suppliers';
import { SUPPLIER_KINDS } from '@/lib/contracts/suppliers';
import { suppliersQuery } from '@/lib/queries/suppliers';
import { routes } from '@/lib/routes';
import { supplierWords as words } from '@/lib/text/messages/en/suppliers';

const FILTERS = ['kind', 'search', 'archived'];

interface SupplierListProps {
  first: z.output<typeof listSuppliersOutput>;
  firstQuery: Record<string, string>;
}

export function SupplierList({ first, firstQuery }: SupplierListProps) {
  const filter = useListFilter();
  const { data, error } = useQuery({
    ...suppliersQuery(filter.query),
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
        className="grid grid-cols-2 gap-3 px-4 py-3 md:grid-cols-[1.5fr_1fr_1fr] md:px-6"
      >
        <SearchField
          label={words.search}
          value={filter.get('search')}
          onSearch={(text) => filter.set('search', text)}
          fieldClassName="col-span-2 md:col-span-1"
        />
        <SelectField label={words.kind} {...bind('kind')}>
          <option value="">{words.allKinds}</option>
          {SUPPLIER_KINDS.map((kind) => (
            <option key={kind} value={kind}>
              {words.kinds[kind]}
            </option>
          ))}
        </SelectField>
        <SelectField label={words.show} {...bind('archived')}>
          <option value="">{words.archivedNo}</option>
          <option value="yes">{words.archivedYes}</option>
          <option value="all">{words.archivedAll}</option>
        </SelectField>
        <ListFoot
          filter={filter}
          filtered={filtered}
          count={data ? words.count(data.total) : ''}
          words={words}
          exportAt="/api/suppliers/export"
        />
      </search>
      <ListBody filter={filter} filtered={filtered} total={data?.total} error={error} words={words}>
        {data && <SupplierTable rows={data.rows} />}
      </ListBody>
    </>
  );
}

function SupplierTable({ rows }: { rows: readonly SupplierRow[] }) {
  return (
    <RuledTable caption={words.list} slipsOnPhone>
      <thead>
        <tr>
          <Th>{words.name}</Th>
          <Th>{words.kind}</Th>
          <Th>{words.dispatchEmail}</Th>
          <Th>{words.phone}</Th>
          <Th>{words.accountNumber}</Th>
          <Th align="right" copy="billed">
            {words.statements}
          </Th>
          <Th align="right">{words.openAgainst}</Th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={row.id} className="hover:bg-band">
            <Td>
              <Link href={routes.supplier(row.id)} className="font-semibold">
                {row.name}
              </Link>
            </Td>
            <Td>{words.kinds[row.kind]}</Td>
            <Td>{row.dispatchEmail || '–'}</Td>
            <Td className="whitespace-nowrap">{row.phone || '–'}</Td>
            <Td className="font-code">{row.accountNumber || '–'}</Td>
            <Td align="right" copy="billed">
              {row.statements}
              <span className="md:hidden"> {words.statements.toLowerCase()}</span>
            </Td>
            <Td align="right">
              <Difference value={row.openAgainst} />
            </Td>
          </tr>
        ))}
      </tbody>
    </RuledTable>
  );
}
