import type { Metadata } from 'next';
import { emptyPumpForm } from '@/components/tickets/pump-form-schema';
import { DocumentHead } from '@/components/ui/document-head';
import { ask, requirePage } from '@/lib/http/page';
import { getPourDay } from '@/lib/services/pour-day/get-pour-day';
import { ticketChoices } from '@/lib/services/tickets/ticket-choices';
import { tickets as words } from '@/lib/text/messages/en/tickets';
import { PumpEditor } from '../../_components/pump-editor';

export const metadata: Metadata = { title: words.newPumpTicket };

export default async function NewPumpTicketPage() {
  const actor = await requirePage('tickets.write');
  const choices = await ask(ticketChoices, actor, {});
  const { today } = await ask(getPourDay, actor, {});
  return (
    <>
      <DocumentHead kind={words.kind} title={words.newPumpTicket} />
      <PumpEditor ticket={null} start={emptyPumpForm({ date: today })} choices={choices} />
    </>
  );
}
