'use client';

import { useState } from 'react';
import type { PumpTicketRow } from '@/lib/contracts/pump-tickets';
import { PUMP_CLOCK_FIELDS, pumpTicketRow } from '@/lib/contracts/pump-tickets';
import type { TicketChoices } from '@/lib/contracts/tickets';
import { apiSend } from '@/lib/queries/api';
import { dayText } from '@/lib/text/format';
import { pourDayMessages } from '@/lib/text/messages/pour-day';
import { ApiForm } from '../forms/api-form';
import { useApiForm } from '../forms/use-api-form';
import { Button } from '../ui/button';
import { SelectField, TextAreaField, TextField } from '../ui/field';
import { useLocale } from '../ui/locale';
import { Notice } from '../ui/notice';
import { newClientId } from './client-id';
import type { PumpForm } from './pump-form-schema';
import { pumpForm } from './pump-form-schema';

interface PumpTicketFormProps {
  /** The ticket that is corrected; null for a new one. */
  ticket: PumpTicketRow | null;
  start: PumpForm;
  choices: TicketChoices;
  /** The job and placement can be chosen: the office's form. */
  withTies: boolean;
  onDone: (ticket: PumpTicketRow) => void;
}

const TALL = 'min-h-14 text-lg md:min-h-11 md:text-base';

/** A pump's day: who, when it came and went, how much it placed. */
export function PumpTicketForm({ ticket, start, choices, withTies, onDone }: PumpTicketFormProps) {
  const words = pourDayMessages(useLocale());
  const [clientId] = useState(newClientId);
  const pumps = choices.suppliers.filter((one) => one.kind === 'pump');
  const state = useApiForm({
    schema: pumpForm,
    defaultValues: start,
    send: (values) =>
      ticket
        ? apiSend(
            'PUT',
            `/api/pump-tickets/${ticket.id}`,
            { ...values, revision: ticket.revision },
            pumpTicketRow,
          )
        : apiSend('POST', '/api/pump-tickets', { ...values, clientId }, pumpTicketRow),
    onDone,
  });
  const field = (name: keyof PumpForm) => ({
    ...state.register(name),
    error: state.errorOf(name),
    className: TALL,
  });
  return (
    <ApiForm state={state} className="flex flex-1 flex-col">
      {pumps.length === 0 && (
        <Notice tone="warning" className="mx-4 mt-3">
          {words.pump.noPumpSupplier}
        </Notice>
      )}
      <div className="grid grid-cols-2 gap-3 px-4 py-4">
        <SelectField
          {...field('supplierId')}
          label={words.fields.supplierId}
          fieldClassName="col-span-2"
        >
          <option value="">{words.check.pickSupplier}</option>
          {pumps.map((one) => (
            <option key={one.id} value={one.id}>
              {one.name}
            </option>
          ))}
        </SelectField>
        <TextField
          {...field('number')}
          label={words.fields.number}
          autoComplete="off"
          className={`${TALL} font-code`}
        />
        <TextField {...field('date')} label={words.fields.date} type="date" />
        {withTies && <Ties state={state} choices={choices} field={field} />}
        <TextField {...field('pumpedYd3')} label={words.pump.pumpedYd3} inputMode="decimal" />
        <TextField {...field('setUps')} label={words.pump.setUps} inputMode="numeric" />
      </div>
      <fieldset className="mx-4 border-t border-cured pt-3 pb-4">
        <legend className="font-head text-lg font-semibold">{words.pump.times}</legend>
        <div className="grid grid-cols-2 gap-3">
          {PUMP_CLOCK_FIELDS.map((name) => (
            <TextField key={name} {...field(name)} label={words.pump[name]} type="time" />
          ))}
        </div>
        <TextAreaField
          {...field('notes')}
          label={words.fields.notes}
          rows={2}
          fieldClassName="mt-3"
        />
      </fieldset>
      <div className="sticky bottom-0 z-10 mt-auto border-t border-cured bg-band px-4 pt-3 pb-[max(0.9rem,env(safe-area-inset-bottom))]">
        <Button type="submit" size="big" pending={state.pending}>
          {ticket ? words.pump.save : words.pump.add}
        </Button>
      </div>
    </ApiForm>
  );
}

interface TiesProps {
  state: { readonly form: { watch: (name: 'jobId') => string } };
  choices: TicketChoices;
  field: (name: keyof PumpForm) => { error: string | undefined; className: string };
}

function Ties({ state, choices, field }: TiesProps) {
  const locale = useLocale();
  const words = pourDayMessages(locale);
  const jobId = state.form.watch('jobId');
  return (
    <>
      <SelectField {...field('jobId')} label={words.fields.jobId}>
        <option value="" />
        {choices.jobs.map((one) => (
          <option key={one.id} value={one.id}>
            {one.number} {one.name}
          </option>
        ))}
      </SelectField>
      <SelectField {...field('placementId')} label={words.fields.placementId}>
        <option value="">{words.check.noPlacement}</option>
        {choices.placements
          .filter((one) => one.jobId === jobId)
          .map((one) => (
            <option key={one.id} value={one.id}>
              {one.name}, {dayText(one.pourDate, locale)}
            </option>
          ))}
      </SelectField>
    </>
  );
}
