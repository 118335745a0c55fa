'use client';

import type { FormEvent } from 'react';
import { useId, useState } from 'react';
import type { TicketDetail } from '@/lib/contracts/tickets';
import { pourDayMessages } from '@/lib/text/messages/pour-day';
import { Button } from '../ui/button';
import { classNames } from '../ui/class-names';
import { useLocale } from '../ui/locale';
import { Notice } from '../ui/notice';
import { DoubtfulFields } from './doubtful-fields';
import { ReadingState } from './reading-state';
import { SetAside } from './set-aside';
import type { FieldChoices } from './ticket-field';
import { TicketField } from './ticket-field';
import type { TicketForm, TicketFormField } from './ticket-form-schema';
import { TicketPhoto } from './ticket-photo';
import { TicketRefusal } from './ticket-refusal';
import type { TicketCheck as Check, TicketFormOptions } from './use-ticket-form';
import { useTicketForm } from './use-ticket-form';

export interface TicketCheckProps extends TicketFormOptions {
  choices: FieldChoices;
  /** The job, placement and order can be changed too: the office's form. */
  withTies: boolean;
  /** Takes another photo of the same ticket; null where none can be taken. */
  onAnotherPhoto: ((file: File) => void) | null;
}

const MAIN: readonly TicketFormField[] = [
  'number',
  'quantityYd3',
  'supplierId',
  'mixCode',
  'truck',
  'date',
];
const TIES: readonly TicketFormField[] = ['jobId', 'placementId'];
const MORE: readonly TicketFormField[] = [
  'orderId',
  'loadNumber',
  'plant',
  'batchedAt',
  'arrivedAt',
  'startedAt',
  'finishedAt',
  'leftAt',
  'returnedYd3',
  'orderedYd3',
  'toDateYd3',
  'waterAddedGal',
  'notes',
];
const WIDE: readonly string[] = ['supplierId', 'jobId', 'placementId', 'notes'];

/** A ticket's fields beside its photo: what is doubtful first, one press to confirm. */
export function TicketCheck(props: TicketCheckProps) {
  const { ticket, choices, withTies, onAnotherPhoto, onDone } = props;
  const check = useTicketForm(props);
  const [look, setLook] = useState<TicketFormField | null>(null);
  const [pressed, setPressed] = useState(false);
  const formId = useId();
  const words = pourDayMessages(useLocale()).check;
  const photo = ticket?.photos.at(-1);
  function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    setPressed(true);
    if (check.open.length === 0) {
      check.state.submit(event);
      return;
    }
    const [firstOpen] = check.open;
    setLook(firstOpen ?? null);
    document.getElementById(`look-at-${firstOpen}`)?.scrollIntoView({ block: 'start' });
  }
  const watched = look ?? check.open[0] ?? null;
  const field = (name: TicketFormField) => (
    <TicketField
      key={name}
      field={name}
      state={check.state}
      choices={choices}
      onLook={setLook}
      {...(WIDE.includes(name) ? { fieldClassName: 'col-span-2' } : {})}
    />
  );
  const rest = (names: readonly TicketFormField[]) =>
    names.filter((name) => !check.doubtful.includes(name)).map(field);
  return (
    <div className="flex min-h-0 flex-1 flex-col lg:grid lg:grid-cols-[minmax(0,1fr)_30rem]">
      {photo && (
        <TicketPhoto
          photo={photo}
          spots={spotsOf(check)}
          focus={watched}
          className="sticky top-0 z-10 h-[34dvh] shrink-0 border-b border-wet lg:h-dvh lg:border-r lg:border-b-0"
        />
      )}
      <div
        className={classNames(
          'flex min-w-0 flex-1 flex-col',
          !photo && 'lg:col-span-2 lg:max-w-2xl',
        )}
      >
        <ReadingState check={check} hasPhoto={photo !== undefined} onAnother={onAnotherPhoto} />
        <form id={formId} noValidate method="post" onSubmit={submit}>
          <DoubtfulFields
            check={check}
            choices={choices}
            look={look}
            onLook={setLook}
            insists={pressed}
          />
          <div className="grid grid-cols-2 gap-3 px-4 pt-4">
            {rest(MAIN)}
            {withTies && rest(TIES)}
          </div>
          <details className="mx-4 mt-4 border-t border-cured" open={withTies || hasErrors(check)}>
            <summary className="flex min-h-14 items-center font-semibold text-carbon">
              {words.more}
            </summary>
            <div className="grid grid-cols-2 gap-3 pb-4">{rest(MORE)}</div>
          </details>
        </form>
        <Foot formId={formId} check={check} ticket={ticket} onDone={onDone} insists={pressed} />
      </div>
    </div>
  );
}

interface FootProps {
  formId: string;
  check: Check;
  ticket: TicketDetail | null;
  onDone: (ticket: TicketDetail) => void;
  insists: boolean;
}

/** What went wrong, and the one press that settles the ticket: pinned to the thumb's edge. */
function Foot({ formId, check, ticket, onDone, insists }: FootProps) {
  const words = pourDayMessages(useLocale()).check;
  const yards = check.state.form.watch('quantityYd3');
  const corrects = ticket?.status === 'confirmed';
  return (
    <>
      {ticket?.status === 'rejected' && (
        <Notice tone="warning" className="mx-4 mt-3">
          {words.setAsideDone} {words.restore}
        </Notice>
      )}
      <TicketRefusal check={check} ticket={ticket} onDone={onDone} />
      {ticket && ticket.status !== 'rejected' && (
        <SetAside ticket={ticket} version={check.version} onDone={onDone} />
      )}
      <div className="sticky bottom-0 z-10 mt-auto border-t border-cured bg-band px-4 pt-3 pb-[max(0.9rem,env(safe-area-inset-bottom))]">
        {insists && check.open.length > 0 && (
          <p role="alert" className="pb-2 font-semibold text-keel">
            {words.stillDoubtful(check.open.length)}
          </p>
        )}
        <Button type="submit" form={formId} size="big" pending={check.state.pending}>
          {corrects
            ? words.save
            : /^\d+([.,]\d+)?$/.test(yards)
              ? words.confirmYards(yards)
              : words.confirm}
        </Button>
      </div>
    </>
  );
}

function hasErrors(check: Check): boolean {
  return MORE.some((name) => check.state.errorOf(name) !== undefined);
}

function spotsOf(check: Check) {
  const boxes = check.reading?.suggestion?.boxes ?? {};
  return (Object.entries(boxes) as [keyof TicketForm, (typeof boxes)['number']][]).flatMap(
    ([field, box]) => (box ? [{ field, box, doubtful: check.open.includes(field) }] : []),
  );
}
