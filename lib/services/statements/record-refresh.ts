import type { StoredStatement } from '../../../db/queries/statements';
import type { Ctx } from '../context';
import { statementInWords } from './internal';
import type { Kept } from './keep-findings';

/** Records that a sheet was held against its facts again, and what that opened. */
export async function recordRefresh(
  ctx: Ctx,
  statement: StoredStatement,
  { reopened }: Kept,
): Promise<void> {
  const opened = reopened.length > 0 ? `: ${reopened.length} settled rows are open again` : '';
  await ctx.record({
    action: 'statements.refresh',
    entity: 'statement',
    entityId: statement.id,
    summary: `Held ${statementInWords(statement)} against its facts again${opened}`,
    after: { reopened },
  });
}
