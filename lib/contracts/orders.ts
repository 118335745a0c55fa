import { z } from 'zod';
import {
  clockMinutes,
  note,
  pageInput,
  pageOf,
  plainDate,
  positiveDecimalText,
  uuid,
} from './common';
import { timeStyle } from './tickets';

export const ORDER_STATUSES = ['draft', 'sent', 'confirmed', 'cancelled'] as const;
export const ORDER_UNITS = ['yd³', 'hours', 'pieces', 'ft²', 'ft', 'lb'] as const;
export const ORDER_SORTS = ['day', 'number', 'supplier', 'job', 'status'] as const;

export const orderLine = z.strictObject({
  /** A mix code, a pump or a material. */
  code: z.string().trim().min(1, 'needed').max(40),
  description: z.string().trim().max(120),
  quantity: positiveDecimalText,
  unit: z.enum(ORDER_UNITS),
});
export type OrderLine = z.infer<typeof orderLine>;

const fields = {
  supplierId: uuid,
  jobId: uuid,
  placementId: uuid.nullable(),
  pourDate: plainDate,
  firstTruckAt: clockMinutes.nullable(),
  spacingMinutes: z.int().min(1).max(600).nullable(),
  notes: note,
  lines: z.array(orderLine).min(1, 'at least one line').max(20),
};
export const orderValues = z.strictObject(fields);
export type OrderValues = z.infer<typeof orderValues>;

export const orderRow = z.object({
  id: uuid,
  number: z.string(),
  status: z.enum(ORDER_STATUSES),
  version: z.number().int(),
  supplierId: uuid,
  supplierName: z.string(),
  jobId: uuid,
  jobNumber: z.string(),
  jobName: z.string(),
  placementId: uuid.nullable(),
  placementName: z.string().nullable(),
  pourDate: plainDate,
  firstTruckAt: clockMinutes.nullable(),
  spacingMinutes: z.number().int().nullable(),
  notes: z.string(),
  supplierReference: z.string(),
  /** Yards on its lines; null for an order of other things. */
  orderedYd3: z.string().nullable(),
  deliveredYd3: z.string(),
  loads: z.number().int(),
});
export type OrderRow = z.infer<typeof orderRow>;

export const orderDetail = z.object({
  ...orderRow.shape,
  jobAddress: z.string(),
  dispatchEmail: z.string(),
  sentAt: z.iso.datetime().nullable(),
  confirmedAt: z.iso.datetime().nullable(),
  cancelledAt: z.iso.datetime().nullable(),
  lines: z.array(
    z.object({ code: z.string(), description: z.string(), quantity: z.string(), unit: z.string() }),
  ),
  /** What was sent, version by version, the latest first. */
  versions: z.array(
    z.object({
      version: z.number().int(),
      sentAt: z.iso.datetime(),
      pourDate: plainDate,
      firstTruckAt: clockMinutes.nullable(),
      spacingMinutes: z.number().int().nullable(),
      notes: z.string(),
      lines: z.array(z.string()),
    }),
  ),
  times: timeStyle,
});
export type OrderDetail = z.infer<typeof orderDetail>;

const filters = {
  status: z.enum([...ORDER_STATUSES, 'all']).default('all'),
  supplierId: uuid.optional(),
  jobId: uuid.optional(),
  placementId: uuid.optional(),
  from: plainDate.optional(),
  to: plainDate.optional(),
  search: z.string().trim().max(80).default(''),
  sort: z.enum(ORDER_SORTS).default('day'),
  direction: z.enum(['up', 'down']).default('down'),
};
export const listOrdersInput = z.strictObject({ ...pageInput, ...filters });
export const exportOrdersInput = z.strictObject(filters);
export type OrderFilters = z.output<typeof exportOrdersInput>;
export const listOrdersOutput = pageOf(orderRow);

export const orderRef = z.strictObject({ orderId: uuid });
/** Made on the device before the first send, so that a repeat adds no second order. */
export const createOrderInput = z.strictObject({ clientId: uuid, ...fields });
export const updateOrderInput = z.strictObject({
  orderId: uuid,
  /** The version that was changed; another one means that somebody changed it meanwhile. */
  version: z.int(),
  ...fields,
});
export const confirmOrderInput = z.strictObject({
  orderId: uuid,
  supplierReference: z.string().trim().max(60).default(''),
});
export const cancelOrderInput = z.strictObject({
  orderId: uuid,
  reason: z.string().trim().min(1, 'needed').max(300),
});
