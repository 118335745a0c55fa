'use client';

import { useQuery, useQueryClient } from '@tanstack/react-query';
import Link from 'next/link';
import { useRouter } from 'next/navigation';
import { DemoPhotos } from '@/components/tickets/demo-photos';
import type { Sent } from '@/components/tickets/shots';
import { takeShot } from '@/components/tickets/shots';
import { SnapButtons } from '@/components/tickets/snap-buttons';
import { UnsentPhotos } from '@/components/tickets/unsent-photos';
import { LinkButton } from '@/components/ui/button';
import { useLocale } from '@/components/ui/locale';
import type { PourDayPlacement } from '@/lib/contracts/pour-day';
import { pourDayPlacementQuery, refreshPourDay } from '@/lib/queries/tickets';
import { routes } from '@/lib/routes';
import { weekdayText, yardsFigure } from '@/lib/text/format';
import { pourDayMessages } from '@/lib/text/messages/pour-day';
import { LoadCard } from './load-card';
import { SiteHead } from './site-head';
import { Tally } from './tally';

/** One pour while it runs: yards in, loads, the camera at the thumb. */
export function PlacementScreen({ first }: { first: PourDayPlacement }) {
  const locale = useLocale();
  const words = pourDayMessages(locale);
  const router = useRouter();
  const queries = useQueryClient();
  const asked = useQuery({ ...pourDayPlacementQuery(first.id), initialData: first });
  const pour = asked.data;
  async function open(sent: Sent) {
    await refreshPourDay(queries);
    router.push(routes.pourDayTicket(sent.ticketId));
  }
  async function snap(file: File) {
    const sent = await takeShot(file, { placementId: pour.id, ticketId: null });
    if (sent) await open(sent);
  }
  return (
    <div className="mx-auto flex w-full max-w-2xl flex-1 flex-col">
      <SiteHead
        back={{ href: routes.pourDay(pour.pourDate), to: words.back(words.title) }}
        kind={`${pour.jobNumber} ${pour.jobName} · ${weekdayText(pour.pourDate, locale)}`}
        title={pour.name}
      />
      {asked.isError && <p className="bg-canary px-4 py-2 text-[14px]">{words.stale}</p>}
      <section aria-label={words.yardsIn} className="border-b border-cured py-1">
        <Tally tally={pour} size="large" />
      </section>
      <UnsentPhotos onSent={open} />
      <Loads pour={pour} />
      <PumpTickets pour={pour} />
      {pour.today === pour.pourDate && <DemoPhotos onFile={snap} />}
      <Cautions />
      <div className="sticky bottom-0 z-10 mt-auto border-t border-cured bg-band px-4 pt-3 pb-[max(0.9rem,env(safe-area-inset-bottom))]">
        <SnapButtons snap={words.snap} choose={words.choosePhoto} onFile={snap} />
      </div>
    </div>
  );
}

function Loads({ pour }: { pour: PourDayPlacement }) {
  const words = pourDayMessages(useLocale());
  const newestFirst = pour.loads.map((load, index) => ({ load, place: index + 1 })).reverse();
  return (
    <section aria-label={words.loads} className="px-4 pt-3">
      {newestFirst.length === 0 ? (
        <p className="border border-dashed border-wet px-3 py-4 text-ink-soft">{words.noLoads}</p>
      ) : (
        <ul className="grid gap-3">
          {newestFirst.map(({ load, place }) => (
            <li key={load.id}>
              <LoadCard load={load} place={place} isToday={pour.today === load.date} />
            </li>
          ))}
        </ul>
      )}
      <LinkButton href={routes.pourDayByHand(pour.id)} className="mt-3 min-h-14 w-full">
        {words.byHand}
      </LinkButton>
    </section>
  );
}

function PumpTickets({ pour }: { pour: PourDayPlacement }) {
  const words = pourDayMessages(useLocale());
  return (
    <section aria-label={words.pumpTickets} className="px-4 pt-3">
      <ul>
        {pour.pumpTickets.map((one) => (
          <li key={one.id} className="border-b border-cured">
            <Link
              href={routes.pourDayPump(one.id)}
              className="flex min-h-14 items-center justify-between gap-3 py-2 text-ink no-underline"
            >
              <span>
                {one.supplierName} · <span className="font-code">{one.number}</span>
              </span>
              <span className="whitespace-nowrap">{words.pumped(yardsFigure(one.pumpedYd3))}</span>
            </Link>
          </li>
        ))}
      </ul>
      <LinkButton href={routes.pourDayNewPump(pour.id)} className="mt-3 min-h-14 w-full">
        {words.addPumpTicket}
      </LinkButton>
    </section>
  );
}

function Cautions() {
  const words = pourDayMessages(useLocale());
  return (
    <section aria-label={words.cautionsTitle} className="px-4 pt-4 pb-5 text-[14px] text-ink-soft">
      {words.cautions.map((caution) => (
        <p key={caution} className="mt-1">
          {caution}
        </p>
      ))}
    </section>
  );
}
