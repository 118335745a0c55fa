'use client';

import { useQueryClient } from '@tanstack/react-query';
import { useRouter } from 'next/navigation';
import { takeShot } from '@/components/tickets/shots';
import { TicketCheck } from '@/components/tickets/ticket-check';
import { startOfCheck } from '@/components/tickets/ticket-form-schema';
import { UnsentPhotos } from '@/components/tickets/unsent-photos';
import { useLocale } from '@/components/ui/locale';
import type { TicketChoices, TicketDetail } from '@/lib/contracts/tickets';
import { refreshPourDay } from '@/lib/queries/tickets';
import { routes } from '@/lib/routes';
import { pourDayMessages } from '@/lib/text/messages/pour-day';
import { SiteHead } from './site-head';

interface CheckScreenProps {
  ticket: TicketDetail;
  choices: TicketChoices;
}

/** One ticket on site: its photo above, its fields below, one press to confirm. */
export function CheckScreen({ ticket, choices }: CheckScreenProps) {
  const words = pourDayMessages(useLocale());
  const router = useRouter();
  const queries = useQueryClient();
  const placementId = ticket.placement?.id;
  const home = placementId ? routes.pourDayPlacement(placementId) : routes.pourDay(ticket.date);
  async function done() {
    await refreshPourDay(queries);
    router.push(home);
  }
  return (
    <div className="flex w-full flex-1 flex-col">
      <SiteHead
        back={{ href: home, to: words.back(ticket.placement?.name ?? words.title) }}
        kind={`${ticket.job.name} · ${ticket.placement?.name ?? ''}`}
        title={ticket.status === 'confirmed' ? words.check.correctTitle : words.check.title}
      />
      <UnsentPhotos onSent={() => router.refresh()} />
      <TicketCheck
        ticket={ticket}
        start={startOfCheck(ticket)}
        choices={readyMixOnly(choices)}
        withTies={false}
        create={() => Promise.reject(new Error('This ticket is there already'))}
        onDone={done}
        onAnotherPhoto={
          placementId
            ? async (file) => {
                if (await takeShot(file, { placementId, ticketId: ticket.id })) router.refresh();
              }
            : null
        }
      />
    </div>
  );
}

export function readyMixOnly(choices: TicketChoices): TicketChoices {
  return { ...choices, suppliers: choices.suppliers.filter((one) => one.kind === 'readyMix') };
}
