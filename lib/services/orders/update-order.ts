import {
  findOrder,
  orderTiesHold,
  setOrderLines,
  updateOrderRow,
} from '../../../db/queries/orders';
import { orderDetail, updateOrderInput } from '../../contracts/orders';
import { fail, ok } from '../../domain/result';
import { failure, notFound } from '../failure';
import { crewLimit } from '../tickets/internal';
import { defineVerb } from '../verb';
import { changedOrder } from './internal';

export const updateOrder = defineVerb({
  name: 'orders.update',
  says: 'Change an order; one that was sent becomes a new version that has to be sent again',
  kind: 'write',
  permission: 'orders.write',
  http: { method: 'PUT', path: '/api/orders/{orderId}' },
  input: updateOrderInput,
  output: orderDetail,
  async run(ctx, { orderId, version, lines, ...values }) {
    const crew = crewLimit(ctx.actor);
    const stored = await findOrder(ctx.scope, orderId, crew, true);
    if (!stored) return fail(notFound('order'));
    if (stored.status === 'cancelled') {
      return fail(failure('closed', `Order ${stored.number} is cancelled. Draft a new one.`));
    }
    if (stored.version !== version) {
      return fail(
        failure('conflict', 'Somebody changed this order while you had it open. Look at it again.'),
      );
    }
    if (stored.sentAt !== null && stored.supplierId !== values.supplierId) {
      return fail(
        failure(
          'conflict',
          `${stored.supplierName} has this order. Cancel it, so that they are told, and draft a ` +
            'new one for the other supplier.',
          [{ path: 'supplierId', message: 'the order was sent to another' }],
        ),
      );
    }
    if (!(await orderTiesHold(ctx.scope, values, crew))) {
      return fail(notFound('supplier, job or placement'));
    }
    const before = await changedOrder(ctx, orderId);
    const wasSent = stored.status !== 'draft';
    await updateOrderRow(ctx.scope, orderId, {
      ...values,
      ...(wasSent ? { status: 'draft', version: version + 1, confirmedAt: null } : {}),
    });
    await setOrderLines(ctx.scope, orderId, lines);
    const after = await changedOrder(ctx, orderId);
    await ctx.record({
      action: 'orders.update',
      entity: 'order',
      entityId: orderId,
      summary: wasSent
        ? `Changed order ${after.number}: version ${after.version}, to be sent again`
        : `Changed the draft of order ${after.number}`,
      before,
      after,
    });
    return ok(after);
  },
});
