'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { z } from 'zod';
import { sameQuery } from '@/components/shell/list-query';
import { useListFilter } from '@/components/shell/use-list-filter';
import { EmptyState } from '@/components/ui/empty';
import { SelectField } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Pager } from '@/components/ui/pager';
import { RuledTable, Td, Th } from '@/components/ui/ruled-table';
import { SearchField } from '@/components/ui/search-field';
import { Section } from '@/components/ui/section';
import { Moment } from '@/components/ui/where';
import type { listOutboxOutput } from '@/lib/contracts/outbox';
import { MAIL_STATES } from '@/lib/contracts/outbox';
import { outboxQuery } from '@/lib/queries/company';
import { company } from '@/lib/text/messages/en/company';
import { MessageDialog } from './message-dialog';

const words = company.outbox;
const ROWS = 100;

interface OutboxListProps {
  firstQuery: Record<string, string>;
  first: z.output<typeof listOutboxOutput>;
}

export function OutboxList({ firstQuery, first }: OutboxListProps) {
  const filter = useListFilter();
  const [openId, setOpenId] = useState<string | null>(null);
  const { data, error } = useQuery({
    ...outboxQuery(filter.query),
    placeholderData: keepPreviousData,
    ...(sameQuery(filter.query, firstQuery) ? { initialData: first } : {}),
  });
  const filtered = filter.get('search') !== '' || filter.get('state') !== '';
  return (
    <Section title={words.title} says={words.says} bleed>
      <div className="flex flex-wrap gap-4 px-4 pb-3 md:px-6">
        <SearchField
          label={words.search}
          value={filter.get('search')}
          onSearch={(text) => filter.set('search', text)}
          fieldClassName="w-full md:w-72"
        />
        <SelectField
          label={words.state}
          value={filter.get('state')}
          onChange={(event) => filter.set('state', event.target.value)}
        >
          <option value="">{words.all}</option>
          {MAIL_STATES.map((state) => (
            <option key={state} value={state}>
              {words.states[state]}
            </option>
          ))}
        </SelectField>
      </div>
      {error && (
        <Notice tone="error" className="mx-4 mb-3 md:mx-6">
          {error.message}
        </Notice>
      )}
      {data && data.total === 0 && (
        <div className="px-4 md:px-6">
          <EmptyState title={filtered ? words.noneTitle : words.emptyTitle}>
            {filtered ? words.noneSays : words.emptySays}
          </EmptyState>
        </div>
      )}
      {data && data.total > 0 && (
        <>
          <MessageTable rows={data.rows} onOpen={setOpenId} />
          <Pager
            offset={Number(filter.get('offset')) || 0}
            limit={ROWS}
            total={data.total}
            onGo={(offset) => filter.set('offset', offset === 0 ? '' : String(offset))}
          />
        </>
      )}
      <MessageDialog mailId={openId} onClose={() => setOpenId(null)} />
    </Section>
  );
}

interface MessageTableProps {
  rows: z.output<typeof listOutboxOutput>['rows'];
  onOpen: (mailId: string) => void;
}

function MessageTable({ rows, onOpen }: MessageTableProps) {
  return (
    <RuledTable caption={words.title} slipsOnPhone>
      <thead>
        <tr>
          <Th>{words.subject}</Th>
          <Th>{words.to}</Th>
          <Th>{words.written}</Th>
          <Th>{words.state}</Th>
        </tr>
      </thead>
      <tbody>
        {rows.map((mail) => (
          <tr key={mail.id}>
            <Td>
              <button
                type="button"
                onClick={() => onOpen(mail.id)}
                aria-label={words.open(mail.subject)}
                className="py-1 text-left font-semibold text-carbon underline decoration-1 underline-offset-2 md:py-0"
              >
                {mail.subject}
              </button>
            </Td>
            <Td className="break-all">{mail.to}</Td>
            <Td className="text-ink-soft">
              <Moment at={mail.writtenAt} />
            </Td>
            <Td className={mail.state === 'failed' ? 'font-semibold text-keel' : undefined}>
              {words.states[mail.state]}
            </Td>
          </tr>
        ))}
      </tbody>
    </RuledTable>
  );
}
