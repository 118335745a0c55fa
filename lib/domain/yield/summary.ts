import type { ChargeKind, TicketFacts } from '../facts';
import {
  type Money,
  money,
  type Quantity,
  quantity,
  roundCents,
  sumMoney,
  sumQuantity,
} from '../money/money';
import { unrollPastMidnight } from '../time/clock-minutes';
import { impliedThicknessIn, overrunShare } from './measures';

/** What one placement planned and got. */
export interface PlacementFacts {
  readonly figuredYd3: Quantity | null;
  readonly areaFt2: Quantity | null;
  readonly orderedYd3: Quantity | null;
  /** Yards that bills charge for its tickets; null while nothing is billed. */
  readonly billedYd3: Quantity | null;
  readonly tickets: readonly TicketFacts[];
  /** Everything charged for it, billed or expected, with tax where known. */
  readonly charges: readonly { readonly chargeKind: ChargeKind; readonly amount: Money }[];
}

export const COST_PARTS = ['concrete', 'shortLoad', 'waiting', 'fees', 'pump', 'tax'] as const;
export type CostPart = (typeof COST_PARTS)[number];

const PART_OF: Readonly<Record<ChargeKind, CostPart>> = {
  mix: 'concrete',
  shortLoad: 'shortLoad',
  waiting: 'waiting',
  perLoadFee: 'fees',
  perYardFee: 'fees',
  other: 'fees',
  pumpTime: 'pump',
  pumpMinimum: 'pump',
  pumpYards: 'pump',
  pumpSetUp: 'pump',
  tax: 'tax',
};

export interface CostShare {
  readonly part: CostPart;
  readonly amount: Money;
  readonly perYd3: Money | null;
}

export interface YieldSummary {
  readonly placements: number;
  readonly loads: number;
  readonly figuredYd3: Quantity | null;
  readonly orderedYd3: Quantity | null;
  readonly deliveredYd3: Quantity;
  readonly returnedYd3: Quantity;
  readonly billedYd3: Quantity | null;
  /** As a share of the figured yards; null where any placement has none. */
  readonly overrun: Quantity | null;
  readonly impliedThicknessIn: Quantity | null;
  /** Arrival to finish, of the loads that have both times. */
  readonly onSiteMinutes: number;
  readonly timedLoads: number;
  readonly minutesPerLoad: Quantity | null;
  readonly minutesPerYd3: Quantity | null;
  readonly cost: Money;
  readonly costPerYd3: Money | null;
  readonly costParts: readonly CostShare[];
  /** Too few loads to read anything into. */
  readonly smallSample: boolean;
}

/** Fewer loads than this say little: one late truck moves every figure. */
export const SMALL_SAMPLE_LOADS = 5;

/** Minutes from arrival to finish, else to leaving; null where the ticket does not tell. */
export function minutesOnSite(ticket: TicketFacts): number | null {
  const [arrived = null, ended = null] = unrollPastMidnight([
    ticket.arrivedAt,
    ticket.finishedAt ?? ticket.leftAt,
  ]);
  return arrived === null || ended === null || ended < arrived ? null : ended - arrived;
}

/** The sum where every placement has the figure, else null: a part would mislead as a whole. */
function sumOfAll(values: readonly (Quantity | null)[]): Quantity | null {
  const known = values.filter((value) => value !== null);
  return known.length > 0 && known.length === values.length ? sumQuantity(known) : null;
}

function per<T extends Money | Quantity>(amount: T, over: Quantity): T | null {
  return over.lte(0) ? null : (amount.dividedBy(over) as T);
}

function costParts(charges: PlacementFacts['charges'], netYd3: Quantity): CostShare[] {
  return COST_PARTS.flatMap((part) => {
    const amounts = charges.filter(({ chargeKind }) => PART_OF[chargeKind] === part);
    if (amounts.length === 0) return [];
    const amount = sumMoney(amounts.map((charge) => charge.amount));
    const perYd3 = per(amount, netYd3);
    return [{ part, amount, perYd3: perYd3 && roundCents(perYd3) }];
  });
}

/**
 * Figured, ordered, delivered, billed and what it cost all-in, of one placement or of several
 * together (a job, a month). The cost per yard is over the yards that stayed: delivered less
 * returned.
 */
export function summarizeYield(placements: readonly PlacementFacts[]): YieldSummary {
  const tickets = placements.flatMap((placement) => placement.tickets);
  const charges = placements.flatMap((placement) => placement.charges);
  const deliveredYd3 = sumQuantity(tickets.map((ticket) => ticket.quantityYd3));
  const returnedYd3 = sumQuantity(tickets.flatMap((ticket) => ticket.returnedYd3 ?? []));
  const netYd3 = quantity(deliveredYd3.minus(returnedYd3));
  const figuredYd3 = sumOfAll(placements.map((placement) => placement.figuredYd3));
  const areaFt2 = sumOfAll(placements.map((placement) => placement.areaFt2));
  const timed = tickets.flatMap((ticket) => {
    const minutes = minutesOnSite(ticket);
    return minutes === null ? [] : [{ minutes, yd3: ticket.quantityYd3 }];
  });
  const onSiteMinutes = timed.reduce((total, one) => total + one.minutes, 0);
  const minutes = quantity(String(onSiteMinutes));
  const cost = sumMoney(charges.map((charge) => charge.amount));
  const costPerYd3 = per(cost, netYd3);
  const delivered = deliveredYd3.gt(0);
  return {
    placements: placements.length,
    loads: tickets.length,
    figuredYd3,
    orderedYd3: sumOfAll(placements.map((placement) => placement.orderedYd3)),
    deliveredYd3,
    returnedYd3,
    billedYd3: sumOfAll(placements.map((placement) => placement.billedYd3)),
    overrun:
      delivered && figuredYd3?.gt(0) ? overrunShare(figuredYd3, deliveredYd3, returnedYd3) : null,
    impliedThicknessIn: delivered && areaFt2?.gt(0) ? impliedThicknessIn(netYd3, areaFt2) : null,
    onSiteMinutes,
    timedLoads: timed.length,
    minutesPerLoad: per(minutes, quantity(String(timed.length))),
    minutesPerYd3: per(minutes, sumQuantity(timed.map((one) => one.yd3))),
    cost,
    costPerYd3: costPerYd3 && money(roundCents(costPerYd3)),
    costParts: costParts(charges, netYd3),
    smallSample: tickets.length < SMALL_SAMPLE_LOADS,
  };
}
