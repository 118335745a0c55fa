import { findStatement, setStatementStatus } from '../../../db/queries/statements';
import { reopenStatementInput, statementState } from '../../contracts/statements';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';
import { statementInWords } from './internal';
import { keepFindings } from './keep-findings';

export const reopenStatement = defineVerb({
  name: 'statements.reopen',
  says: 'Reopen a closed statement, with a reason',
  kind: 'write',
  permission: 'statements.reopen',
  http: { method: 'POST', path: '/api/statements/{statementId}/reopen' },
  input: reopenStatementInput,
  output: statementState,
  async run(ctx, { statementId, reason }) {
    const statement = await findStatement(ctx.scope, statementId, true);
    if (!statement) return fail(notFound('statement'));
    if (statement.status === 'open') {
      ctx.unchanged();
      return ok({ statementId, status: 'open' as const });
    }
    await setStatementStatus(ctx.scope, statementId, {
      status: 'open',
      closedAt: null,
      closedBy: null,
      closedRows: null,
    });
    await keepFindings(ctx.scope, { ...statement, status: 'open' }, ctx.company);
    await ctx.record({
      action: 'statements.reopen',
      entity: 'statement',
      entityId: statementId,
      summary: `Reopened ${statementInWords(statement)}: ${reason}`,
      before: { status: 'closed', closedAt: statement.closedAt, closedBy: statement.closedByName },
      after: { status: 'open', reason },
    });
    return ok({ statementId, status: 'open' as const });
  },
});
