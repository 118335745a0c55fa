'use client';

import type { ReactNode } from 'react';
import { Button } from '../ui/button';
import { EmptyState } from '../ui/empty';
import { Notice } from '../ui/notice';
import { Pager } from '../ui/pager';
import type { useListFilter } from './use-list-filter';

type Filter = ReturnType<typeof useListFilter>;

/** A list's query without its page: what an export of the whole list is asked with. */
function wholeList(filter: Filter): string {
  const whole = new URLSearchParams(filter.query);
  whole.delete('offset');
  whole.delete('limit');
  return whole.toString();
}

interface ListFootProps {
  filter: Filter;
  filtered: boolean;
  /** "17 variances"; empty until the answer is there. */
  count: string;
  words: { readonly clear: string; readonly export: string };
  /** The address of the list as a CSV file, without its query. */
  exportAt: string;
  children?: ReactNode;
}

/** The line under a list's filters: how many there are, back to all of them, the whole as a file. */
export function ListFoot({ filter, filtered, count, words, exportAt, children }: ListFootProps) {
  return (
    <div className="col-span-full flex flex-wrap items-center gap-x-4 gap-y-2 text-[14px]">
      <span className="text-ink-soft" role="status">
        {count}
      </span>
      {children}
      {filtered && (
        <Button variant="quiet" onClick={filter.clear}>
          {words.clear}
        </Button>
      )}
      <a
        href={`${exportAt}?${wholeList(filter)}`}
        download
        className="ml-auto inline-flex min-h-11 items-center"
      >
        {words.export}
      </a>
    </div>
  );
}

const ROWS = 100;

interface ListBodyProps {
  filter: Filter;
  filtered: boolean;
  total: number | undefined;
  error: Error | null;
  words: {
    readonly noneTitle: string;
    readonly noneSays: string;
    readonly emptyTitle: string;
    readonly emptySays: string;
  };
  /** What an empty list offers to begin with. */
  emptyAction?: ReactNode;
  /** The rows. */
  children: ReactNode;
}

/** A list's rows with their pager; or why there are none: not asked for, not there, not had. */
export function ListBody(props: ListBodyProps) {
  const { filter, filtered, total, error, words, emptyAction, children } = props;
  return (
    <>
      {error && (
        <Notice tone="error" className="mx-4 mb-3 md:mx-6">
          {error.message}
        </Notice>
      )}
      {total === 0 && (
        <div className="px-4 md:px-6">
          <EmptyState
            title={filtered ? words.noneTitle : words.emptyTitle}
            action={filtered ? undefined : emptyAction}
          >
            {filtered ? words.noneSays : words.emptySays}
          </EmptyState>
        </div>
      )}
      {total !== undefined && total > 0 && (
        <>
          {children}
          <Pager
            offset={Number(filter.get('offset')) || 0}
            limit={Number(filter.get('limit')) || ROWS}
            total={total}
            onGo={(offset) => filter.set('offset', offset === 0 ? '' : String(offset))}
          />
        </>
      )}
    </>
  );
}
