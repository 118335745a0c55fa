'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { Button, LinkButton } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { TextField } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import type { OrderDetail } from '@/lib/contracts/orders';
import { orderDetail } from '@/lib/contracts/orders';
import { apiSend } from '@/lib/queries/api';
import { routes } from '@/lib/routes';
import { orderWords as words } from '@/lib/text/messages/en/jobs';

type Step = 'send' | 'confirm' | 'cancel';

/** What can be done with an order now, each asked once before it is done. */
export function OrderActions({ order }: { order: OrderDetail }) {
  const router = useRouter();
  const [step, setStep] = useState<Step | null>(null);
  const [reference, setReference] = useState(order.supplierReference);
  const [reason, setReason] = useState('');
  if (order.status === 'cancelled') return null;
  const close = () => setStep(null);
  async function act(verb: Step, body: object) {
    await apiSend('POST', `/api/orders/${order.id}/${verb}`, body, orderDetail);
    router.refresh();
  }
  const canSend = order.status === 'draft';
  return (
    <>
      {canSend && <Button onClick={() => setStep('send')}>{words.send}</Button>}
      {order.status !== 'confirmed' && (
        <Button variant={canSend ? 'quiet' : 'primary'} onClick={() => setStep('confirm')}>
          {words.confirm}
        </Button>
      )}
      <LinkButton href={routes.editOrder(order.id)}>{words.change}</LinkButton>
      <Button variant="quiet" onClick={() => setStep('cancel')}>
        {words.cancel}
      </Button>
      <ConfirmDialog
        open={step === 'send'}
        onClose={close}
        title={words.sendTitle}
        confirm={words.send}
        onConfirm={() => act('send', {})}
      >
        {order.dispatchEmail ? (
          <p>{words.sendSays(order.supplierName, order.dispatchEmail)}</p>
        ) : (
          <Notice tone="warning">{words.noEmail}</Notice>
        )}
      </ConfirmDialog>
      <ConfirmDialog
        open={step === 'confirm'}
        onClose={close}
        title={words.confirmTitle}
        confirm={words.confirm}
        onConfirm={() => act('confirm', { supplierReference: reference })}
      >
        <TextField
          label={words.theirNumber}
          hint={words.theirNumberHint}
          value={reference}
          maxLength={60}
          data-first-focus
          onChange={(event) => setReference(event.target.value)}
        />
      </ConfirmDialog>
      <ConfirmDialog
        open={step === 'cancel'}
        onClose={close}
        title={words.cancelTitle}
        confirm={words.cancel}
        danger
        onConfirm={() => act('cancel', { reason })}
      >
        <p className="mb-3">{words.cancelSays}</p>
        <TextField
          label={words.reason}
          value={reason}
          maxLength={300}
          onChange={(event) => setReason(event.target.value)}
        />
      </ConfirmDialog>
    </>
  );
}
