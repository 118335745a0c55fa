import type { OrderFacts, TicketFacts } from '../facts';

/** What a delivery's order, or else its job's orders, say about it. */
export interface OrderIndex {
  /** True where the place of delivery is exempt from sales tax. */
  isExempt(delivery: { readonly orderId: string | null; readonly jobId: string | null }): boolean;
  /** Whether a load is the last of several of its order; null while its order is not known. */
  isBalanceLoad(ticket: TicketFacts): boolean | null;
}

/** The order in which loads came: by load number, then by the clock, then by ticket number. */
function cameBefore(one: TicketFacts, other: TicketFacts): number {
  const byDate = one.date < other.date ? -1 : one.date > other.date ? 1 : 0;
  const clock = (ticket: TicketFacts) =>
    ticket.batchedAt ?? ticket.arrivedAt ?? ticket.startedAt ?? ticket.finishedAt;
  const byLoad =
    one.loadNumber !== null && other.loadNumber !== null ? one.loadNumber - other.loadNumber : 0;
  const [first, second] = [clock(one), clock(other)];
  const byClock = first !== null && second !== null ? first - second : 0;
  const byNumber = one.number < other.number ? -1 : one.number > other.number ? 1 : 0;
  return byDate || byLoad || byClock || byNumber || (one.id < other.id ? -1 : 1);
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
    const last = seen && cameBefore(ticket, seen.last) < 0 ? seen.last : ticket;
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
