'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { useFieldArray } from 'react-hook-form';
import { ApiForm } from '@/components/forms/api-form';
import { type ApiForm as FormState, useApiForm } from '@/components/forms/use-api-form';
import { newClientId } from '@/components/tickets/client-id';
import { Button } from '@/components/ui/button';
import { SelectField, TextAreaField, TextField } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import type { OrderDetail, OrderValues } from '@/lib/contracts/orders';
import { ORDER_UNITS, orderDetail } from '@/lib/contracts/orders';
import type { TicketChoices } from '@/lib/contracts/tickets';
import { apiSend } from '@/lib/queries/api';
import { routes } from '@/lib/routes';
import { dayText } from '@/lib/text/format';
import { orderWords as words } from '@/lib/text/messages/en/jobs';
import { EMPTY_LINE, type OrderForm as Form, orderForm } from './order-form-schema';

interface OrderFormProps {
  order: OrderDetail | null;
  start: Form;
  choices: TicketChoices;
}

/** The white copy while it is written: to whom, for what, when, how much. */
export function OrderForm({ order, start, choices }: OrderFormProps) {
  const router = useRouter();
  const [clientId] = useState(newClientId);
  const state = useApiForm({
    schema: orderForm,
    defaultValues: start,
    send: (values) =>
      order
        ? apiSend(
            'PUT',
            `/api/orders/${order.id}`,
            { ...values, version: order.version },
            orderDetail,
          )
        : apiSend('POST', '/api/orders', { ...values, clientId }, orderDetail),
    onDone: ({ id }) => {
      router.push(routes.order(id));
      router.refresh();
    },
  });
  const jobId = state.form.watch('jobId');
  const field = (name: Exclude<keyof Form, 'lines'>) => ({
    ...state.register(name),
    error: state.errorOf(name),
  });
  const wasSent = order !== null && order.status !== 'draft';
  return (
    <ApiForm state={state} className="grid max-w-4xl gap-5 px-4 py-5 md:px-6">
      {wasSent && <Notice tone="warning">{words.sentNote}</Notice>}
      <div className="grid gap-4 sm:grid-cols-3">
        <SelectField label={words.supplier} {...field('supplierId')}>
          <option value="">{words.pickSupplier}</option>
          {choices.suppliers.map((one) => (
            <option key={one.id} value={one.id}>
              {one.name}
            </option>
          ))}
        </SelectField>
        <SelectField label={words.job} {...field('jobId')}>
          <option value="">{words.pickJob}</option>
          {choices.jobs.map((one) => (
            <option key={one.id} value={one.id}>
              {one.number} {one.name}
            </option>
          ))}
        </SelectField>
        <SelectField label={words.placement} {...field('placementId')}>
          <option value="">{words.noPlacement}</option>
          {choices.placements
            .filter((one) => one.jobId === jobId)
            .map((one) => (
              <option key={one.id} value={one.id}>
                {one.name}, {dayText(one.pourDate)}
              </option>
            ))}
        </SelectField>
        <TextField label={words.pourDate} type="date" {...field('pourDate')} />
        <TextField label={words.firstTruckAt} type="time" {...field('firstTruckAt')} />
        <TextField label={words.spacing} inputMode="numeric" {...field('spacingMinutes')} />
      </div>
      <Lines state={state} />
      <TextAreaField label={words.notes} rows={3} {...field('notes')} />
      <Button type="submit" pending={state.pending} className="justify-self-start">
        {wasSent ? words.saveChanged : words.save}
      </Button>
    </ApiForm>
  );
}

function Lines({ state }: { state: FormState<Form, OrderValues> }) {
  const { fields, append, remove } = useFieldArray({ control: state.form.control, name: 'lines' });
  return (
    <fieldset className="grid gap-3 border-y border-wet py-4">
      <legend className="pr-3 font-head text-lg font-semibold">{words.lines}</legend>
      {fields.map((line, index) => (
        <fieldset
          key={line.id}
          className="grid grid-cols-2 gap-3 sm:grid-cols-[1fr_2fr_7rem_7rem_auto]"
        >
          <legend className="sr-only">{words.line(index)}</legend>
          <TextField
            label={words.code}
            autoComplete="off"
            {...state.register(`lines.${index}.code`)}
            error={state.errorOf(`lines.${index}.code`)}
          />
          <TextField
            label={words.description}
            {...state.register(`lines.${index}.description`)}
            error={state.errorOf(`lines.${index}.description`)}
          />
          <TextField
            label={words.quantity}
            inputMode="decimal"
            {...state.register(`lines.${index}.quantity`)}
            error={state.errorOf(`lines.${index}.quantity`)}
          />
          <SelectField
            label={words.unit}
            {...state.register(`lines.${index}.unit`)}
            error={state.errorOf(`lines.${index}.unit`)}
          >
            {ORDER_UNITS.map((unit) => (
              <option key={unit}>{unit}</option>
            ))}
          </SelectField>
          {fields.length > 1 && (
            <Button
              variant="quiet"
              className="self-end"
              aria-label={words.removeLine(index)}
              onClick={() => remove(index)}
            >
              ×
            </Button>
          )}
        </fieldset>
      ))}
      <Button variant="quiet" className="justify-self-start" onClick={() => append(EMPTY_LINE)}>
        {words.addLine}
      </Button>
    </fieldset>
  );
}
