'use client';

import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { classNames } from '@/components/ui/class-names';
import { Dialog } from '@/components/ui/dialog';
import { TextField } from '@/components/ui/field';
import { useLocale } from '@/components/ui/locale';
import { Notice } from '@/components/ui/notice';
import { useWhere } from '@/components/ui/where';
import type { ClockEvent, TicketRow } from '@/lib/contracts/tickets';
import { ticketDetail } from '@/lib/contracts/tickets';
import { clockText, parseClock, unrollPastMidnight } from '@/lib/domain/time/clock-minutes';
import { ApiFailure, apiSend } from '@/lib/queries/api';
import { refreshPourDay } from '@/lib/queries/tickets';
import type { ClockStyle } from '@/lib/text/format';
import { clockFigure } from '@/lib/text/format';
import { pourDayMessages } from '@/lib/text/messages/pour-day';
import { failureText } from '@/lib/text/problems';

const EVENTS: readonly ClockEvent[] = ['arrivedAt', 'startedAt', 'finishedAt', 'leftAt'];

interface TruckClockProps {
  load: TicketRow;
  name: string;
  isToday: boolean;
}

/** Four taps in a load's life; a time that is set opens for correction. */
export function TruckClock({ load, name, isToday }: TruckClockProps) {
  const locale = useLocale();
  const words = pourDayMessages(locale);
  const { clock } = useWhere();
  const queries = useQueryClient();
  const [editing, setEditing] = useState<ClockEvent | null>(null);
  const [busy, setBusy] = useState<ClockEvent | null>(null);
  const [problem, setProblem] = useState<string | null>(null);
  const last = EVENTS.findLastIndex((event) => load[event] !== null);
  const next = EVENTS[last + 1];

  /** Sets a time, takes it back (null), or takes the present (no time given). */
  async function set(event: ClockEvent, at?: number | null): Promise<boolean> {
    setBusy(event);
    setProblem(null);
    try {
      const body = at === undefined ? { event } : { event, at };
      await apiSend('POST', `/api/tickets/${load.id}/clock`, body, ticketDetail);
      await refreshPourDay(queries);
      return true;
    } catch (error) {
      if (!(error instanceof ApiFailure)) throw error;
      setProblem(failureText(locale, error));
      return false;
    } finally {
      setBusy(null);
    }
  }
  return (
    <div>
      <fieldset className="mt-2 grid grid-cols-4 gap-1.5">
        <legend className="sr-only">{words.clockOf(name)}</legend>
        {EVENTS.map((event) => {
          const at = load[event];
          const isNext = event === next && isToday;
          return (
            <button
              key={event}
              type="button"
              aria-busy={busy === event || undefined}
              aria-label={
                at === null
                  ? undefined
                  : words.clockCorrect(words.clockDone[event], clockFigure(at, clock))
              }
              onClick={() => {
                if (busy) return;
                if (at !== null || !isToday) setEditing(event);
                else set(event);
              }}
              className={classNames(
                'grid min-h-[58px] place-content-center rounded-[3px] border-[1.5px] px-0.5 text-center text-[13px] leading-tight',
                at !== null && 'border-wet bg-canary-soft font-semibold',
                at === null && isNext && 'border-carbon bg-carbon font-semibold text-carbon-on',
                at === null && !isNext && 'border-wet bg-sheet',
                busy === event && 'opacity-60',
              )}
            >
              {at === null ? words.clock[event] : words.clockDone[event]}
              {at !== null && <span className="text-[15px]">{shortClock(at, clock)}</span>}
            </button>
          );
        })}
      </fieldset>
      {problem && editing === null && (
        <Notice tone="error" className="mt-2">
          {problem}
        </Notice>
      )}
      {editing && (
        <TimeDialog
          what={words.clockDone[editing]}
          load={load}
          event={editing}
          problem={problem}
          onClose={() => {
            setProblem(null);
            setEditing(null);
          }}
          onSet={async (at) => {
            if (await set(editing, at)) setEditing(null);
          }}
        />
      )}
    </div>
  );
}

/** On site the half of the day is plain; the button has no room for it. */
function shortClock(at: number, clock: ClockStyle): string {
  return clockFigure(at, clock).replace(/ [ap]m$/, '');
}

interface TimeDialogProps {
  what: string;
  load: TicketRow;
  event: ClockEvent;
  problem: string | null;
  onClose: () => void;
  onSet: (at: number | null) => void;
}

function TimeDialog({ what, load, event, problem, onClose, onSet }: TimeDialogProps) {
  const words = pourDayMessages(useLocale());
  const at = load[event];
  const [text, setText] = useState(at === null ? '' : clockText(at));
  // Counted on from the batching, so that a pour past midnight keeps its order.
  const [, typed] = unrollPastMidnight([load.batchedAt ?? load.arrivedAt, parseClock(text)]);
  return (
    <Dialog
      open
      onClose={onClose}
      title={words.timeOf(what)}
      footer={
        <>
          <Button
            className="min-h-14"
            disabled={typed === null}
            onClick={() => onSet(typed ?? null)}
          >
            {words.setTime}
          </Button>
          {at !== null && (
            <Button variant="quiet" className="min-h-14" onClick={() => onSet(null)}>
              {words.takeBack}
            </Button>
          )}
        </>
      }
    >
      {problem && (
        <Notice tone="error" className="mb-3">
          {problem}
        </Notice>
      )}
      <TextField
        label={what}
        type="time"
        value={text}
        onChange={(change) => setText(change.target.value)}
        className="min-h-14 text-xl"
      />
    </Dialog>
  );
}
