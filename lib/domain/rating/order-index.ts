import type { OrderFacts, TicketFacts } from '../facts';

/** What a delivery's order, or else its job's orders, say about it. */
export interface OrderIndex {
  /** True where the place of delivery is exempt from sales tax. */
  isExempt(delivery: { readonly orderId: string | null; readonly jobId: string | null }): boolean;
  /** Whether a load is the last of several of its order; null while its order is not known. */
  isBalanceLoad(ticket: TicketFacts): boolean | null;
}

/**
 * The order in which loads came: by load number, then by the clock, then by ticket number. What is
 * not known sorts first, so that the order is one and the same however the tickets are given.
 */
function cameBefore(one: TicketFacts, other: TicketFacts): boolean {
  const [first, second] = [arrivalKey(one), arrivalKey(other)];
  const at = first.findIndex((part, index) => part !== second[index]);
  return at >= 0 && (first[at] ?? '') < (second[at] ?? '');
}

function arrivalKey(ticket: TicketFacts): readonly string[] {
  const clock = ticket.batchedAt ?? ticket.arrivedAt ?? ticket.startedAt ?? ticket.finishedAt;
  const padded = (value: number | null) => (value === null ? '' : String(value).padStart(6, '0'));
  return [ticket.date, padded(ticket.loadNumber), padded(clock), ticket.number, ticket.id];
}

export function indexOrders(
  orders: readonly OrderFacts[],
  tickets: readonly TicketFacts[],
): OrderIndex {
  const byId = new Map(orders.map((order) => [order.id, order]));
  const exemptJobs = new Map<string, boolean>();
  for (const { jobId, taxable } of orders) {
    if (jobId !== null) exemptJobs.set(jobId, (exemptJobs.get(jobId) ?? true) && !taxable);
  }
  const loads = new Map<string, { last: TicketFacts; count: number }>();
  for (const ticket of tickets) {
    if (ticket.orderId === null) continue;
    const seen = loads.get(ticket.orderId);
    const last = seen && cameBefore(ticket, seen.last) ? seen.last : ticket;
    loads.set(ticket.orderId, { last, count: (seen?.count ?? 0) + 1 });
  }
  return {
    isExempt({ orderId, jobId }) {
      const order = orderId === null ? undefined : byId.get(orderId);
      if (order) return !order.taxable;
      return jobId !== null && (exemptJobs.get(jobId) ?? false);
    },
    isBalanceLoad(ticket) {
      if (ticket.orderId === null) return null;
      const order = loads.get(ticket.orderId);
      return order !== undefined && order.count > 1 && order.last.id === ticket.id;
    },
  };
}
