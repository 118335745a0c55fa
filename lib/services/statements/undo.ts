import {
  deleteMatchesOfLine,
  deleteStrikes,
  lastDoneBy,
  updateVariance,
  variancesOf,
} from '../../../db/queries/sheet-state';
import type { Scope } from '../../../db/tx';
import { undoOutput } from '../../contracts/sheet';
import { statementRef } from '../../contracts/statements';
import { ok } from '../../domain/result';
import { defineVerb } from '../verb';
import { openStatement, statementInWords } from './internal';
import { keepFindings } from './keep-findings';

/** Takes people's decisions off the findings of rows that are open again. */
export async function reopenVariances(
  scope: Scope,
  statementId: string,
  rowKeys: readonly string[],
): Promise<void> {
  const keys = new Set(rowKeys);
  for (const variance of await variancesOf(scope, statementId)) {
    const isDecided = variance.status === 'accepted' || variance.status === 'claimed';
    if (!isDecided || !keys.has(variance.rowKey)) continue;
    await updateVariance(scope, variance.id, {
      status: 'open',
      reason: '',
      decidedBy: null,
      decidedAt: null,
    });
  }
}

export const undoLast = defineVerb({
  name: 'statements.undo',
  says: 'Take back the last thing that the asking person did on a sheet',
  kind: 'write',
  permission: 'statements.write',
  http: { method: 'POST', path: '/api/statements/{statementId}/undo' },
  input: statementRef,
  output: undoOutput,
  async run(ctx, { statementId }) {
    const opened = await openStatement(ctx, statementId);
    if (!opened.ok) return opened;
    const statement = opened.value;
    const last = await lastDoneBy(ctx.scope, statementId, ctx.actor.personId);
    if (!last) {
      ctx.unchanged();
      return ok({ undone: null, rows: [] });
    }
    const keys = last.kind === 'settled' ? last.rowKeys : [last.billLineId];
    if (last.kind === 'settled') {
      await deleteStrikes(ctx.scope, statementId, keys);
      await reopenVariances(ctx.scope, statementId, keys);
    } else await deleteMatchesOfLine(ctx.scope, last.billLineId);
    await keepFindings(ctx.scope, statement, ctx.company);
    const what = last.kind === 'settled' ? 'settling' : 'the match of';
    const words = keys.length === 1 ? 'one row' : `${keys.length} rows`;
    await ctx.record({
      action: 'statements.undo',
      entity: 'statement',
      entityId: statementId,
      summary: `Took back ${what} ${words} of ${statementInWords(statement)}`,
      before: last,
    });
    return ok({ undone: last.kind, rows: keys.map((key) => ({ key, settled: null })) });
  },
});
