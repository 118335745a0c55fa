import { findStatement, type StoredStatement } from '../../../db/queries/statements';
import type { SheetRow } from '../../contracts/sheet';
import type { Result } from '../../domain/result';
import { fail, ok } from '../../domain/result';
import type { Ctx } from '../context';
import type { Failure } from '../failure';
import { failure, notFound } from '../failure';

/** "statement CR-2611 of Cinder Ridge Ready-Mix" */
export function statementInWords(statement: StoredStatement): string {
  return `statement ${statement.number} of ${statement.supplierName}`;
}

/** The statement, locked for a change; refused once it is closed. */
export async function openStatement(
  ctx: Ctx,
  statementId: string,
): Promise<Result<StoredStatement, Failure>> {
  const statement = await findStatement(ctx.scope, statementId, true);
  if (!statement) return fail(notFound('statement'));
  if (statement.status === 'closed') {
    return fail(
      failure('closed', `The ${statementInWords(statement)} is closed. The owner can reopen it.`),
    );
  }
  return ok(statement);
}

/** The rows that keys name, in their order; a key that the sheet does not have is refused. */
export function rowsNamed(
  rows: readonly SheetRow[],
  keys: readonly string[],
): Result<SheetRow[], Failure> {
  const byKey = new Map(rows.map((row) => [row.key, row]));
  const found: SheetRow[] = [];
  for (const key of new Set(keys)) {
    const row = byKey.get(key);
    if (!row) {
      return fail(
        failure(
          'conflict',
          'The sheet has changed and no longer has one of these rows. It was loaded again.',
        ),
      );
    }
    found.push(row);
  }
  return ok(found);
}

/** "line 14", "ticket 558884", "the document" */
export function rowInWords(row: SheetRow): string {
  if (row.billed) return `line ${row.billed.position}`;
  const [delivery] = row.deliveries;
  return delivery ? `ticket ${delivery.number}` : 'the document';
}

export function rowsInWords(rows: readonly SheetRow[]): string {
  const [first] = rows;
  return rows.length === 1 && first ? rowInWords(first) : `${rows.length} rows`;
}
