import { findStatement, openStatementIds } from '../../../db/queries/statements';
import { refreshOutput } from '../../contracts/sheet';
import { refreshInput } from '../../contracts/statements';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';
import { keepFindings } from './keep-findings';
import { recordRefresh } from './record-refresh';

export const refreshFindings = defineVerb({
  name: 'statements.refresh',
  says: 'Keep the findings of open statements as the tickets and rate sheets of this moment make them',
  kind: 'write',
  permission: 'statements.write',
  http: { method: 'POST', path: '/api/statements/refresh' },
  input: refreshInput,
  output: refreshOutput,
  async run(ctx, { statementId }) {
    const ids = statementId ? [statementId] : await openStatementIds(ctx.scope);
    let changed = 0;
    // Earlier documents first: what they bill decides what a later one bills twice.
    for (const id of ids) {
      const statement = await findStatement(ctx.scope, id, true);
      if (!statement) return fail(notFound('statement'));
      if (statement.status === 'closed') continue;
      const kept = await keepFindings(ctx.scope, statement, ctx.company);
      if (!kept.changed) continue;
      changed += 1;
      await recordRefresh(ctx, statement, kept);
    }
    if (changed === 0) ctx.unchanged();
    return ok({ changed: changed > 0 });
  },
});
