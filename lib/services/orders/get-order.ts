import { orderDetail, orderRef } from '../../contracts/orders';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';
import { orderDetailOf } from './internal';

export const getOrder = defineVerb({
  name: 'orders.get',
  says: 'Read one order with its lines and every version that was sent',
  kind: 'read',
  permission: 'orders.read',
  http: { method: 'GET', path: '/api/orders/{orderId}' },
  input: orderRef,
  output: orderDetail,
  async run(ctx, { orderId }) {
    const found = await orderDetailOf(ctx, orderId);
    return found ? ok(found) : fail(notFound('order'));
  },
});
