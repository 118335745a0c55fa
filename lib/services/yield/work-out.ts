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
  /** Deliveries that nobody has billed and no rate sheet covers. */
  readonly unpriced: number;
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

/** What the bills have of each delivery so far. */
interface BilledSoFar {
  /** Its concrete or its pump time is billed: nothing more is expected of it. */
  has(deliveryId: string): boolean;
  hasKind(deliveryId: string, kind: ChargeKind): boolean;
}

function billedSoFar(ties: readonly BilledTie[]): BilledSoFar {
  const main = new Set(
    ties.filter((tie) => isMainCharge(tie.chargeKind)).map((tie) => tie.deliveryId),
  );
  const kinds = new Set(ties.map((tie) => `${tie.deliveryId} ${tie.chargeKind}`));
  return {
    has: (deliveryId) => main.has(deliveryId),
    hasKind: (deliveryId, kind) => kinds.has(`${deliveryId} ${kind}`),
  };
}

interface Expected {
  readonly shares: readonly ChargeShare[];
  readonly unpriced: ReadonlySet<string>;
}

/**
 * What the rate sheets say of deliveries that nobody has billed yet. All are rated, the billed
 * ones too, since an order's loads tell which of them was the balance load; and each is taxed by
 * itself, so that what one job is expected to cost does not hang on what else is asked for.
 */
async function expectedShares(
  scope: Scope,
  tickets: readonly TicketFacts[],
  pumpTickets: readonly PumpTicketFacts[],
  billed: BilledSoFar,
): Promise<Expected> {
  const deliveries = [...tickets, ...pumpTickets];
  if (deliveries.every(({ id }) => billed.has(id))) return { shares: [], unpriced: new Set() };
  const orderIds = new Set(deliveries.flatMap((one) => one.orderId ?? []));
  const { lines, unrated } = expectedBill({
    rateSheets: await rateSheetFacts(scope, null),
    orders: await orderFacts(scope, [...orderIds]),
    tickets,
    pumpTickets,
    invoiceOf: new Map(deliveries.map(({ id }) => [id, id])),
  });
  const shares = lines.flatMap((line): ChargeShare[] =>
    [...line.ticketIds, ...line.pumpTicketIds]
      .filter((id) => !billed.has(id) && !billed.hasKind(id, line.chargeKind))
      .map((deliveryId) => ({
        deliveryId,
        chargeKind: line.chargeKind,
        amount: line.status === 'owed' ? line.amount : line.lowest,
      })),
  );
  const unpriced = unrated
    .flatMap((one) => one.ticketId ?? one.pumpTicketId ?? [])
    .filter((id) => !billed.has(id));
  return { shares, unpriced: new Set(unpriced) };
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

function sourceOf(pricedIds: readonly string[], billed: BilledSoFar) {
  if (pricedIds.length === 0) return 'none';
  const count = pricedIds.filter((id) => billed.has(id)).length;
  return count === 0 ? 'expected' : count === pricedIds.length ? 'billed' : 'both';
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
  const billed = billedSoFar(ties);
  const factsOf = <Facts>(rows: readonly { facts: Facts }[]) => rows.map((row) => row.facts);
  const expected = await expectedShares(scope, factsOf(tickets), factsOf(pumpTickets), billed);
  const shares = grouped(
    [...(await billedShares(scope, ties)), ...expected.shares],
    (share) => share.deliveryId,
  );
  const yards = billedYards(ties);
  const ticketsOf = grouped(tickets, (row) => row.placementId);
  const pumpsOf = grouped(pumpTickets, (row) => row.placementId);
  return found.map((placement): PlacedFacts => {
    const loads = factsOf(ticketsOf.get(placement.id) ?? []);
    const pumps = factsOf(pumpsOf.get(placement.id) ?? []);
    const deliveryIds = [...loads, ...pumps].map((one) => one.id);
    const charged = loads.flatMap((load) => yards.get(load.id) ?? []);
    const pricedIds = deliveryIds.filter((id) => !expected.unpriced.has(id));
    const orderedYd3 = ordered.get(placement.id);
    const orNull = (text: string | null | undefined) => (text ? quantity(text) : null);
    return {
      placement,
      costFrom: sourceOf(pricedIds, billed),
      unpriced: deliveryIds.length - pricedIds.length,
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
