'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { statementState } from '@/lib/contracts/statements';
import { apiSend } from '@/lib/queries/api';
import { sheetWords as words } from '@/lib/text/messages/en/statements';
import { Button } from '../ui/button';
import { ConfirmDialog } from '../ui/confirm-dialog';
import { TextField } from '../ui/field';

interface ClosingProps {
  statementId: string;
  status: 'open' | 'closed';
  /** Whether every row is settled. */
  ready: boolean;
  mayReopen: boolean;
  onChanged: () => Promise<void>;
}

/** Closes a settled statement; the owner reopens a closed one, with a reason. */
export function Closing({ statementId, status, ready, mayReopen, onChanged }: ClosingProps) {
  const router = useRouter();
  const [open, setOpen] = useState(false);
  const [reason, setReason] = useState('');
  const verb = status === 'open' ? 'close' : 'reopen';
  async function act() {
    const body = verb === 'reopen' ? { reason } : {};
    await apiSend('POST', `/api/statements/${statementId}/${verb}`, body, statementState);
    await onChanged();
    router.refresh();
  }
  if (status === 'closed' && !mayReopen) return null;
  if (status === 'open' && !ready) return null;
  const isClosing = verb === 'close';
  return (
    <>
      <Button variant={isClosing ? 'primary' : 'quiet'} onClick={() => setOpen(true)}>
        {isClosing ? words.close : words.reopen}
      </Button>
      <ConfirmDialog
        open={open}
        onClose={() => setOpen(false)}
        title={isClosing ? words.closeTitle : words.reopenTitle}
        confirm={isClosing ? words.close : words.reopen}
        onConfirm={act}
      >
        <p>{isClosing ? words.closeSays : words.reopenSays}</p>
        {!isClosing && (
          <TextField
            label={words.reason}
            fieldClassName="mt-3"
            value={reason}
            maxLength={300}
            data-first-focus
            onChange={(event) => setReason(event.target.value)}
          />
        )}
      </ConfirmDialog>
    </>
  );
}
