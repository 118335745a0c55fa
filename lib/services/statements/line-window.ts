import {
  billLinesOf,
  pumpTicketFacts,
  type StoredBillLine,
  ticketFacts,
} from '../../../db/queries/sheet-facts';
import type { StoredStatement } from '../../../db/queries/statements';
import type { Scope } from '../../../db/tx';
import type { PumpTicketFacts, TicketFacts } from '../../domain/facts';
import { windowOf } from './sheet-facts';

export async function lineOf(
  scope: Scope,
  statementId: string,
  billLineId: string,
): Promise<StoredBillLine | null> {
  const lines = await billLinesOf(scope, statementId);
  return lines.find((line) => line.id === billLineId) ?? null;
}

/** The supplier's deliveries of the days in which a line's own is looked for. */
export async function deliveriesNear(
  scope: Scope,
  statement: StoredStatement,
  line: StoredBillLine,
): Promise<{ readonly tickets: TicketFacts[]; readonly pumpTickets: PumpTicketFacts[] }> {
  const window = windowOf(statement, [line]);
  return {
    tickets: await ticketFacts(scope, window),
    pumpTickets: await pumpTicketFacts(scope, window),
  };
}
