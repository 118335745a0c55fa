import type { Metadata } from 'next';
import { DocumentHead } from '@/components/ui/document-head';
import { WhereProvider } from '@/components/ui/where';
import { ask, requirePage } from '@/lib/http/page';
import { getTicket } from '@/lib/services/tickets/get-ticket';
import { ticketChoices } from '@/lib/services/tickets/ticket-choices';
import { dayText } from '@/lib/text/format';
import { pourDay } from '@/lib/text/messages/en/pour-day';
import { tickets as words } from '@/lib/text/messages/en/tickets';
import { BilledLines } from '../_components/billed-lines';
import { TicketActivity } from '../_components/ticket-activity';
import { TicketEditor } from '../_components/ticket-editor';

export const metadata: Metadata = { title: 'Ticket' };

interface PageProps {
  params: Promise<{ ticketId: string }>;
}

export default async function TicketPage({ params }: PageProps) {
  const actor = await requirePage('tickets.read');
  const ticket = await ask(getTicket, actor, await params);
  const choices = await ask(ticketChoices, actor, {});
  const facts = [
    { label: words.supplier, value: ticket.supplier?.name ?? '–' },
    { label: words.job, value: `${ticket.job.number} ${ticket.job.name}` },
    { label: words.columns.date, value: dayText(ticket.date) },
    { label: words.status, value: pourDay.states[ticket.status] },
    ...(ticket.confirmedBy ? [{ label: words.confirmedBy, value: ticket.confirmedBy }] : []),
  ];
  const figures = ticket.quantityYd3
    ? [{ label: words.columns.yards, value: ticket.quantityYd3 }]
    : [];
  return (
    <WhereProvider where={ticket.times}>
      <DocumentHead
        kind={words.kind}
        title={
          ticket.status === 'toCheck'
            ? words.toCheckTitle
            : ticket.number
              ? words.ticket(ticket.number)
              : words.noNumber
        }
        facts={facts}
        figures={figures}
      />
      <TicketEditor
        key={`${ticket.version} ${ticket.photos.length}`}
        ticket={ticket}
        choices={choices}
      />
      {actor.role !== 'foreman' && (
        <>
          <BilledLines billed={ticket.billed} />
          <TicketActivity events={ticket.activity} />
        </>
      )}
    </WhereProvider>
  );
}
