'use client';

import type { ReactNode } from 'react';
import type { TicketChoices, TicketValuesInput } from '@/lib/contracts/tickets';
import { dayText } from '@/lib/text/format';
import { pourDayMessages } from '@/lib/text/messages/pour-day';
import type { ApiForm } from '../forms/use-api-form';
import { SelectField, TextAreaField, TextField } from '../ui/field';
import { useLocale } from '../ui/locale';
import type { TicketForm, TicketFormField } from './ticket-form-schema';

export type TicketFormState = ApiForm<TicketForm, TicketValuesInput>;
export type FieldChoices = Pick<TicketChoices, 'suppliers' | 'jobs' | 'placements' | 'orders'>;

interface TicketFieldProps {
  field: TicketFormField;
  state: TicketFormState;
  choices: FieldChoices;
  /** Said under the field: "not sure". */
  hint?: ReactNode;
  onLook: (field: TicketFormField) => void;
  fieldClassName?: string;
}

const DECIMALS: readonly string[] = [
  'quantityYd3',
  'orderedYd3',
  'toDateYd3',
  'returnedYd3',
  'waterAddedGal',
];
const TIMES: readonly string[] = ['batchedAt', 'arrivedAt', 'startedAt', 'finishedAt', 'leftAt'];
const CODES: readonly string[] = ['number', 'mixCode'];
/** A thumb in a glove: at least 56 px on a phone. */
const TALL = 'min-h-14 text-lg md:min-h-11 md:text-base';

/** One field of a ticket with the keyboard that suits it. */
export function TicketField(props: TicketFieldProps) {
  const { field, state, choices, hint, onLook, fieldClassName } = props;
  const words = pourDayMessages(useLocale());
  const common = {
    ...state.register(field),
    label: words.fields[field],
    hint,
    error: state.errorOf(field),
    onFocus: () => onLook(field),
    ...(fieldClassName ? { fieldClassName } : {}),
  };
  if (field === 'notes') return <TextAreaField {...common} rows={2} className="text-lg" />;
  if (isChoice(field)) {
    return (
      <SelectField {...common} className={TALL}>
        <Options field={field} choices={choices} form={state.form.watch()} />
      </SelectField>
    );
  }
  if (field === 'date') return <TextField {...common} type="date" className={TALL} />;
  if (TIMES.includes(field)) return <TextField {...common} type="time" className={TALL} />;
  const looks = CODES.includes(field) ? `${TALL} font-code` : TALL;
  return (
    <TextField
      {...common}
      autoComplete="off"
      autoCapitalize="characters"
      enterKeyHint="next"
      inputMode={keyboardFor(field, state.form.watch(field))}
      className={looks}
    />
  );
}

type ChoiceField = 'supplierId' | 'jobId' | 'placementId' | 'orderId';

function isChoice(field: TicketFormField): field is ChoiceField {
  return ['supplierId', 'jobId', 'placementId', 'orderId'].includes(field);
}

/** Digits where the value is made of digits; letters stay within reach where it may have some. */
function keyboardFor(field: TicketFormField, value: string): 'decimal' | 'numeric' | 'text' {
  if (DECIMALS.includes(field)) return 'decimal';
  if (field === 'loadNumber') return 'numeric';
  const digitsOnly = field === 'number' || field === 'truck' ? /^\d+$/.test(value) : false;
  return digitsOnly ? 'numeric' : 'text';
}

interface OptionsProps {
  field: ChoiceField;
  choices: FieldChoices;
  form: TicketForm;
}

function Options({ field, choices, form }: OptionsProps) {
  const locale = useLocale();
  const words = pourDayMessages(locale).check;
  if (field === 'supplierId') {
    return (
      <>
        <option value="">{words.pickSupplier}</option>
        {choices.suppliers.map((one) => (
          <option key={one.id} value={one.id}>
            {one.name}
          </option>
        ))}
      </>
    );
  }
  if (field === 'jobId') {
    return choices.jobs.map((one) => (
      <option key={one.id} value={one.id}>
        {one.number} {one.name}
      </option>
    ));
  }
  if (field === 'placementId') {
    return (
      <>
        <option value="">{words.noPlacement}</option>
        {choices.placements
          .filter((one) => one.jobId === form.jobId)
          .map((one) => (
            <option key={one.id} value={one.id}>
              {one.name}, {dayText(one.pourDate, locale)}
            </option>
          ))}
      </>
    );
  }
  return (
    <>
      <option value="">{words.noOrder}</option>
      {choices.orders
        .filter((one) => one.jobId === form.jobId && one.supplierId === form.supplierId)
        .map((one) => (
          <option key={one.id} value={one.id}>
            {one.number}
          </option>
        ))}
    </>
  );
}
