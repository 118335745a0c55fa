'use client';

import type { ReactNode } from 'react';
import { createContext, useContext } from 'react';
import type { ClockStyle } from '@/lib/text/format';
import { momentText } from '@/lib/text/format';
import { useLocale } from './locale';

/** The company's time zone and the way it writes the clock. */
export interface Where {
  readonly timeZone: string;
  readonly clock: ClockStyle;
}

const WhereContext = createContext<Where | null>(null);

export function WhereProvider({ where, children }: { where: Where; children: ReactNode }) {
  return <WhereContext value={where}>{children}</WhereContext>;
}

export function useWhere(): Where {
  const where = useContext(WhereContext);
  if (!where) throw new Error('useWhere needs a WhereProvider above it');
  return where;
}

/** A moment in the company's time zone. */
export function Moment({ at }: { at: string }) {
  const where = useWhere();
  const locale = useLocale();
  return (
    <time dateTime={at} className="whitespace-nowrap">
      {momentText(at, { ...where, locale })}
    </time>
  );
}
