import type { z } from 'zod';
import {
  findOrder,
  orderLinesOf,
  orderVersionsOf,
  type StoredOrder,
} from '../../../db/queries/orders';
import type { OrderDetail } from '../../contracts/orders';
import { orderDetail } from '../../contracts/orders';
import { quantity, quantityText } from '../../domain/money/money';
import type { Ctx } from '../context';
import { crewLimit } from '../tickets/internal';

type Line = OrderDetail['lines'][number];

/** "42.00 yd³ of 4000AE, 4000 psi air-entrained" */
export function lineInWords({ code, description, quantity: amount, unit }: Line): string {
  const words = `${quantityText(quantity(amount))} ${unit} of ${code}`;
  return description === '' ? words : `${words}, ${description}`;
}

/** What an order's version keeps of it. */
export const snapshotSchema = orderDetail.shape.versions.element.omit({
  version: true,
  sentAt: true,
});

export function snapshotOf(order: StoredOrder, lines: readonly Line[]) {
  return {
    pourDate: order.pourDate,
    firstTruckAt: order.firstTruckAt,
    spacingMinutes: order.spacingMinutes,
    notes: order.notes,
    lines: lines.map(lineInWords),
  } satisfies z.infer<typeof snapshotSchema>;
}

const moment = (date: Date | null) => date?.toISOString() ?? null;

/** The order as its screen shows it, for whoever may see its job; null for others. */
export async function orderDetailOf(ctx: Ctx, orderId: string): Promise<OrderDetail | null> {
  const order = await findOrder(ctx.scope, orderId, crewLimit(ctx.actor));
  if (!order) return null;
  const versions = await orderVersionsOf(ctx.scope, orderId);
  return {
    ...order,
    sentAt: moment(order.sentAt),
    confirmedAt: moment(order.confirmedAt),
    cancelledAt: moment(order.cancelledAt),
    lines: await orderLinesOf(ctx.scope, orderId),
    versions: versions.map(({ version, snapshot, createdAt }) => ({
      version,
      sentAt: createdAt.toISOString(),
      ...snapshotSchema.parse(snapshot),
    })),
    times: { timeZone: ctx.company.timeZone, clock: ctx.company.clock },
  };
}

/** The detail of an order that this very transaction has changed. */
export async function changedOrder(ctx: Ctx, orderId: string): Promise<OrderDetail> {
  const detail = await orderDetailOf(ctx, orderId);
  if (!detail) throw new Error(`Order ${orderId}, just changed, is missing`);
  return detail;
}

const SERIAL = /^(.*?)(\d+)$/;

/**
 * The number after the highest that the company has given: "CR-1201" leads to "CR-1202". `past`
 * counts on where another person was faster.
 */
export function nextOrderNumber(numbers: readonly string[], past = 0): string {
  let best: { prefix: string; serial: number; width: number } | null = null;
  for (const number of numbers) {
    const [, prefix = '', digits = ''] = SERIAL.exec(number) ?? [];
    const serial = Number(digits);
    if (digits === '' || !Number.isSafeInteger(serial)) continue;
    if (!best || serial > best.serial) best = { prefix, serial, width: digits.length };
  }
  const { prefix, serial, width } = best ?? { prefix: 'P-', serial: 1000, width: 4 };
  return `${prefix}${String(serial + 1 + past).padStart(width, '0')}`;
}
