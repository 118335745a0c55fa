'use client';

import { useQuery } from '@tanstack/react-query';
import Link from 'next/link';
import { LinkButton } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty';
import { useLocale } from '@/components/ui/locale';
import { useWhere } from '@/components/ui/where';
import type { PourDay } from '@/lib/contracts/pour-day';
import { pourDayQuery } from '@/lib/queries/tickets';
import { routes } from '@/lib/routes';
import { clockFigure, dayText, weekdayText } from '@/lib/text/format';
import { pourDayMessages } from '@/lib/text/messages/pour-day';
import { SiteLanguage } from './site-language';
import { Tally } from './tally';

/** A day's pours, each with the yards that are in. */
export function DayScreen({ first, name }: { first: PourDay; name: string }) {
  const locale = useLocale();
  const words = pourDayMessages(locale);
  const asked = useQuery({ ...pourDayQuery(first.day), initialData: first });
  const day = asked.data;
  return (
    <div className="mx-auto flex w-full max-w-2xl flex-1 flex-col">
      <header className="double-rule px-4 pt-3 pb-2">
        <p className="text-[13px] text-ink-soft">
          {words.title} · {dayText(day.day, locale)}
        </p>
        <h1 className="text-2xl">
          {day.day === day.today ? words.today : weekdayText(day.day, locale)}
        </h1>
      </header>
      <DayLinks day={day} />
      {asked.isError && <p className="bg-canary px-4 py-2 text-[14px]">{words.stale}</p>}
      {day.placements.length === 0 ? (
        <div className="px-4">
          <EmptyState title={words.noPours} action={<OtherDays day={day} />}>
            {words.noPoursSays}
          </EmptyState>
        </div>
      ) : (
        <ul>
          {day.placements.map((placement) => (
            <li key={placement.id} className="border-b border-cured">
              <PlacementEntry placement={placement} />
            </li>
          ))}
        </ul>
      )}
      <SiteLanguage name={name} />
    </div>
  );
}

function PlacementEntry({ placement }: { placement: PourDay['placements'][number] }) {
  const words = pourDayMessages(useLocale());
  const { clock } = useWhere();
  return (
    <Link
      href={routes.pourDayPlacement(placement.id)}
      className="block py-3 text-ink no-underline hover:bg-band"
    >
      <span className="flex items-baseline justify-between gap-3 px-4">
        <span className="min-w-0">
          <span className="block font-head text-xl leading-tight font-semibold">
            {placement.name}
          </span>
          <span className="block text-[14px] text-ink-soft">
            {placement.jobNumber} · {placement.jobName}
            {placement.firstTruckAt !== null && (
              <> · {words.firstTruck(clockFigure(placement.firstTruckAt, clock))}</>
            )}
          </span>
        </span>
        <span aria-hidden className="text-2xl text-carbon">
          ›
        </span>
      </span>
      <Tally tally={placement} size="small" />
    </Link>
  );
}

const STEP =
  'flex min-h-14 flex-1 items-center gap-1.5 px-4 text-[15px] font-semibold text-carbon no-underline hover:bg-band';

/** The pours before and after this day: days without one are passed over. */
function DayLinks({ day }: { day: PourDay }) {
  const locale = useLocale();
  const words = pourDayMessages(locale);
  const { before, after } = day.neighbours;
  if (!before && !after) return null;
  return (
    <nav aria-label={words.title} className="flex border-b border-cured">
      {before && (
        <Link href={routes.pourDay(before)} className={STEP}>
          <span aria-hidden>‹</span>
          <span className="sr-only">{words.dayBefore}: </span>
          {weekdayText(before, locale)}
        </Link>
      )}
      {after && (
        <Link href={routes.pourDay(after)} className={`${STEP} justify-end border-l border-cured`}>
          <span className="sr-only">{words.dayAfter}: </span>
          {weekdayText(after, locale)}
          <span aria-hidden>›</span>
        </Link>
      )}
    </nav>
  );
}

function OtherDays({ day }: { day: PourDay }) {
  const locale = useLocale();
  const words = pourDayMessages(locale);
  const next = day.neighbours.after ?? day.neighbours.before;
  return (
    <>
      {next && (
        <LinkButton variant="primary" className="min-h-14" href={routes.pourDay(next)}>
          {words.goTo(weekdayText(next, locale))}
        </LinkButton>
      )}
      {day.day !== day.today && (
        <LinkButton className="min-h-14" href={routes.pourDay()}>
          {words.goToToday}
        </LinkButton>
      )}
    </>
  );
}
