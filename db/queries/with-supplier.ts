import { type SQL, sql } from 'drizzle-orm';

/**
 * The condition that an order is with its supplier: sent or confirmed, or changed since and still
 * to be sent again. A draft that nobody has sent orders nothing. `order` is the table's name in
 * the query.
 */
export function isWithSupplier(order: 'o' | 'orders'): SQL {
  const name = sql.raw(order);
  return sql`(${name}.status in ('sent', 'confirmed')
    or (${name}.status = 'draft' and ${name}.sent_at is not null))`;
}
