import { findStatement, type StoredStatement } from '../../../db/queries/statements';
import { type Sheet, sheet, sheetRow } from '../../contracts/sheet';
import { statementRef } from '../../contracts/statements';
import { fail, ok } from '../../domain/result';
import type { Ctx } from '../context';
import { notFound } from '../failure';
import { defineVerb } from '../verb';
import { workOut } from './keep-findings';

function headOf(statement: StoredStatement): Sheet['statement'] {
  return {
    id: statement.id,
    number: statement.number,
    kind: statement.kind,
    supplierId: statement.supplierId,
    supplierName: statement.supplierName,
    periodStart: statement.periodStart,
    periodEnd: statement.periodEnd,
    openingBalance: statement.openingBalance,
    closingBalance: statement.closingBalance,
    status: statement.status,
    closedAt: statement.closedAt?.toISOString() ?? null,
    closedBy: statement.closedByName,
  };
}

const timesOf = ({ company }: Ctx) => ({ timeZone: company.timeZone, clock: company.clock });

/** The sheet as it is now, or as it stood when the statement was closed. */
export async function sheetOf(ctx: Ctx, statement: StoredStatement): Promise<Sheet> {
  if (statement.status === 'closed') {
    return {
      statement: headOf(statement),
      times: timesOf(ctx),
      rows: sheetRow.array().parse(statement.closedRows),
      ticketsToCheck: 0,
      upToDate: true,
    };
  }
  const { facts, rows, upToDate } = await workOut(ctx.scope, statement, ctx.company);
  return {
    statement: headOf(statement),
    times: timesOf(ctx),
    rows: [...rows],
    ticketsToCheck: facts.ticketsToCheck,
    upToDate,
  };
}

export const getSheet = defineVerb({
  name: 'statements.sheet',
  says: 'Read a statement’s strike-off sheet: every row with what was ordered, delivered, billed and expected',
  kind: 'read',
  permission: 'statements.read',
  http: { method: 'GET', path: '/api/statements/{statementId}/sheet' },
  input: statementRef,
  output: sheet,
  async run(ctx, { statementId }) {
    const statement = await findStatement(ctx.scope, statementId);
    return statement ? ok(await sheetOf(ctx, statement)) : fail(notFound('statement'));
  },
});
