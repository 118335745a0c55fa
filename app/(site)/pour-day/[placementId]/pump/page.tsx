import type { Metadata } from 'next';
import { emptyPumpForm } from '@/components/tickets/pump-form-schema';
import { ask, requirePage } from '@/lib/http/page';
import { getPourDayPlacement } from '@/lib/services/pour-day/get-pour-day-placement';
import { ticketChoices } from '@/lib/services/tickets/ticket-choices';
import { PumpScreen } from '../../_components/pump-screen';

export const metadata: Metadata = { title: 'Pump ticket' };

interface PageProps {
  params: Promise<{ placementId: string }>;
}

export default async function NewPumpPage({ params }: PageProps) {
  const actor = await requirePage('tickets.write');
  const pour = await ask(getPourDayPlacement, actor, await params);
  const choices = await ask(ticketChoices, actor, { jobId: pour.jobId });
  const pumps = choices.suppliers.filter((one) => one.kind === 'pump');
  const order = pour.orders.find((one) => pumps.some((pump) => pump.id === one.supplierId));
  const only = pumps.length === 1 ? pumps[0] : undefined;
  const start = emptyPumpForm({
    jobId: pour.jobId,
    placementId: pour.id,
    orderId: order?.id ?? '',
    supplierId: order?.supplierId ?? only?.id ?? '',
    date: pour.pourDate,
  });
  return (
    <PumpScreen
      ticket={null}
      start={start}
      choices={choices}
      placement={{ id: pour.id, name: pour.name, jobName: pour.jobName }}
    />
  );
}
