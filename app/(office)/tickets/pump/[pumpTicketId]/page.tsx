import type { Metadata } from 'next';
import { formOfPumpTicket } from '@/components/tickets/pump-form-schema';
import { DocumentHead } from '@/components/ui/document-head';
import { ask, requirePage } from '@/lib/http/page';
import { getPumpTicket } from '@/lib/services/pump-tickets/get-pump-ticket';
import { ticketChoices } from '@/lib/services/tickets/ticket-choices';
import { dayText } from '@/lib/text/format';
import { tickets as words } from '@/lib/text/messages/en/tickets';
import { PumpEditor } from '../../_components/pump-editor';

export const metadata: Metadata = { title: 'Pump ticket' };

interface PageProps {
  params: Promise<{ pumpTicketId: string }>;
}

export default async function PumpTicketPage({ params }: PageProps) {
  const actor = await requirePage('tickets.read');
  const ticket = await ask(getPumpTicket, actor, await params);
  const choices = await ask(ticketChoices, actor, {});
  return (
    <>
      <DocumentHead
        kind={words.kind}
        title={words.pumpTicket(ticket.number)}
        facts={[
          { label: words.supplier, value: ticket.supplierName },
          { label: words.job, value: `${ticket.jobNumber} ${ticket.jobName}` },
          { label: words.columns.date, value: dayText(ticket.date) },
        ]}
        figures={[{ label: words.columns.pumped, value: ticket.pumpedYd3 }]}
      />
      <PumpEditor
        key={ticket.revision}
        ticket={ticket}
        start={formOfPumpTicket(ticket)}
        choices={choices}
      />
    </>
  );
}
