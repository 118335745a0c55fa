'use client';

import { useState } from 'react';
import type { TicketDetail } from '@/lib/contracts/tickets';
import { ticketDetail } from '@/lib/contracts/tickets';
import { ApiFailure, apiSend } from '@/lib/queries/api';
import { pourDayMessages } from '@/lib/text/messages/pour-day';
import { issueText } from '@/lib/text/problems';
import { Button } from '../ui/button';
import { ConfirmDialog } from '../ui/confirm-dialog';
import { TextField } from '../ui/field';
import { useLocale } from '../ui/locale';

interface SetAsideProps {
  ticket: TicketDetail;
  version: number;
  onDone: (ticket: TicketDetail) => void;
}

/** Sets a ticket aside with a reason, common ones one press away. */
export function SetAside({ ticket, version, onDone }: SetAsideProps) {
  const locale = useLocale();
  const words = pourDayMessages(locale).check;
  const [open, setOpen] = useState(false);
  const [reason, setReason] = useState('');
  const [tried, setTried] = useState(false);
  async function reject() {
    setTried(true);
    // The dialog shows it and stays open.
    if (reason.trim() === '') throw new ApiFailure('invalid', words.sayWhy, [], 0);
    const body = { version, reason };
    const answer = await apiSend('POST', `/api/tickets/${ticket.id}/reject`, body, ticketDetail);
    onDone(answer);
  }
  return (
    <div className="px-4 py-3">
      <Button
        variant="quiet"
        className="min-h-14 w-full md:min-h-11 md:w-auto"
        onClick={() => setOpen(true)}
      >
        {words.setAside}
      </Button>
      <ConfirmDialog
        open={open}
        onClose={() => setOpen(false)}
        title={words.setAside}
        confirm={words.setAside}
        danger
        onConfirm={reject}
      >
        <p>{words.setAsideSays}</p>
        <div className="my-3 flex flex-wrap gap-2">
          {words.reasons.map((one) => (
            <Button key={one} variant="quiet" onClick={() => setReason(one)}>
              {one}
            </Button>
          ))}
        </div>
        <TextField
          label={words.reason}
          value={reason}
          onChange={(event) => setReason(event.target.value)}
          error={tried && reason.trim() === '' ? issueText(locale, 'needed') : undefined}
        />
      </ConfirmDialog>
    </div>
  );
}
