'use client';

import { useQuery } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import type { Reading } from '@/lib/contracts/photos';
import type { TicketDetail, TicketValuesInput } from '@/lib/contracts/tickets';
import { ticketDetail } from '@/lib/contracts/tickets';
import { ApiFailure, apiGet, apiSend } from '@/lib/queries/api';
import { readingQuery } from '@/lib/queries/tickets';
import { useApiForm } from '../forms/use-api-form';
import type { TicketFormState } from './ticket-field';
import type { TicketForm, TicketFormField } from './ticket-form-schema';
import { fillable, formOfTicket, ticketForm } from './ticket-form-schema';

export interface TicketFormOptions {
  /** The ticket that is checked or corrected; null for one that is typed in. */
  readonly ticket: TicketDetail | null;
  readonly start: TicketForm;
  /** Makes the ticket where there is none yet. */
  readonly create: (values: TicketValuesInput) => Promise<TicketDetail>;
  readonly onDone: (ticket: TicketDetail) => void;
}

export interface TicketCheck {
  readonly state: TicketFormState;
  readonly reading: Reading | null;
  /** Fields that a person still has to look at. */
  readonly open: readonly TicketFormField[];
  /** Fields that were doubtful, looked at or not: their place in the form does not jump. */
  readonly doubtful: readonly TicketFormField[];
  readonly markRight: (field: TicketFormField) => void;
  /** Another ticket has the number: the photo can be added to it. */
  readonly duplicate: boolean;
  /** Somebody changed the ticket meanwhile. */
  readonly stale: boolean;
  /** Reads the ticket anew and keeps what was typed here. */
  readonly openAgain: () => Promise<void>;
  readonly version: number;
}

/** The state of checking a ticket: its form, what its photo says, and what is still doubtful. */
export function useTicketForm(options: TicketFormOptions): TicketCheck {
  const { ticket, start, create, onDone } = options;
  const [version, setVersion] = useState(ticket?.version ?? 1);
  const [refusal, setRefusal] = useState<'duplicate' | 'stale' | null>(null);
  const [looked, setLooked] = useState<ReadonlySet<string>>(new Set());
  const state = useApiForm({
    schema: ticketForm,
    defaultValues: start,
    async send(values) {
      setRefusal(null);
      try {
        return await (ticket ? store(ticket, version, values) : create(values));
      } catch (error) {
        setRefusal(refusalOf(error));
        throw error;
      }
    },
    onDone,
  });
  const reading = useReading(ticket);
  const { form } = state;
  const touched = form.formState.dirtyFields;
  const suggestion = ticket?.status === 'confirmed' ? null : (reading?.suggestion ?? null);
  useEffect(() => {
    if (!suggestion) return;
    const hands = new Set(Object.keys(form.formState.dirtyFields));
    for (const [field, value] of fillable(suggestion, form.getValues(), hands)) {
      form.resetField(field, { defaultValue: value });
    }
  }, [suggestion, form]);
  const doubtful: readonly TicketFormField[] = suggestion?.doubtful ?? [];
  return {
    state,
    reading,
    doubtful,
    open: doubtful.filter((field) => !looked.has(field) && !touched[field]),
    markRight: (field) => setLooked(new Set([...looked, field])),
    duplicate: refusal === 'duplicate',
    stale: refusal === 'stale',
    version,
    async openAgain() {
      if (!ticket) return;
      const fresh = await apiGet(`/api/tickets/${ticket.id}`, ticketDetail);
      setVersion(fresh.version);
      setRefusal(null);
      if (fresh.status !== ticket.status) return onDone(fresh);
      form.reset(formOfTicket(fresh), { keepDirtyValues: true });
    },
  };
}

/** The reading of the ticket's last photo, asked for again while it is under way. */
function useReading(ticket: TicketDetail | null): Reading | null {
  const photo = ticket?.photos.at(-1);
  const asked = useQuery({
    ...readingQuery(photo?.id ?? ''),
    enabled: photo !== undefined && ticket?.status !== 'confirmed',
    ...(photo ? { initialData: photo.reading } : {}),
  });
  return photo ? (asked.data ?? photo.reading) : null;
}

function store(ticket: TicketDetail, version: number, values: TicketValuesInput) {
  const address = `/api/tickets/${ticket.id}`;
  const body = { ...values, version };
  return ticket.status === 'confirmed'
    ? apiSend('PUT', address, body, ticketDetail)
    : apiSend('POST', `${address}/confirm`, body, ticketDetail);
}

function refusalOf(error: unknown): 'duplicate' | 'stale' | null {
  if (!(error instanceof ApiFailure) || error.code !== 'conflict') return null;
  const paths = error.issues.map((issue) => issue.path);
  if (paths.includes('version')) return 'stale';
  return paths.includes('number') ? 'duplicate' : null;
}
