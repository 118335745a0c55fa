import {
  billLineFacts,
  billLinesOf,
  countUnchecked,
  earlierLines,
  orderFacts,
  pumpTicketFacts,
  rateSheetFacts,
  type StoredBillLine,
  type SupplierWindow,
  ticketFacts,
} from '../../../db/queries/sheet-facts';
import { matchesOf, type StoredMatch } from '../../../db/queries/sheet-state';
import type { StoredStatement } from '../../../db/queries/statements';
import type { Scope } from '../../../db/tx';
import { shiftDay } from '../../clock';
import type { HandMatch } from '../../domain/matching/match';
import { money, sumMoney } from '../../domain/money/money';
import type { Tolerances, VarianceKind } from '../../domain/variance/finding';
import type { ReconcileInput } from '../../domain/variance/reconcile';
import type { CompanySettings } from '../context';

/** A load can be billed up to two months late; older ones are not looked for. */
const LATE_DAYS = 62;
/** A bill's last day and ours can differ by a night's pour. */
const EARLY_DAYS = 3;

/** Everything that a statement is held against, as the engine takes it and as it is stored. */
export interface SheetFacts {
  readonly input: ReconcileInput;
  readonly storedLines: readonly StoredBillLine[];
  readonly storedMatches: readonly StoredMatch[];
  readonly ticketsToCheck: number;
}

export function tolerancesOf(company: CompanySettings): Tolerances {
  const found: Partial<Record<VarianceKind, Tolerances[VarianceKind]>> = {};
  for (const [kind, { absolute, percent }] of Object.entries(company.tolerances)) {
    found[kind as VarianceKind] = { absolute: money(absolute), percent };
  }
  return found as Tolerances;
}

/** The days whose deliveries can stand on the statement. */
export function windowOf(
  statement: Pick<StoredStatement, 'supplierId' | 'periodStart' | 'periodEnd'>,
  lines: readonly { readonly date: string | null }[],
): SupplierWindow {
  const days = [statement.periodStart, ...lines.flatMap((line) => line.date ?? [])].sort();
  return {
    supplierId: statement.supplierId,
    from: shiftDay(days[0] ?? statement.periodStart, -LATE_DAYS),
    to: shiftDay(statement.periodEnd, EARLY_DAYS),
  };
}

export function handMatchesOf(stored: readonly StoredMatch[]): HandMatch[] {
  return stored
    .filter((match) => match.method === 'hand')
    .map(({ billLineId, ticketId, pumpTicketId }) => ({
      billLineId,
      delivery: ticketId
        ? { kind: 'ticket', id: ticketId }
        : pumpTicketId
          ? { kind: 'pumpTicket', id: pumpTicketId }
          : null,
    }));
}

/** What the printed balances say the new charges come to; null where one is not printed. */
function printedTotal(statement: StoredStatement, lines: readonly StoredBillLine[]) {
  const { openingBalance, closingBalance } = statement;
  if (openingBalance === null || closingBalance === null) return null;
  const account = lines.filter(({ lineKind }) => lineKind === 'credit' || lineKind === 'payment');
  const moved = sumMoney(account.map((line) => money(line.amount)));
  return money(money(closingBalance).minus(openingBalance).minus(moved));
}

export async function loadSheetFacts(
  scope: Scope,
  statement: StoredStatement,
  company: CompanySettings,
): Promise<SheetFacts> {
  const storedLines = await billLinesOf(scope, statement.id);
  const storedMatches = await matchesOf(scope, statement.id);
  const window = windowOf(statement, storedLines);
  const tickets = await ticketFacts(scope, window);
  const pumpTickets = await pumpTicketFacts(scope, window);
  const orderIds = new Set([...tickets, ...pumpTickets].flatMap((one) => one.orderId ?? []));
  const { periodStart, periodEnd } = statement;
  return {
    storedLines,
    storedMatches,
    ticketsToCheck: await countUnchecked(scope, {
      ...window,
      from: periodStart,
      to: periodEnd,
    }),
    input: {
      rateSheets: await rateSheetFacts(scope, statement.supplierId),
      orders: await orderFacts(scope, [...orderIds]),
      tickets,
      pumpTickets,
      billLines: storedLines
        .filter(({ lineKind }) => lineKind === 'charge' || lineKind === 'tax')
        .map(billLineFacts),
      earlierLines: await earlierLines(scope, window, statement.id),
      handMatches: handMatchesOf(storedMatches),
      tolerances: tolerancesOf(company),
      statement: { periodStart, periodEnd, total: printedTotal(statement, storedLines) },
    },
  };
}
