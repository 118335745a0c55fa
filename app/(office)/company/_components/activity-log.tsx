'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import { sameQuery } from '@/components/shell/list-query';
import { useListFilter } from '@/components/shell/use-list-filter';
import { Button } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty';
import { Notice } from '@/components/ui/notice';
import { Pager } from '@/components/ui/pager';
import { Section } from '@/components/ui/section';
import { useWhere } from '@/components/ui/where';
import type { ActivityRow, listActivityOutput } from '@/lib/contracts/activity';
import { activityQuery } from '@/lib/queries/company';
import { dayOfMoment, dayText } from '@/lib/text/format';
import { company } from '@/lib/text/messages/en/company';
import { ActivityEntry } from './activity-entry';
import { ActivityFilters } from './activity-filters';

const words = company.activity;
const ROWS = 100;

interface ActivityLogProps {
  firstQuery: Record<string, string>;
  first: z.output<typeof listActivityOutput>;
  people: readonly { id: string; name: string }[];
}

/** Neighbouring rows of one day, in the order in which they came. */
function byDay(rows: readonly ActivityRow[], timeZone: string) {
  const days: { day: string; rows: ActivityRow[] }[] = [];
  for (const row of rows) {
    const day = dayOfMoment(row.at, timeZone);
    const last = days.at(-1);
    if (last?.day === day) last.rows.push(row);
    else days.push({ day, rows: [row] });
  }
  return days;
}

export function ActivityLog({ firstQuery, first, people }: ActivityLogProps) {
  const { timeZone } = useWhere();
  const filter = useListFilter();
  const { data, error } = useQuery({
    ...activityQuery(filter.query),
    placeholderData: keepPreviousData,
    ...(sameQuery(filter.query, firstQuery) ? { initialData: first } : {}),
  });
  return (
    <>
      <Section title={words.title} says={words.says} className="max-w-5xl">
        <ActivityFilters
          filter={filter}
          people={people}
          entities={data?.entities ?? first.entities}
        />
        {error && <Notice tone="error">{error.message}</Notice>}
        {data?.rows.length === 0 && (
          <EmptyState
            title={words.emptyTitle}
            action={
              <Button variant="quiet" onClick={filter.clear}>
                {words.clear}
              </Button>
            }
          >
            {words.emptySays}
          </EmptyState>
        )}
        {byDay(data?.rows ?? [], timeZone).map(({ day, rows }) => (
          <section key={day} aria-labelledby={`day-${day}`}>
            <h3
              id={`day-${day}`}
              className="border-b-[3px] border-double border-wet pt-5 pb-1 text-[15px]"
            >
              {dayText(day)}
            </h3>
            <ol>
              {rows.map((row) => (
                <ActivityEntry key={row.id} row={row} />
              ))}
            </ol>
          </section>
        ))}
      </Section>
      {data && (
        <Pager
          offset={Number(filter.get('offset')) || 0}
          limit={ROWS}
          total={data.total}
          onGo={(offset) => filter.set('offset', offset === 0 ? '' : String(offset))}
        />
      )}
    </>
  );
}
