import { insertStrikes, updateVariance, variancesOf } from '../../../db/queries/sheet-state';
import type { StoredStatement } from '../../../db/queries/statements';
import type { SettledRows, SettledState, SheetRow } from '../../contracts/sheet';
import type { Result } from '../../domain/result';
import { fail, ok } from '../../domain/result';
import type { Ctx } from '../context';
import type { Failure } from '../failure';
import { openStatement, rowsInWords, rowsNamed, statementInWords } from './internal';
import { keepFindings } from './keep-findings';
import { recordRefresh } from './record-refresh';

interface Decision {
  readonly statementId: string;
  readonly rowKeys: readonly string[];
  readonly state: SettledState;
  readonly reason: string;
}

const DONE: Record<SettledState, string> = {
  struck: 'Struck off',
  accepted: 'Accepted',
  claimed: 'Marked for a credit request:',
};

/**
 * Settles rows of an open sheet. Rows that are settled already stay as they are, so a repeat
 * changes nothing; `check` may refuse what can't be settled in this way.
 */
export async function settleRows(
  ctx: Ctx,
  decision: Decision,
  check: (rows: readonly SheetRow[]) => Failure | null,
): Promise<Result<SettledRows, Failure>> {
  const opened = await openStatement(ctx, decision.statementId);
  if (!opened.ok) return opened;
  const statement = opened.value;
  const kept = await keepFindings(ctx.scope, statement, ctx.company);
  const named = rowsNamed(kept.rows, decision.rowKeys);
  if (!named.ok) return named;
  const fresh = named.value.filter((row) => row.settled === null);
  const refused = check(fresh);
  if (refused) return fail(refused);
  const at = ctx.clock.now();
  if (fresh.length > 0) await store(ctx, statement, fresh, decision, at);
  else if (kept.changed) await recordRefresh(ctx, statement, kept);
  else ctx.unchanged();
  const { state, reason } = decision;
  const now = { state, reason, by: ctx.actor.name, at: at.toISOString() };
  return ok({ rows: named.value.map(({ key, settled }) => ({ key, settled: settled ?? now })) });
}

async function store(
  ctx: Ctx,
  statement: StoredStatement,
  rows: readonly SheetRow[],
  { state, reason }: Decision,
  at: Date,
): Promise<void> {
  await insertStrikes(
    ctx.scope,
    statement.id,
    rows.map((row) => row.key),
    { state, reason, madeBy: ctx.actor.personId, madeAt: at },
  );
  if (state !== 'struck') {
    const open = new Set(
      rows.flatMap((row) =>
        row.findings.filter((finding) => !finding.withinTolerance).map((finding) => finding.key),
      ),
    );
    for (const variance of await variancesOf(ctx.scope, statement.id)) {
      if (!open.has(variance.key)) continue;
      await updateVariance(ctx.scope, variance.id, {
        status: state,
        reason,
        decidedBy: ctx.actor.personId,
        decidedAt: at,
      });
    }
  }
  await ctx.record({
    action: `statements.${state === 'struck' ? 'strike' : state === 'accepted' ? 'accept' : 'claim'}`,
    entity: 'statement',
    entityId: statement.id,
    summary: `${DONE[state]} ${rowsInWords(rows)} of ${statementInWords(statement)}`,
    after: { state, reason, rowKeys: rows.map((row) => row.key) },
  });
}
