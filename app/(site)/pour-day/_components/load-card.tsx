'use client';

import Link from 'next/link';
import { useLocale } from '@/components/ui/locale';
import type { TicketRow } from '@/lib/contracts/tickets';
import { isBeingRead } from '@/lib/queries/tickets';
import { routes } from '@/lib/routes';
import { yardsFigure } from '@/lib/text/format';
import { pourDayMessages } from '@/lib/text/messages/pour-day';
import { TruckClock } from './truck-clock';

interface LoadCardProps {
  load: TicketRow;
  /** Its place in the day's order of loads, from 1. */
  place: number;
  isToday: boolean;
}

/** One load as its canary copy: what it is, whether it was checked, its truck's clock. */
export function LoadCard({ load, place, isToday }: LoadCardProps) {
  const words = pourDayMessages(useLocale());
  const number = load.number || load.reading?.number;
  const yards = load.quantityYd3 ?? load.reading?.quantityYd3;
  const truck = load.truck ?? load.reading?.truck;
  const name = words.load(place);
  return (
    <article className="relative border border-canary-deep border-b-2 bg-canary px-3 pt-2.5 pb-3 [border-bottom-style:dotted]">
      <p className="flex flex-wrap items-baseline gap-x-2">
        <b className="font-semibold">{name}</b>
        {truck && <span>{words.truck(truck)}</span>}
        <span className="font-code">{number || words.noNumber}</span>
        {yards && isYards(yards) && (
          <span className="ml-auto font-head text-lg font-semibold whitespace-nowrap">
            {yardsFigure(yards)} <span className="text-[0.75em]">yd³</span>
          </span>
        )}
      </p>
      {load.status === 'toCheck' ? <ToCheck load={load} /> : <Correct ticketId={load.id} />}
      <TruckClock load={load} name={name} isToday={isToday} />
    </article>
  );
}

/** A reading may offer text that is no number; the check screen shows it, the card does not. */
function isYards(text: string): boolean {
  return /^\d+(\.\d+)?$/.test(text);
}

function ToCheck({ load }: { load: TicketRow }) {
  const words = pourDayMessages(useLocale());
  const { reading } = load;
  const reads = isBeingRead(reading?.state);
  const says = reads
    ? words.reading
    : reading?.state === 'failed'
      ? words.unread
      : reading && reading.doubtful > 0
        ? words.lookAt(reading.doubtful)
        : words.allClear;
  return (
    <Link
      href={routes.pourDayTicket(load.id)}
      className="relative mt-2 flex min-h-14 items-center justify-between gap-3 overflow-hidden border-[1.5px] border-carbon bg-sheet px-3 font-semibold text-carbon no-underline"
    >
      <span className="whitespace-nowrap">{words.checkTicket}</span>
      <span className="text-[14px] font-normal text-ink">{says}</span>
      {reads && <span aria-hidden className="busy-rule absolute inset-x-0 bottom-0 h-1" />}
    </Link>
  );
}

function Correct({ ticketId }: { ticketId: string }) {
  const words = pourDayMessages(useLocale());
  return (
    <Link
      href={routes.pourDayTicket(ticketId)}
      className="-my-1 inline-flex min-h-12 items-center text-[15px]"
    >
      {words.correct}
    </Link>
  );
}
