import { z } from 'zod';
import { decimalOrNull, minutesOf, timeText, typedForm } from '@/components/forms/typed-form';
import type { OrderDetail } from '@/lib/contracts/orders';
import { orderValues } from '@/lib/contracts/orders';

const line = z.object({
  code: z.string(),
  description: z.string(),
  quantity: z.string(),
  unit: z.string(),
});
const fields = z.object({
  supplierId: z.string(),
  jobId: z.string(),
  placementId: z.string(),
  pourDate: z.string(),
  firstTruckAt: z.string(),
  spacingMinutes: z.string(),
  notes: z.string(),
  lines: z.array(line),
});
export type OrderForm = z.infer<typeof fields>;

export const EMPTY_LINE: OrderForm['lines'][number] = {
  code: '',
  description: '',
  quantity: '',
  unit: 'yd³',
};

/** The form's text made into what the API takes; what is wrong lands on its field. */
export const orderForm = typedForm(fields, orderValues, (form) => ({
  ...form,
  placementId: form.placementId || null,
  firstTruckAt: minutesOf(form.firstTruckAt),
  spacingMinutes: form.spacingMinutes.trim() === '' ? null : Number(form.spacingMinutes),
  lines: form.lines.map((one) => ({ ...one, quantity: decimalOrNull(one.quantity) ?? '' })),
}));

export function formOfOrder(order: OrderDetail): OrderForm {
  return {
    supplierId: order.supplierId,
    jobId: order.jobId,
    placementId: order.placementId ?? '',
    pourDate: order.pourDate,
    firstTruckAt: timeText(order.firstTruckAt),
    spacingMinutes: order.spacingMinutes === null ? '' : String(order.spacingMinutes),
    notes: order.notes,
    lines: order.lines.length > 0 ? order.lines : [EMPTY_LINE],
  };
}

export function emptyOrderForm(known: Partial<OrderForm>): OrderForm {
  return {
    supplierId: '',
    jobId: '',
    placementId: '',
    pourDate: '',
    firstTruckAt: '',
    spacingMinutes: '',
    notes: '',
    lines: [EMPTY_LINE],
    ...known,
  };
}
