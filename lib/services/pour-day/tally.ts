import { deliveredTo } from '../../../db/queries/pour-day';
import { loadsOfPlacement } from '../../../db/queries/ticket-list';
import type { PlacementOrder } from '../../../db/queries/ticket-ties';
import { ordersOfPlacements } from '../../../db/queries/ticket-ties';
import type { Scope } from '../../../db/tx';
import type { TicketRow } from '../../contracts/tickets';
import { quantity, quantityText, sumQuantity } from '../../domain/money/money';

export interface Tally {
  readonly orderedYd3: string | null;
  readonly inYd3: string;
  readonly loadsIn: number;
  readonly toCheck: number;
  readonly toCheckYd3: string;
}

export interface PlacementWork {
  readonly tally: Tally;
  readonly loads: TicketRow[];
  readonly orders: PlacementOrder[];
}

const YARD_UNITS = new Set(['yd3', 'yd³', 'yd', 'yards', 'cy']);

/** What a placement's orders, tickets and readings come to. */
export async function placementWork(
  scope: Scope,
  placementIds: string[],
): Promise<Map<string, PlacementWork>> {
  const orders = await ordersOfPlacements(scope, placementIds);
  const delivered = await deliveredTo(scope, placementIds);
  const work = new Map<string, PlacementWork>();
  for (const id of placementIds) {
    const loads = await loadsOfPlacement(scope, id);
    const ordersHere = orders.get(id) ?? [];
    const unchecked = loads.filter((load) => load.status === 'toCheck');
    work.set(id, {
      loads,
      orders: ordersHere,
      tally: {
        orderedYd3: orderedYards(ordersHere),
        inYd3: quantityText(quantity(delivered.get(id)?.inYd3 ?? '0')),
        loadsIn: delivered.get(id)?.loadsIn ?? 0,
        toCheck: unchecked.length,
        toCheckYd3: yardsRead(unchecked),
      },
    });
  }
  return work;
}

/** Yards of concrete on orders that went out; null where none did. */
function orderedYards(orders: readonly PlacementOrder[]): string | null {
  const lines = orders
    .filter((order) => order.supplierKind === 'readyMix')
    .filter((order) => order.status === 'sent' || order.status === 'confirmed')
    .flatMap((order) => order.lines)
    .filter((line) => YARD_UNITS.has(line.unit.toLowerCase()));
  if (lines.length === 0) return null;
  return quantityText(sumQuantity(lines.map((line) => quantity(line.quantity))));
}

function yardsRead(loads: readonly TicketRow[]): string {
  const read = loads
    .map((load) => load.reading?.quantityYd3 ?? null)
    .filter((text) => text !== null && /^\d{1,3}(\.\d{1,2})?$/.test(text));
  return quantityText(sumQuantity(read.map((text) => quantity(text ?? '0'))));
}
