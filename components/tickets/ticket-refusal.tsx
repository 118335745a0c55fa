'use client';

import { useEffect, useRef, useState } from 'react';
import type { TicketDetail } from '@/lib/contracts/tickets';
import { ticketDetail } from '@/lib/contracts/tickets';
import { ApiFailure, apiSend } from '@/lib/queries/api';
import type { Locale } from '@/lib/text/locale';
import { pourDayMessages } from '@/lib/text/messages/pour-day';
import { failureText } from '@/lib/text/problems';
import { Button } from '../ui/button';
import { useLocale } from '../ui/locale';
import { Notice } from '../ui/notice';
import type { TicketCheck } from './use-ticket-form';

/** The server's sentence knows most; in another language ours says what it is about. */
function inWords(check: TicketCheck, locale: Locale): string | null {
  const { problem, form } = check.state;
  if (problem === null || locale === 'en') return problem;
  const words = pourDayMessages(locale).check;
  if (check.duplicate) return words.duplicateSays(form.getValues('number'));
  return check.stale ? words.staleSays : problem;
}

interface TicketRefusalProps {
  check: TicketCheck;
  ticket: TicketDetail | null;
  onDone: (ticket: TicketDetail) => void;
}

/** Why the ticket was not taken, with the way out that the case has. */
export function TicketRefusal({ check, ticket, onDone }: TicketRefusalProps) {
  const locale = useLocale();
  const words = pourDayMessages(locale).check;
  const [failure, setFailure] = useState<string | null>(null);
  const problem = failure ?? inWords(check, locale);
  const place = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (problem) place.current?.scrollIntoView({ block: 'center' });
  }, [problem]);
  if (!problem) return null;
  async function attempt(work: () => Promise<void>) {
    setFailure(null);
    try {
      await work();
    } catch (error) {
      if (!(error instanceof ApiFailure)) throw error;
      setFailure(failureText(locale, error));
    }
  }
  const attach = async () => {
    if (!ticket) return;
    const { supplierId, number } = check.state.form.getValues();
    const body = { version: check.version, supplierId, number };
    onDone(await apiSend('POST', `/api/tickets/${ticket.id}/attach`, body, ticketDetail));
  };
  return (
    <div ref={place} className="px-4 pt-3">
      <Notice tone="error">
        <p>{problem}</p>
        {check.duplicate && ticket?.status === 'toCheck' && ticket.photos.length > 0 && (
          <Button variant="quiet" className="mt-2 min-h-14" onClick={() => attempt(attach)}>
            {words.attach}
          </Button>
        )}
        {check.stale && (
          <Button
            variant="quiet"
            className="mt-2 min-h-14"
            onClick={() => attempt(check.openAgain)}
          >
            {words.openAgain}
          </Button>
        )}
      </Notice>
    </div>
  );
}
