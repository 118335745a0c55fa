import type { Metadata } from 'next';
import { ask, requirePage } from '@/lib/http/page';
import { getTicket } from '@/lib/services/tickets/get-ticket';
import { ticketChoices } from '@/lib/services/tickets/ticket-choices';
import { CheckScreen } from '../../_components/check-screen';

export const metadata: Metadata = { title: 'Ticket' };

interface PageProps {
  params: Promise<{ ticketId: string }>;
}

export default async function PourDayTicketPage({ params }: PageProps) {
  const actor = await requirePage('tickets.write');
  const ticket = await ask(getTicket, actor, await params);
  const choices = await ask(ticketChoices, actor, { jobId: ticket.job.id });
  return (
    <CheckScreen key={`${ticket.id} ${ticket.photos.length}`} ticket={ticket} choices={choices} />
  );
}
