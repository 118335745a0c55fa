import { setStatementStatus } from '../../../db/queries/statements';
import { statementRef, statementState } from '../../contracts/statements';
import { fail, ok } from '../../domain/result';
import { failure } from '../failure';
import { defineVerb } from '../verb';
import { openStatement, statementInWords } from './internal';
import { keepFindings } from './keep-findings';

export const closeStatement = defineVerb({
  name: 'statements.close',
  says: 'Close a statement whose rows are all settled; its sheet then stays as it is',
  kind: 'write',
  permission: 'statements.close',
  http: { method: 'POST', path: '/api/statements/{statementId}/close' },
  input: statementRef,
  output: statementState,
  async run(ctx, { statementId }) {
    const opened = await openStatement(ctx, statementId);
    if (!opened.ok) return opened;
    const statement = opened.value;
    const { rows } = await keepFindings(ctx.scope, statement, ctx.company);
    const open = rows.filter((row) => row.settled === null).length;
    if (open > 0) {
      const rest = open === 1 ? 'One row is' : `${open} rows are`;
      return fail(
        failure('conflict', `${rest} not settled yet. Strike off or mark every row first.`),
      );
    }
    await setStatementStatus(ctx.scope, statementId, {
      status: 'closed',
      closedAt: ctx.clock.now(),
      closedBy: ctx.actor.personId,
      closedRows: rows,
    });
    await ctx.record({
      action: 'statements.close',
      entity: 'statement',
      entityId: statementId,
      summary: `Closed ${statementInWords(statement)} with ${rows.length} settled rows`,
      before: { status: 'open' },
      after: { status: 'closed' },
    });
    return ok({ statementId, status: 'closed' as const });
  },
});
