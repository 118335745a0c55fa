import { and, asc, desc, eq, isNotNull, ne } from 'drizzle-orm';
import type { ReadContext } from '../../importers/ocr/reading';
import { suppliers } from '../schema/suppliers';
import { tickets } from '../schema/tickets';
import type { Scope } from '../tx';
import { ordersOfPlacements } from './ticket-ties';

/** More mixes than this a supplier hardly sells; the reader compares with each of them. */
const MAX_MIXES = 500;

/**
 * What a reader may expect on a ticket: the company's ready-mix suppliers with the mixes that
 * were ordered or delivered, and the orders of the placement.
 */
export async function readingContext(
  scope: Scope,
  placementId: string | null,
): Promise<Pick<ReadContext, 'suppliers' | 'orders'>> {
  const names = await scope.handle
    .select({ id: suppliers.id, name: suppliers.name })
    .from(suppliers)
    .where(
      and(
        eq(suppliers.companyId, scope.companyId),
        eq(suppliers.kind, 'readyMix'),
        eq(suppliers.archived, false),
      ),
    )
    .orderBy(asc(suppliers.name));
  const delivered = await scope.handle
    .selectDistinct({ supplierId: tickets.supplierId, mixCode: tickets.mixCode })
    .from(tickets)
    .where(
      and(
        eq(tickets.companyId, scope.companyId),
        eq(tickets.status, 'confirmed'),
        isNotNull(tickets.supplierId),
        ne(tickets.mixCode, ''),
      ),
    )
    .orderBy(asc(tickets.supplierId), desc(tickets.mixCode))
    .limit(MAX_MIXES);
  const orders = placementId
    ? ((await ordersOfPlacements(scope, [placementId])).get(placementId) ?? []).filter(
        (order) => order.supplierKind === 'readyMix',
      )
    : [];
  const mixesOf = (supplierId: string) => [
    ...new Set([
      ...delivered.filter((one) => one.supplierId === supplierId).map((one) => one.mixCode),
      ...orders
        .filter((order) => order.supplierId === supplierId)
        .flatMap((order) => order.lines.map((line) => line.code)),
    ]),
  ];
  return {
    suppliers: names.map(({ id, name }) => ({ name, mixCodes: mixesOf(id) })),
    orders: orders.flatMap((order) =>
      order.lines.slice(0, 1).map((line) => ({
        number: order.supplierReference || order.number,
        supplierName: order.supplierName,
        mixCode: line.code,
        orderedYd3: line.quantity,
      })),
    ),
  };
}
