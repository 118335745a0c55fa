import { deleteMatchesOfLine, insertMatches } from '../../../db/queries/sheet-state';
import { matchByHandInput, matchOutput } from '../../contracts/sheet';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';
import { openStatement, statementInWords } from './internal';
import { keepFindings } from './keep-findings';
import { deliveriesNear, lineOf } from './line-window';

export const matchByHand = defineVerb({
  name: 'statements.matchByHand',
  says: 'Tie a billed line to the deliveries that it charges for',
  kind: 'write',
  permission: 'statements.write',
  http: { method: 'POST', path: '/api/statements/{statementId}/match' },
  input: matchByHandInput,
  output: matchOutput,
  async run(ctx, { statementId, billLineId, deliveries }) {
    const opened = await openStatement(ctx, statementId);
    if (!opened.ok) return opened;
    const statement = opened.value;
    const line = await lineOf(ctx.scope, statementId, billLineId);
    if (!line) return fail(notFound('line'));
    const near = await deliveriesNear(ctx.scope, statement, line);
    const known = new Set([...near.tickets, ...near.pumpTickets].map(({ id }) => id));
    if (deliveries.some(({ id }) => !known.has(id))) return fail(notFound('ticket'));
    const unique = [...new Map(deliveries.map((one) => [one.id, one])).values()];
    await deleteMatchesOfLine(ctx.scope, billLineId);
    await insertMatches(
      ctx.scope,
      unique.map(({ kind, id }) => ({
        billLineId,
        ticketId: kind === 'ticket' ? id : null,
        pumpTicketId: kind === 'pumpTicket' ? id : null,
        method: 'hand' as const,
        confidence: 1,
        reason: 'Matched by hand.',
        madeBy: ctx.actor.personId,
      })),
    );
    await keepFindings(ctx.scope, statement, ctx.company);
    await ctx.record({
      action: 'statements.matchByHand',
      entity: 'statement',
      entityId: statementId,
      summary: `Matched line ${line.position} of ${statementInWords(statement)} by hand`,
      after: { billLineId, deliveries: unique },
    });
    return ok({ billLineId });
  },
});
