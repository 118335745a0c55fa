'use client';

import { useQueryClient } from '@tanstack/react-query';
import { useRouter } from 'next/navigation';
import type { PumpForm } from '@/components/tickets/pump-form-schema';
import { PumpTicketForm } from '@/components/tickets/pump-ticket-form';
import type { PumpTicketRow } from '@/lib/contracts/pump-tickets';
import type { TicketChoices } from '@/lib/contracts/tickets';
import { routes } from '@/lib/routes';

interface PumpEditorProps {
  ticket: PumpTicketRow | null;
  start: PumpForm;
  choices: TicketChoices;
}

/** The office's form of a pump ticket. */
export function PumpEditor({ ticket, start, choices }: PumpEditorProps) {
  const router = useRouter();
  const queries = useQueryClient();
  return (
    <div className="flex max-w-2xl flex-1 flex-col">
      <PumpTicketForm
        ticket={ticket}
        start={start}
        choices={choices}
        withTies
        onDone={async () => {
          await queries.invalidateQueries({ queryKey: ['pump-tickets'] });
          router.push(routes.pumpTickets());
        }}
      />
    </div>
  );
}
