import { deleteStrikes } from '../../../db/queries/sheet-state';
import { settledRows, strikeInput } from '../../contracts/sheet';
import { ok } from '../../domain/result';
import { defineVerb } from '../verb';
import { openStatement, rowsInWords, rowsNamed, statementInWords } from './internal';
import { keepFindings, workOut } from './keep-findings';
import { reopenVariances } from './undo';

export const unstrikeRows = defineVerb({
  name: 'statements.unstrike',
  says: 'Open settled rows of a sheet again',
  kind: 'write',
  permission: 'statements.write',
  http: { method: 'POST', path: '/api/statements/{statementId}/unstrike' },
  input: strikeInput,
  output: settledRows,
  async run(ctx, { statementId, rowKeys }) {
    const opened = await openStatement(ctx, statementId);
    if (!opened.ok) return opened;
    const statement = opened.value;
    const { rows } = await workOut(ctx.scope, statement, ctx.company);
    const named = rowsNamed(rows, rowKeys);
    if (!named.ok) return named;
    const settled = named.value.filter((row) => row.settled !== null);
    if (settled.length === 0) ctx.unchanged();
    else {
      const keys = settled.map((row) => row.key);
      await deleteStrikes(ctx.scope, statementId, keys);
      await reopenVariances(ctx.scope, statementId, keys);
      await keepFindings(ctx.scope, statement, ctx.company);
      await ctx.record({
        action: 'statements.unstrike',
        entity: 'statement',
        entityId: statementId,
        summary: `Opened ${rowsInWords(settled)} of ${statementInWords(statement)} again`,
        before: { rows: settled.map(({ key, settled: was }) => ({ key, ...was })) },
      });
    }
    return ok({ rows: named.value.map(({ key }) => ({ key, settled: null })) });
  },
});
