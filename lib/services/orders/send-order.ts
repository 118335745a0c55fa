import {
  findOrder,
  keepOrderVersion,
  orderLinesOf,
  updateOrderRow,
} from '../../../db/queries/orders';
import { orderDetail, orderRef } from '../../contracts/orders';
import { fail, ok } from '../../domain/result';
import { orderMail } from '../../mail/templates';
import { writeMail } from '../../mail/write-mail';
import { clockFigure, weekdayText } from '../../text/format';
import { failure, notFound } from '../failure';
import { crewLimit } from '../tickets/internal';
import { defineVerb } from '../verb';
import { changedOrder, lineInWords, snapshotOf } from './internal';

export const sendOrder = defineVerb({
  name: 'orders.send',
  says: 'Send a drafted order to the supplier’s dispatch by e-mail; the version sent is kept',
  kind: 'write',
  permission: 'orders.write',
  http: { method: 'POST', path: '/api/orders/{orderId}/send' },
  input: orderRef,
  output: orderDetail,
  async run(ctx, { orderId }) {
    const order = await findOrder(ctx.scope, orderId, crewLimit(ctx.actor), true);
    if (!order) return fail(notFound('order'));
    if (order.status === 'cancelled') {
      return fail(failure('closed', `Order ${order.number} is cancelled. Draft a new one.`));
    }
    if (order.status !== 'draft') {
      ctx.unchanged();
      return ok(await changedOrder(ctx, orderId));
    }
    if (order.dispatchEmail === '') {
      return fail(
        failure(
          'conflict',
          `${order.supplierName} has no e-mail address for dispatch. Add it on the supplier’s page, ` +
            'or phone the order in and mark it confirmed.',
        ),
      );
    }
    const lines = await orderLinesOf(ctx.scope, orderId);
    const mail = orderMail({
      companyName: ctx.company.name,
      orderNumber: order.number,
      version: order.version,
      supplierName: order.supplierName,
      jobName: `${order.jobNumber} ${order.jobName}`,
      jobAddress: order.jobAddress,
      pourDay: `${weekdayText(order.pourDate)} ${order.pourDate.slice(0, 4)}`,
      firstTruck:
        order.firstTruckAt === null ? null : clockFigure(order.firstTruckAt, ctx.company.clock),
      spacingMinutes: order.spacingMinutes,
      lines: lines.map(lineInWords),
      notes: order.notes,
      orderedBy: ctx.actor.name,
      answerTo: ctx.actor.email,
    });
    await writeMail(ctx, { ...mail, to: order.dispatchEmail });
    await keepOrderVersion(ctx.scope, orderId, order.version, snapshotOf(order, lines));
    await updateOrderRow(ctx.scope, orderId, { status: 'sent', sentAt: ctx.clock.now() });
    const after = await changedOrder(ctx, orderId);
    await ctx.record({
      action: 'orders.send',
      entity: 'order',
      entityId: orderId,
      summary: `Sent order ${order.number}, version ${order.version}, to ${order.supplierName}`,
      before: { status: order.status },
      after,
    });
    return ok(after);
  },
});
