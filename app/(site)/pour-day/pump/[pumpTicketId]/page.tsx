import type { Metadata } from 'next';
import { formOfPumpTicket } from '@/components/tickets/pump-form-schema';
import { ask, requirePage } from '@/lib/http/page';
import { getPumpTicket } from '@/lib/services/pump-tickets/get-pump-ticket';
import { ticketChoices } from '@/lib/services/tickets/ticket-choices';
import { PumpScreen } from '../../_components/pump-screen';

export const metadata: Metadata = { title: 'Pump ticket' };

interface PageProps {
  params: Promise<{ pumpTicketId: string }>;
}

export default async function PumpTicketPage({ params }: PageProps) {
  const actor = await requirePage('tickets.write');
  const ticket = await ask(getPumpTicket, actor, await params);
  const choices = await ask(ticketChoices, actor, { jobId: ticket.jobId });
  const { placementId, placementName, jobName } = ticket;
  return (
    <PumpScreen
      key={ticket.revision}
      ticket={ticket}
      start={formOfPumpTicket(ticket)}
      choices={choices}
      placement={placementId ? { id: placementId, name: placementName ?? '', jobName } : null}
    />
  );
}
