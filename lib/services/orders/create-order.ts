import {
  insertOrder,
  orderNumbers,
  orderTiesHold,
  setOrderLines,
} from '../../../db/queries/orders';
import { createOrderInput, orderDetail } from '../../contracts/orders';
import { fail, ok } from '../../domain/result';
import { failure, notFound } from '../failure';
import { crewLimit } from '../tickets/internal';
import { defineVerb } from '../verb';
import { changedOrder, nextOrderNumber, orderDetailOf } from './internal';

/** Two people who order at once want the same next number: one of them takes a later one. */
const ATTEMPTS = 20;

export const createOrder = defineVerb({
  name: 'orders.create',
  says: 'Draft an order; nothing is sent',
  kind: 'write',
  permission: 'orders.write',
  http: { method: 'POST', path: '/api/orders' },
  input: createOrderInput,
  output: orderDetail,
  async run(ctx, { clientId, lines, ...values }) {
    if (!(await orderTiesHold(ctx.scope, values, crewLimit(ctx.actor)))) {
      return fail(notFound('supplier, job or placement'));
    }
    // The device's id is the order's own, so a repeat finds what the first attempt made.
    const known = await orderDetailOf(ctx, clientId);
    if (known) {
      ctx.unchanged();
      return ok(known);
    }
    const numbers = await orderNumbers(ctx.scope);
    for (let past = 0; past < ATTEMPTS; past += 1) {
      const number = nextOrderNumber(numbers, past);
      if (!(await insertOrder(ctx.scope, { ...values, id: clientId, number }))) continue;
      await setOrderLines(ctx.scope, clientId, lines);
      const made = await changedOrder(ctx, clientId);
      await ctx.record({
        action: 'orders.create',
        entity: 'order',
        entityId: clientId,
        summary: `Drafted order ${number} to ${made.supplierName}`,
        after: made,
      });
      return ok(made);
    }
    return fail(failure('conflict', 'Many orders are being written at once. Try again.'));
  },
});
