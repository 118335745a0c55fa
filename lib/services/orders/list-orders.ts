import { listOrders as find } from '../../../db/queries/orders';
import { listOrdersInput, listOrdersOutput } from '../../contracts/orders';
import { ok } from '../../domain/result';
import { crewLimit } from '../tickets/internal';
import { defineVerb } from '../verb';

export const listOrders = defineVerb({
  name: 'orders.list',
  says: 'List orders, a page at a time (a foreman: those of his jobs)',
  kind: 'read',
  permission: 'orders.read',
  http: { method: 'GET', path: '/api/orders' },
  input: listOrdersInput,
  output: listOrdersOutput,
  async run({ scope, actor }, { offset, limit, ...filter }) {
    return ok(await find(scope, filter, crewLimit(actor), { offset, limit }));
  },
});
