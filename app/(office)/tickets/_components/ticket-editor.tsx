'use client';

import { useQueryClient } from '@tanstack/react-query';
import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { newClientId } from '@/components/tickets/client-id';
import { takeShot } from '@/components/tickets/shots';
import { TicketCheck } from '@/components/tickets/ticket-check';
import { emptyForm, startOfCheck } from '@/components/tickets/ticket-form-schema';
import { UnsentPhotos } from '@/components/tickets/unsent-photos';
import type { TicketChoices, TicketDetail } from '@/lib/contracts/tickets';
import { ticketDetail } from '@/lib/contracts/tickets';
import { apiSend } from '@/lib/queries/api';
import { routes } from '@/lib/routes';

interface TicketEditorProps {
  ticket: TicketDetail | null;
  choices: TicketChoices;
  /** The day that a new ticket starts with. */
  today?: string;
}

/** The office's form of a ticket: everything can be changed, its photo beside it. */
export function TicketEditor({ ticket, choices, today = '' }: TicketEditorProps) {
  const router = useRouter();
  const queries = useQueryClient();
  const [clientId] = useState(newClientId);
  const placementId = ticket?.placement?.id;
  async function done(stored: TicketDetail) {
    await queries.invalidateQueries({ queryKey: ['tickets'] });
    if (stored.id === ticket?.id) router.refresh();
    else router.push(routes.ticket(stored.id));
  }
  return (
    <>
      <UnsentPhotos onSent={() => router.refresh()} />
      <TicketCheck
        ticket={ticket}
        start={
          ticket
            ? startOfCheck(ticket)
            : emptyForm({ date: today, jobId: choices.jobs[0]?.id ?? '' })
        }
        choices={{
          ...choices,
          suppliers: choices.suppliers.filter((one) => one.kind === 'readyMix'),
        }}
        withTies
        create={(values) => apiSend('POST', '/api/tickets', { ...values, clientId }, ticketDetail)}
        onDone={done}
        onAnotherPhoto={
          ticket && placementId
            ? async (file) => {
                if (await takeShot(file, { placementId, ticketId: ticket.id })) router.refresh();
              }
            : null
        }
      />
    </>
  );
}
