import type { Metadata } from 'next';
import { LinkButton } from '@/components/ui/button';
import { DocumentHead } from '@/components/ui/document-head';
import { listTicketsInput } from '@/lib/contracts/tickets';
import { ask, requirePage } from '@/lib/http/page';
import { routes } from '@/lib/routes';
import { listTickets } from '@/lib/services/tickets/list-tickets';
import { ticketChoices } from '@/lib/services/tickets/ticket-choices';
import { tickets as words } from '@/lib/text/messages/en/tickets';
import { TicketList } from './_components/ticket-list';

export const metadata: Metadata = { title: words.title };

interface PageProps {
  searchParams: Promise<Record<string, string>>;
}

export default async function TicketsPage({ searchParams }: PageProps) {
  const actor = await requirePage('tickets.read');
  const given = await searchParams;
  // An address with a filter that makes no sense shows the whole list instead of nothing.
  const query = listTicketsInput.safeParse(given).success ? given : {};
  const first = await ask(listTickets, actor, query);
  const choices = await ask(ticketChoices, actor, {});
  return (
    <>
      <DocumentHead
        kind={words.kind}
        title={words.title}
        actions={
          <>
            <LinkButton href={routes.pumpTickets()}>{words.pumpTitle}</LinkButton>
            <LinkButton href={routes.newTicket()}>{words.add}</LinkButton>
          </>
        }
      />
      <TicketList first={first} firstQuery={query} choices={choices} />
    </>
  );
}
