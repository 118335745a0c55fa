import type { Metadata } from 'next';
import { ask, requirePage } from '@/lib/http/page';
import { getPourDayPlacement } from '@/lib/services/pour-day/get-pour-day-placement';
import { ticketChoices } from '@/lib/services/tickets/ticket-choices';
import { ByHandScreen } from '../../_components/by-hand-screen';

export const metadata: Metadata = { title: 'Ticket by hand' };

interface PageProps {
  params: Promise<{ placementId: string }>;
}

export default async function ByHandPage({ params }: PageProps) {
  const actor = await requirePage('tickets.write');
  const pour = await ask(getPourDayPlacement, actor, await params);
  const choices = await ask(ticketChoices, actor, { jobId: pour.jobId });
  return <ByHandScreen pour={pour} choices={choices} />;
}
