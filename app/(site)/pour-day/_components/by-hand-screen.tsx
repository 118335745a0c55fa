'use client';

import { useQueryClient } from '@tanstack/react-query';
import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { newClientId } from '@/components/tickets/client-id';
import { TicketCheck } from '@/components/tickets/ticket-check';
import { emptyForm } from '@/components/tickets/ticket-form-schema';
import { useLocale } from '@/components/ui/locale';
import type { PourDayPlacement } from '@/lib/contracts/pour-day';
import type { TicketChoices } from '@/lib/contracts/tickets';
import { ticketDetail } from '@/lib/contracts/tickets';
import { apiSend } from '@/lib/queries/api';
import { refreshPourDay } from '@/lib/queries/tickets';
import { routes } from '@/lib/routes';
import { pourDayMessages } from '@/lib/text/messages/pour-day';
import { readyMixOnly } from './check-screen';
import { SiteHead } from './site-head';

interface ByHandScreenProps {
  pour: PourDayPlacement;
  choices: TicketChoices;
}

/** A ticket typed in: what the order says is there already. */
export function ByHandScreen({ pour, choices }: ByHandScreenProps) {
  const words = pourDayMessages(useLocale());
  const router = useRouter();
  const queries = useQueryClient();
  const [clientId] = useState(newClientId);
  const home = routes.pourDayPlacement(pour.id);
  const readyMix = readyMixOnly(choices);
  const orders = pour.orders.filter((order) =>
    readyMix.suppliers.some((supplier) => supplier.id === order.supplierId),
  );
  const [only] = orders.length === 1 ? orders : [];
  return (
    <div className="flex w-full flex-1 flex-col">
      <SiteHead
        back={{ href: home, to: words.back(pour.name) }}
        kind={`${pour.jobName} · ${pour.name}`}
        title={words.check.byHandTitle}
      />
      <TicketCheck
        ticket={null}
        start={emptyForm({
          jobId: pour.jobId,
          placementId: pour.id,
          date: pour.pourDate,
          supplierId: only?.supplierId ?? '',
          orderId: only?.id ?? '',
          mixCode: only?.lines.length === 1 ? (only.lines[0]?.code ?? '') : '',
        })}
        choices={readyMix}
        withTies={false}
        create={(values) => apiSend('POST', '/api/tickets', { ...values, clientId }, ticketDetail)}
        onDone={async () => {
          await refreshPourDay(queries);
          router.push(home);
        }}
        onAnotherPhoto={null}
      />
    </div>
  );
}
