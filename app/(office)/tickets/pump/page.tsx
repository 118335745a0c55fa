import type { Metadata } from 'next';
import { LinkButton } from '@/components/ui/button';
import { DocumentHead } from '@/components/ui/document-head';
import { WhereProvider } from '@/components/ui/where';
import { listPumpTicketsInput } from '@/lib/contracts/pump-tickets';
import { ask, requirePage } from '@/lib/http/page';
import { routes } from '@/lib/routes';
import { getPourDay } from '@/lib/services/pour-day/get-pour-day';
import { listPumpTickets } from '@/lib/services/pump-tickets/list-pump-tickets';
import { ticketChoices } from '@/lib/services/tickets/ticket-choices';
import { tickets as words } from '@/lib/text/messages/en/tickets';
import { PumpList } from '../_components/pump-list';

export const metadata: Metadata = { title: words.pumpTitle };

interface PageProps {
  searchParams: Promise<Record<string, string>>;
}

export default async function PumpTicketsPage({ searchParams }: PageProps) {
  const actor = await requirePage('tickets.read');
  const given = await searchParams;
  const query = listPumpTicketsInput.safeParse(given).success ? given : {};
  const first = await ask(listPumpTickets, actor, query);
  const choices = await ask(ticketChoices, actor, {});
  const { times } = await ask(getPourDay, actor, {});
  return (
    <WhereProvider where={times}>
      <DocumentHead
        kind={words.kind}
        title={words.pumpTitle}
        actions={
          <>
            <LinkButton href={routes.tickets()}>{words.title}</LinkButton>
            <LinkButton href={routes.newPumpTicket()}>{words.addPump}</LinkButton>
          </>
        }
      />
      <PumpList first={first} firstQuery={query} choices={choices} />
    </WhereProvider>
  );
}
