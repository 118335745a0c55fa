import { deleteMatchesOfLine, insertMatches } from '../../../db/queries/sheet-state';
import { matchOutput, unmatchInput } from '../../contracts/sheet';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';
import { openStatement, statementInWords } from './internal';
import { keepFindings } from './keep-findings';
import { lineOf } from './line-window';

export const unmatchLine = defineVerb({
  name: 'statements.unmatch',
  says: 'Say that a billed line belongs to no delivery, or leave its match to the engine again',
  kind: 'write',
  permission: 'statements.write',
  http: { method: 'POST', path: '/api/statements/{statementId}/unmatch' },
  input: unmatchInput,
  output: matchOutput,
  async run(ctx, { statementId, billLineId, leaveTo }) {
    const opened = await openStatement(ctx, statementId);
    if (!opened.ok) return opened;
    const statement = opened.value;
    const line = await lineOf(ctx.scope, statementId, billLineId);
    if (!line) return fail(notFound('line'));
    await deleteMatchesOfLine(ctx.scope, billLineId);
    if (leaveTo === 'nothing') {
      await insertMatches(ctx.scope, [
        {
          billLineId,
          ticketId: null,
          pumpTicketId: null,
          method: 'hand',
          confidence: 1,
          reason: 'A person found no delivery for it.',
          madeBy: ctx.actor.personId,
        },
      ]);
    }
    await keepFindings(ctx.scope, statement, ctx.company);
    const what =
      leaveTo === 'nothing' ? 'belongs to no delivery' : 'is matched by the engine again';
    await ctx.record({
      action: 'statements.unmatch',
      entity: 'statement',
      entityId: statementId,
      summary: `Line ${line.position} of ${statementInWords(statement)} ${what}`,
      after: { billLineId, leaveTo },
    });
    return ok({ billLineId });
  },
});
