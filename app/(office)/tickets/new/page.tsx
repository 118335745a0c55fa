import type { Metadata } from 'next';
import { DocumentHead } from '@/components/ui/document-head';
import { ask, requirePage } from '@/lib/http/page';
import { getPourDay } from '@/lib/services/pour-day/get-pour-day';
import { ticketChoices } from '@/lib/services/tickets/ticket-choices';
import { tickets as words } from '@/lib/text/messages/en/tickets';
import { TicketEditor } from '../_components/ticket-editor';

export const metadata: Metadata = { title: words.newTicket };

export default async function NewTicketPage() {
  const actor = await requirePage('tickets.write');
  const choices = await ask(ticketChoices, actor, {});
  const { today } = await ask(getPourDay, actor, {});
  return (
    <>
      <DocumentHead kind={words.kind} title={words.newTicket} />
      <TicketEditor ticket={null} choices={choices} today={today} />
    </>
  );
}
