import { orderFacts, rateSheetFacts } from '../../../db/queries/sheet-facts';
import {
  type BilledTie,
  billedTies,
  invoiceSums,
  orderedYards,
  type PouredPlacement,
  placedPumpTickets,
  placedTickets,
  placementsBetween,
} from '../../../db/queries/yield';
import type { Scope } from '../../../db/tx';
import type { YieldFigures } from '../../contracts/yield';
import type { ChargeKind, PumpTicketFacts, TicketFacts } from '../../domain/facts';
import { isMainCharge } from '../../domain/matching/delivery';
import { type Money, money, type Quantity, quantity, sumQuantity } from '../../domain/money/money';
import { expectedBill } from '../../domain/rating/expected-bill';
import { type ChargeShare, spreadCharges } from '../../domain/yield/spread';
import type { PlacementFacts } from '../../domain/yield/summary';

/** A placement with all that its figures rest on. */
export interface PlacedFacts {
  readonly placement: PouredPlacement;
  readonly facts: PlacementFacts;
  readonly costFrom: YieldFigures['costFrom'];
}

function grouped<Row>(rows: readonly Row[], keyOf: (row: Row) => string): Map<string, Row[]> {
  const groups = new Map<string, Row[]>();
  for (const row of rows) {
    const group = groups.get(keyOf(row)) ?? [];
    group.push(row);
    groups.set(keyOf(row), group);
  }
  return groups;
}

async function billedShares(scope: Scope, ties: readonly BilledTie[]): Promise<ChargeShare[]> {
  const invoiceIds = new Set(ties.flatMap((tie) => tie.invoiceId ?? []));
  const sums = await invoiceSums(scope, [...invoiceIds]);
  const lines = [...grouped(ties, (tie) => tie.lineId).values()].flatMap((group) => {
    const [first] = group;
    if (!first) return [];
    return [
      {
        lineId: first.lineId,
        invoiceId: first.invoiceId,
        chargeKind: first.chargeKind,
        amount: money(first.amount),
        deliveryIds: group.map((tie) => tie.deliveryId),
      },
    ];
  });
  const invoices = [...sums].map(
    ([id, { charges, tax }]) => [id, { charges: money(charges), tax: money(tax) }] as const,
  );
  return spreadCharges(lines, new Map(invoices));
}

/** What the rate sheets say of deliveries that nobody has billed yet. */
async function expectedShares(
  scope: Scope,
  tickets: readonly TicketFacts[],
  pumpTickets: readonly PumpTicketFacts[],
): Promise<ChargeShare[]> {
  if (tickets.length + pumpTickets.length === 0) return [];
  const orderIds = new Set([...tickets, ...pumpTickets].flatMap((one) => one.orderId ?? []));
  const { lines } = expectedBill({
    rateSheets: await rateSheetFacts(scope, null),
    orders: await orderFacts(scope, [...orderIds]),
    tickets,
    pumpTickets,
  });
  return lines.flatMap((line): ChargeShare[] => {
    const deliveryIds = [...line.ticketIds, ...line.pumpTicketIds];
    const amount = line.status === 'owed' ? line.amount : line.lowest;
    return deliveryIds.map((deliveryId) => ({
      deliveryId,
      chargeKind: line.chargeKind,
      amount: money(amount.dividedBy(deliveryIds.length)),
    }));
  });
}

/** Yards that concrete lines charge for, by delivery; a line for several loads in equal parts. */
function billedYards(ties: readonly BilledTie[]): Map<string, Quantity> {
  const yards = new Map<string, Quantity>();
  for (const group of grouped(ties, (tie) => tie.lineId).values()) {
    for (const tie of group) {
      if (tie.chargeKind !== 'mix' || tie.quantity === null) continue;
      const share = quantity(quantity(tie.quantity).dividedBy(group.length));
      yards.set(tie.deliveryId, quantity((yards.get(tie.deliveryId) ?? quantity('0')).plus(share)));
    }
  }
  return yards;
}

function sourceOf(deliveryIds: readonly string[], billed: ReadonlySet<string>) {
  if (deliveryIds.length === 0) return 'none';
  const count = deliveryIds.filter((id) => billed.has(id)).length;
  return count === 0 ? 'expected' : count === deliveryIds.length ? 'billed' : 'both';
}

/** Every placement of the filter with its deliveries, what was ordered, and what it cost. */
export async function placedFacts(
  scope: Scope,
  filter: Parameters<typeof placementsBetween>[1],
): Promise<PlacedFacts[]> {
  const found = await placementsBetween(scope, filter);
  const ids = found.map((placement) => placement.id);
  const tickets = await placedTickets(scope, ids);
  const pumpTickets = await placedPumpTickets(scope, ids);
  const ordered = await orderedYards(scope, ids);
  const ties = await billedTies(scope, ids);
  const billed = new Set(
    ties.filter((tie) => isMainCharge(tie.chargeKind)).map((tie) => tie.deliveryId),
  );
  const unbilled = <Facts extends { readonly id: string }>(rows: readonly { facts: Facts }[]) =>
    rows.map((row) => row.facts).filter((facts) => !billed.has(facts.id));
  const shares = grouped(
    [
      ...(await billedShares(scope, ties)),
      ...(await expectedShares(scope, unbilled(tickets), unbilled(pumpTickets))),
    ],
    (share) => share.deliveryId,
  );
  const yards = billedYards(ties);
  const ticketsOf = grouped(tickets, (row) => row.placementId);
  const pumpsOf = grouped(pumpTickets, (row) => row.placementId);
  return found.map((placement): PlacedFacts => {
    const loads = (ticketsOf.get(placement.id) ?? []).map((row) => row.facts);
    const pumps = (pumpsOf.get(placement.id) ?? []).map((row) => row.facts);
    const deliveryIds = [...loads, ...pumps].map((one) => one.id);
    const charged = loads.flatMap((load) => yards.get(load.id) ?? []);
    const orderedYd3 = ordered.get(placement.id);
    const orNull = (text: string | null | undefined) => (text ? quantity(text) : null);
    return {
      placement,
      costFrom: sourceOf(deliveryIds, billed),
      facts: {
        figuredYd3: quantity(placement.figuredYd3),
        areaFt2: orNull(placement.areaFt2),
        orderedYd3: orNull(orderedYd3),
        billedYd3: charged.length === 0 ? null : sumQuantity(charged),
        tickets: loads,
        charges: deliveryIds.flatMap((id): { chargeKind: ChargeKind; amount: Money }[] =>
          (shares.get(id) ?? []).map(({ chargeKind, amount }) => ({ chargeKind, amount })),
        ),
      },
    };
  });
}
