import { classNames } from '@/components/ui/class-names';
import { differenceFigure, moneyFigure, yardsWithUnit } from '@/lib/text/format';
import type { Locale } from '@/lib/text/locale';
import { commonMessages } from '@/lib/text/messages/common';
import { homeMessages } from '@/lib/text/messages/home';

interface CopyProps {
  name: string;
  look: string;
  reference: readonly [label: string, value: string];
  struck: readonly [label: string, value: string];
  open: readonly [label: string, value: string];
}

function Line({ entry, className }: { entry: readonly [string, string]; className?: string }) {
  return (
    <div className={classNames('flex items-baseline justify-between gap-3 px-4 py-2', className)}>
      <dt className="text-[13px] text-ink-soft">{entry[0]}</dt>
      <dd className="text-right text-[15px]">{entry[1]}</dd>
    </div>
  );
}

function Copy({ name, look, reference, struck, open }: CopyProps) {
  return (
    <section
      className={classNames(
        'border-b-2 border-dotted border-wet last:border-0 md:border-r-2 md:border-b-0',
        look,
      )}
    >
      <h3 className="border-b border-wet px-4 pt-3 pb-1.5 text-lg">{name}</h3>
      <dl>
        <Line entry={reference} />
        <Line entry={struck} className="strike-line border-t border-cured" />
        <Line entry={open} className="border-t border-cured font-semibold" />
      </dl>
    </section>
  );
}

/** The idea of the product in one invented load: three copies, one line struck off, one not. */
export function ThreeCopies({ locale }: { locale: Locale }) {
  const words = homeMessages(locale);
  const { copies } = commonMessages(locale);
  return (
    <figure>
      <figcaption>
        <h2 className="text-xl">{words.exampleTitle}</h2>
        <p className="text-[14.5px] text-ink-soft">{words.exampleSays}</p>
      </figcaption>
      <div className="mt-4 border border-wet">
        <div className="grid md:grid-cols-3">
          <Copy
            name={copies.ordered}
            look="bg-sheet"
            reference={[words.job, 'Mill Race apron']}
            struck={[`${words.mix} 4000A`, yardsWithUnit('10')]}
            open={[words.waiting, words.waitingAgreed]}
          />
          <Copy
            name={copies.delivered}
            look="bg-canary"
            reference={[words.ticket, '558131']}
            struck={[words.load, yardsWithUnit('10')]}
            open={[words.onSite, '46 min']}
          />
          <Copy
            name={copies.billed}
            look="bg-pink"
            reference={[words.line, '31']}
            struck={[words.concrete, moneyFigure('1580')]}
            open={[words.waiting, moneyFigure('103.50')]}
          />
        </div>
        <div className="flex flex-wrap items-baseline justify-between gap-x-6 gap-y-1 border-t-[3px] border-double border-wet bg-sheet px-4 py-3">
          <p>
            <strong className="font-head text-[17px]">{words.finding}.</strong> {words.findingSays}
          </p>
          <p className="font-head text-xl font-semibold text-keel">{differenceFigure('103.50')}</p>
        </div>
      </div>
    </figure>
  );
}
