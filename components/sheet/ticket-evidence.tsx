'use client';

import { useQuery } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import type { SheetRow } from '@/lib/contracts/sheet';
import { ticketQuery } from '@/lib/queries/tickets';
import { TicketPhoto } from '../tickets/ticket-photo';

/** Which field of the ticket a charge rests on: the photo opens there. */
const FIELD_OF: Partial<Record<SheetRow['chargeKind'], string>> = {
  mix: 'quantityYd3',
  perYardFee: 'quantityYd3',
  shortLoad: 'quantityYd3',
  waiting: 'arrivedAt',
};

/** Walking the rows fast must not fetch a ticket for each. */
const REST_MS = 150;

interface TicketEvidenceProps {
  ticketId: string;
  about: SheetRow['chargeKind'];
}

/** The photo of a row's ticket, opened at what the row is about; nothing where there is none. */
export function TicketEvidence({ ticketId, about }: TicketEvidenceProps) {
  const [asked, setAsked] = useState<string | null>(null);
  useEffect(() => {
    const timer = setTimeout(() => setAsked(ticketId), REST_MS);
    return () => clearTimeout(timer);
  }, [ticketId]);
  const { data } = useQuery({ ...ticketQuery(asked ?? ''), enabled: asked === ticketId });
  const photo = asked === ticketId ? data?.photos[0] : undefined;
  if (!photo) return null;
  const boxes = photo.reading.suggestion?.boxes ?? {};
  const focus = FIELD_OF[about] ?? 'number';
  const spots = Object.entries(boxes).flatMap(([field, box]) =>
    box && field === focus ? [{ field, box, doubtful: false }] : [],
  );
  return (
    <TicketPhoto
      photo={photo}
      spots={spots}
      focus={spots.length > 0 ? focus : null}
      className="h-48 border border-cured"
    />
  );
}
