'use client';

import { differenceFigure, moneyFigure, signOf, yardsFigure } from '@/lib/text/format';
import { classNames } from './class-names';
import { useCommon } from './locale';

interface FigureProps {
  /** Decimal text; null where there is none (shown as a dash). */
  value: string | null;
  className?: string;
}

function None() {
  return <span className="text-ink-soft">–</span>;
}

/** "$1,234.50" */
export function MoneyFigure({ value, className }: FigureProps) {
  if (value === null) return <None />;
  return <span className={classNames('whitespace-nowrap', className)}>{moneyFigure(value)}</span>;
}

interface YardsProps extends FigureProps {
  /** Leave the unit out only where the column's head says it. */
  unit?: boolean;
}

/** "10.50 yd³" */
export function YardsFigure({ value, unit = true, className }: YardsProps) {
  if (value === null) return <None />;
  return (
    <span className={classNames('whitespace-nowrap', className)}>
      {yardsFigure(value)}
      {unit && <span className="text-[0.85em] text-ink-soft"> yd³</span>}
    </span>
  );
}

/** A signed difference: red and "+" against us, green and "−" in our favour; words for readers. */
export function Difference({ value, className }: FigureProps) {
  const words = useCommon();
  if (value === null) return <None />;
  const sign = signOf(value);
  return (
    <span
      className={classNames(
        'whitespace-nowrap',
        sign === 'positive' && 'font-semibold text-keel',
        sign === 'negative' && 'font-semibold text-moss',
        className,
      )}
    >
      {differenceFigure(value)}
      {sign !== 'zero' && (
        <span className="sr-only">
          {' '}
          {sign === 'positive' ? words.againstUs : words.inOurFavour}
        </span>
      )}
    </span>
  );
}
