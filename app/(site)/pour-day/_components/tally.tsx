'use client';

import { useLocale } from '@/components/ui/locale';
import type { PourDay } from '@/lib/contracts/pour-day';
import { yardsFigure } from '@/lib/text/format';
import { pourDayMessages } from '@/lib/text/messages/pour-day';
import { tallyShares } from './tally-shares';

type TallyFigures = Pick<
  PourDay['placements'][number],
  'orderedYd3' | 'figuredYd3' | 'inYd3' | 'loadsIn' | 'toCheck' | 'toCheckYd3'
>;

interface TallyProps {
  tally: TallyFigures;
  size: 'small' | 'large';
}

/** The running yards: a figure that is read at arm's length, and the bar that fills. */
export function Tally({ tally, size }: TallyProps) {
  const words = pourDayMessages(useLocale());
  const shares = tallyShares(tally);
  const left =
    shares.toGoYd3 === null
      ? null
      : shares.isOver
        ? words.over(yardsFigure(shares.toGoYd3))
        : shares.toGoYd3 === '0.00'
          ? words.complete
          : words.toGo(yardsFigure(shares.toGoYd3));
  return (
    <span className="block px-4 pt-2 pb-1">
      <span className="block">
        <span
          className={
            size === 'large'
              ? 'font-head text-[46px] leading-none font-semibold'
              : 'font-head text-[26px] leading-none font-semibold'
          }
        >
          {yardsFigure(tally.inYd3)}
        </span>{' '}
        <span className={size === 'large' ? 'text-[17px] text-ink-soft' : 'text-ink-soft'}>
          {tally.orderedYd3 === null
            ? words.ofFigured(yardsFigure(tally.figuredYd3))
            : words.of(yardsFigure(tally.orderedYd3))}
        </span>
      </span>
      <Bar shares={shares} size={size} />
      <span className="flex justify-between gap-3 text-[14px] text-ink-soft">
        <span>{words.loadsIn(tally.loadsIn)}</span>
        {tally.toCheck > 0 && (
          <span className="font-semibold text-ink">
            {words.toCheck(tally.toCheck, yardsFigure(tally.toCheckYd3))}
          </span>
        )}
        {left !== null && (
          <span className={shares.isOver ? 'font-semibold text-keel' : undefined}>{left}</span>
        )}
      </span>
    </span>
  );
}

/** Confirmed yards solid with the screed's edge, photographed ones hatched behind it. */
function Bar({ shares, size }: { shares: ReturnType<typeof tallyShares>; size: string }) {
  return (
    <span
      aria-hidden
      className={`relative my-2 block overflow-hidden border-[1.5px] border-wet bg-sheet ${size === 'large' ? 'h-[22px]' : 'h-3'}`}
    >
      <span
        className="absolute inset-y-0 bg-[repeating-linear-gradient(135deg,var(--canary-deep)_0_5px,transparent_5px_10px)]"
        style={{ left: `${shares.inPercent}%`, width: `${shares.toCheckPercent}%` }}
      />
      {shares.inPercent > 0 && (
        <span
          className="absolute inset-y-0 left-0 border-r-[3px] border-carbon bg-canary"
          style={{ width: `${shares.inPercent}%` }}
        />
      )}
    </span>
  );
}
