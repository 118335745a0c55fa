'use client';

import type { ReactNode } from 'react';
import { useState } from 'react';
import { ApiFailure } from '@/lib/queries/api';
import { failureText } from '@/lib/text/problems';
import { Button } from './button';
import { Dialog } from './dialog';
import { useCommon, useLocale } from './locale';
import { Notice } from './notice';

interface ConfirmDialogProps {
  open: boolean;
  onClose: () => void;
  title: ReactNode;
  children: ReactNode;
  /** The word for what happens: "Remove", never "OK". */
  confirm: string;
  danger?: boolean;
  /** Does it; a failure is shown and the dialog stays. */
  onConfirm: () => Promise<void>;
}

/** Asks once before what cannot be undone. */
export function ConfirmDialog(props: ConfirmDialogProps) {
  const { open, onClose, title, children, confirm, danger = false, onConfirm } = props;
  const words = useCommon();
  const locale = useLocale();
  const [pending, setPending] = useState(false);
  const [problem, setProblem] = useState<string | null>(null);
  async function act() {
    setPending(true);
    setProblem(null);
    try {
      await onConfirm();
      onClose();
    } catch (error) {
      if (!(error instanceof ApiFailure)) throw error;
      setProblem(failureText(locale, error));
    } finally {
      setPending(false);
    }
  }
  function close() {
    setProblem(null);
    onClose();
  }
  return (
    <Dialog
      open={open}
      onClose={close}
      title={title}
      footer={
        <>
          <Button variant={danger ? 'danger' : 'primary'} pending={pending} onClick={act}>
            {confirm}
          </Button>
          <Button variant="quiet" onClick={close} data-first-focus={danger || undefined}>
            {words.cancel}
          </Button>
        </>
      }
    >
      {problem && (
        <Notice tone="error" className="mb-3">
          {problem}
        </Notice>
      )}
      {children}
    </Dialog>
  );
}
