import { findOrder, updateOrderRow } from '../../../db/queries/orders';
import { confirmOrderInput, orderDetail } from '../../contracts/orders';
import { fail, ok } from '../../domain/result';
import { failure, notFound } from '../failure';
import { crewLimit } from '../tickets/internal';
import { defineVerb } from '../verb';
import { changedOrder } from './internal';

export const confirmOrder = defineVerb({
  name: 'orders.confirm',
  says: 'Mark an order as confirmed by the supplier, with their own number',
  kind: 'write',
  permission: 'orders.write',
  http: { method: 'POST', path: '/api/orders/{orderId}/confirm' },
  input: confirmOrderInput,
  output: orderDetail,
  async run(ctx, { orderId, supplierReference }) {
    const order = await findOrder(ctx.scope, orderId, crewLimit(ctx.actor), true);
    if (!order) return fail(notFound('order'));
    if (order.status === 'cancelled') {
      return fail(failure('closed', `Order ${order.number} is cancelled. Draft a new one.`));
    }
    if (order.status === 'confirmed' && order.supplierReference === supplierReference) {
      ctx.unchanged();
      return ok(await changedOrder(ctx, orderId));
    }
    await updateOrderRow(ctx.scope, orderId, {
      status: 'confirmed',
      supplierReference,
      confirmedAt: ctx.clock.now(),
    });
    const after = await changedOrder(ctx, orderId);
    await ctx.record({
      action: 'orders.confirm',
      entity: 'order',
      entityId: orderId,
      summary: `Marked order ${order.number} as confirmed by ${order.supplierName}`,
      before: { status: order.status, supplierReference: order.supplierReference },
      after: { status: 'confirmed', supplierReference },
    });
    return ok(after);
  },
});
