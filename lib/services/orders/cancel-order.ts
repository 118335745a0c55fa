import { findOrder, updateOrderRow } from '../../../db/queries/orders';
import { cancelOrderInput, orderDetail } from '../../contracts/orders';
import { fail, ok } from '../../domain/result';
import { cancelledOrderMail } from '../../mail/templates';
import { writeMail } from '../../mail/write-mail';
import { weekdayText } from '../../text/format';
import { notFound } from '../failure';
import { crewLimit } from '../tickets/internal';
import { defineVerb } from '../verb';
import { changedOrder } from './internal';

export const cancelOrder = defineVerb({
  name: 'orders.cancel',
  says: 'Cancel an order with a reason; dispatch is told where the order had been sent',
  kind: 'write',
  permission: 'orders.write',
  http: { method: 'POST', path: '/api/orders/{orderId}/cancel' },
  input: cancelOrderInput,
  output: orderDetail,
  async run(ctx, { orderId, reason }) {
    const order = await findOrder(ctx.scope, orderId, crewLimit(ctx.actor), true);
    if (!order) return fail(notFound('order'));
    if (order.status === 'cancelled') {
      ctx.unchanged();
      return ok(await changedOrder(ctx, orderId));
    }
    if (order.sentAt !== null && order.dispatchEmail !== '') {
      const mail = cancelledOrderMail({
        companyName: ctx.company.name,
        orderNumber: order.number,
        supplierName: order.supplierName,
        jobName: `${order.jobNumber} ${order.jobName}`,
        pourDay: `${weekdayText(order.pourDate)} ${order.pourDate.slice(0, 4)}`,
        reason,
        cancelledBy: ctx.actor.name,
        answerTo: ctx.actor.email,
      });
      await writeMail(ctx, { ...mail, to: order.dispatchEmail });
    }
    await updateOrderRow(ctx.scope, orderId, {
      status: 'cancelled',
      cancelledAt: ctx.clock.now(),
    });
    const after = await changedOrder(ctx, orderId);
    await ctx.record({
      action: 'orders.cancel',
      entity: 'order',
      entityId: orderId,
      summary: `Cancelled order ${order.number} to ${order.supplierName}: ${reason}`,
      before: { status: order.status },
      after: { status: 'cancelled', reason },
    });
    return ok(after);
  },
});
