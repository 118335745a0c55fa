'use client';

import { useQueryClient } from '@tanstack/react-query';
import { useRouter } from 'next/navigation';
import type { PumpForm } from '@/components/tickets/pump-form-schema';
import { PumpTicketForm } from '@/components/tickets/pump-ticket-form';
import { useLocale } from '@/components/ui/locale';
import type { PumpTicketRow } from '@/lib/contracts/pump-tickets';
import type { TicketChoices } from '@/lib/contracts/tickets';
import { refreshPourDay } from '@/lib/queries/tickets';
import { routes } from '@/lib/routes';
import { pourDayMessages } from '@/lib/text/messages/pour-day';
import { SiteHead } from './site-head';

interface PumpScreenProps {
  ticket: PumpTicketRow | null;
  start: PumpForm;
  choices: TicketChoices;
  placement: { readonly id: string; readonly name: string; readonly jobName: string } | null;
}

/** The pump's ticket on site. */
export function PumpScreen({ ticket, start, choices, placement }: PumpScreenProps) {
  const words = pourDayMessages(useLocale());
  const router = useRouter();
  const queries = useQueryClient();
  const home = placement ? routes.pourDayPlacement(placement.id) : routes.pourDay(start.date);
  return (
    <div className="mx-auto flex w-full max-w-2xl flex-1 flex-col">
      <SiteHead
        back={{ href: home, to: words.back(placement?.name ?? words.title) }}
        kind={placement ? `${placement.jobName} · ${placement.name}` : words.title}
        title={words.pump.title}
      />
      <PumpTicketForm
        ticket={ticket}
        start={start}
        choices={choices}
        withTies={false}
        onDone={async () => {
          await refreshPourDay(queries);
          router.push(home);
        }}
      />
    </div>
  );
}
