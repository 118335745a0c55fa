'use client';

import type { ComponentProps, ReactNode } from 'react';
import { Th } from './ruled-table';

interface SortHeadProps extends Pick<ComponentProps<typeof Th>, 'align' | 'copy'> {
  /** The order that the head stands for, as the address names it. */
  sort: string;
  /** The order of a list whose address names none. */
  standard: string;
  filter: {
    get: (name: string) => string;
    setAll: (values: Readonly<Record<string, string>>) => void;
  };
  children: ReactNode;
}

/** A column's head that sorts by it, and the other way when pressed again. */
export function SortHead({ sort, standard, filter, children, ...looks }: SortHeadProps) {
  const current = (filter.get('sort') || standard) === sort;
  const way = filter.get('direction') || 'down';
  const nextWay = current && way === 'down' ? 'up' : 'down';
  return (
    <Th aria-sort={current ? (way === 'down' ? 'descending' : 'ascending') : undefined} {...looks}>
      <button
        type="button"
        className="-my-1 py-1 font-semibold hover:text-ink"
        onClick={() => filter.setAll({ sort, direction: nextWay })}
      >
        {children}
        <span aria-hidden> {current ? (way === 'down' ? '▼' : '▲') : ''}</span>
      </button>
    </Th>
  );
}
