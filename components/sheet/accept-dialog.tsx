'use client';

import { useId, useState } from 'react';
import { sheetWords as words } from '@/lib/text/messages/en/statements';
import { Button } from '../ui/button';
import { Dialog } from '../ui/dialog';
import { TextField } from '../ui/field';
import { useCommon } from '../ui/locale';

interface AcceptDialogProps {
  open: boolean;
  onClose: () => void;
  onAccept: (reason: string) => Promise<boolean>;
}

/** Asks why a difference is accepted; without a reason nothing is. */
export function AcceptDialog({ open, onClose, onAccept }: AcceptDialogProps) {
  const common = useCommon();
  const listId = useId();
  const [reason, setReason] = useState('');
  const [error, setError] = useState<string | undefined>();
  async function accept(): Promise<void> {
    if (reason.trim() === '') {
      setError('needed');
      return;
    }
    if (await onAccept(reason.trim())) {
      setReason('');
      onClose();
    }
  }
  return (
    <Dialog
      open={open}
      onClose={onClose}
      title={words.acceptTitle}
      footer={
        <>
          <Button onClick={accept}>{words.accept}</Button>
          <Button variant="quiet" onClick={onClose}>
            {common.cancel}
          </Button>
        </>
      }
    >
      <form
        onSubmit={(event) => {
          event.preventDefault();
          void accept();
        }}
      >
        <p className="mb-3">{words.acceptSays}</p>
        <TextField
          label={words.reason}
          value={reason}
          maxLength={300}
          list={listId}
          error={error}
          data-first-focus
          onChange={(event) => {
            setReason(event.target.value);
            setError(undefined);
          }}
        />
        <datalist id={listId}>
          {words.acceptReasons.map((one) => (
            <option key={one} value={one} />
          ))}
        </datalist>
      </form>
    </Dialog>
  );
}
