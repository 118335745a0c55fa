import { moneyFigure } from '@/lib/text/format';
import { sheetWords as words } from '@/lib/text/messages/en/statements';
import type { SheetSums } from './sums';

/** The statement's progress: the strike-off line advancing over a band of the sheet. */
export function SheetBand({ sums }: { sums: SheetSums }) {
  const share = sums.rows === 0 ? 0 : (100 * sums.settled) / sums.rows;
  const parts = [
    words.agrees(moneyFigure(sums.agrees)),
    sums.settled === sums.rows ? words.allSettled : words.toSettle(sums.openFindings),
  ];
  return (
    <div className="relative h-8 shrink-0 overflow-hidden border-b border-cured bg-band">
      <div
        aria-hidden
        className="absolute inset-y-0 left-0 border-r-[3px] border-carbon bg-carbon/10 motion-safe:transition-[width]"
        style={{ width: `${share}%` }}
      />
      <p role="status" className="relative truncate px-4 text-[13px] leading-8 md:px-6">
        <strong className="font-semibold">{words.progress(sums.settled, sums.rows)}</strong>
        {parts.map((part) => ` · ${part}`)}
      </p>
    </div>
  );
}
