import { findTicket, updateTicket } from '../../../db/queries/tickets';
import { clockMinutesIn, dayIn } from '../../clock';
import {
  CLOCK_FIELDS,
  type ClockEvent,
  ticketDetail as output,
  setClockInput,
} from '../../contracts/tickets';
import { fail, ok } from '../../domain/result';
import { clockText } from '../../domain/time/clock-minutes';
import type { Ctx } from '../context';
import { failure, notFound } from '../failure';
import { defineVerb } from '../verb';
import { ticketDetail } from './detail';
import {
  checkNotClosed,
  crewLimit,
  forRecord,
  foundAgain,
  staleTicket,
  ticketInWords,
} from './internal';

const EVENT_WORDS: Record<ClockEvent, string> = {
  arrivedAt: 'arrived',
  startedAt: 'started',
  finishedAt: 'finished',
  leftAt: 'left',
};
const DAY_MINUTES = 1440;
/** A pour that began yesterday is over by noon. */
const LAST_MINUTE_OF_YESTERDAYS_POUR = 720;

export const setClock = defineVerb({
  name: 'tickets.setClock',
  says: 'Note when a truck arrived, started, finished or left',
  kind: 'write',
  permission: 'tickets.write',
  http: { method: 'POST', path: '/api/tickets/{ticketId}/clock' },
  input: setClockInput,
  output,
  async run(ctx, { ticketId, event, at }) {
    const before = await findTicket(ctx.scope, ticketId, crewLimit(ctx.actor));
    if (!before) return fail(notFound('ticket'));
    const minutes = at === undefined ? minutesNow(ctx, before.date) : at;
    if (minutes === undefined) {
      return fail(
        failure('invalid', 'The ticket is not of today: type the time instead of tapping it.', [
          { path: 'at', message: 'needed' },
        ]),
      );
    }
    if (before[event] === minutes) {
      ctx.unchanged();
      return ok(await ticketDetail(ctx, before));
    }
    const refusal = await checkNotClosed(ctx, ticketId);
    if (refusal) return fail(refusal);
    const problem = orderProblem({ ...before, [event]: minutes }, event);
    if (problem) return fail(failure('invalid', problem, [{ path: 'at', message: problem }]));
    if (!(await updateTicket(ctx.scope, ticketId, before.version, { [event]: minutes }))) {
      return fail(staleTicket(before));
    }
    const ticket = await foundAgain(ctx, ticketId);
    await ctx.record({
      action: 'tickets.setClock',
      entity: 'ticket',
      entityId: ticketId,
      summary:
        minutes === null
          ? `Took back when the truck of ${ticketInWords(ticket.number)} ${EVENT_WORDS[event]}`
          : `Truck of ${ticketInWords(ticket.number)} ${EVENT_WORDS[event]} at ${clockText(minutes)}`,
      before: forRecord(before),
      after: forRecord(ticket),
    });
    return ok(await ticketDetail(ctx, ticket));
  },
});

/** Minutes after midnight of the ticket's date, also just after midnight; undefined on other days. */
function minutesNow(ctx: Ctx, date: string): number | undefined {
  const { timeZone } = ctx.company;
  const now = ctx.clock.now();
  const minutes = clockMinutesIn(timeZone, now);
  if (dayIn(timeZone, now) === date) return minutes;
  if (minutes > LAST_MINUTE_OF_YESTERDAYS_POUR) return undefined;
  const dayBefore = dayIn(timeZone, new Date(now.getTime() - DAY_MINUTES * 60_000));
  return dayBefore === date ? minutes + DAY_MINUTES : undefined;
}

/** Why a time can't stand beside the others; null when it can. */
function orderProblem(
  times: Record<(typeof CLOCK_FIELDS)[number], number | null>,
  event: ClockEvent,
): string | null {
  const at = times[event];
  if (at === null) return null;
  const place = CLOCK_FIELDS.indexOf(event);
  const earlier = CLOCK_FIELDS.slice(0, place).map((field) => times[field]);
  const later = CLOCK_FIELDS.slice(place + 1).map((field) => times[field]);
  const wrong =
    earlier.find((time) => time !== null && time > at) ??
    later.find((time) => time !== null && time < at);
  if (wrong === undefined || wrong === null) return null;
  return `${clockText(at)} does not fit beside ${clockText(wrong)}: a truck arrives, starts, finishes and leaves in that order. Correct the other time first.`;
}
