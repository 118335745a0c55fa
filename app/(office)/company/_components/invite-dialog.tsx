'use client';

import { useId } from 'react';
import { useApiForm } from '@/components/forms/use-api-form';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { SelectField, TextField } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { invitationRow, invitePersonInput, role } from '@/lib/contracts/people';
import { apiSend } from '@/lib/queries/api';
import { common } from '@/lib/text/messages/en/common';
import { company } from '@/lib/text/messages/en/company';

const words = company.people;

interface InviteDialogProps {
  open: boolean;
  onClose: () => void;
  onInvited: (name: string, email: string) => Promise<void>;
}

export function InviteDialog({ open, onClose, onInvited }: InviteDialogProps) {
  const formId = useId();
  const state = useApiForm({
    schema: invitePersonInput,
    defaultValues: { name: '', email: '', role: 'foreman' },
    send: (values) => apiSend('POST', '/api/people/invitations', values, invitationRow),
    async onDone(invitation) {
      state.form.reset();
      onClose();
      await onInvited(invitation.name, invitation.email);
    },
  });
  const { register, errorOf } = state;
  return (
    <Dialog
      open={open}
      onClose={onClose}
      title={words.invite}
      footer={
        <>
          <Button type="submit" form={formId} pending={state.pending}>
            {words.send}
          </Button>
          <Button variant="quiet" onClick={onClose}>
            {common.cancel}
          </Button>
        </>
      }
    >
      <form id={formId} noValidate onSubmit={state.submit} className="grid gap-4">
        {state.problem && <Notice tone="error">{state.problem}</Notice>}
        <TextField
          label={words.name}
          autoComplete="off"
          {...register('name')}
          error={errorOf('name')}
        />
        <TextField
          label={words.email}
          type="email"
          inputMode="email"
          autoComplete="off"
          {...register('email')}
          error={errorOf('email')}
        />
        <SelectField
          label={words.role}
          hint={words.roleHints[state.form.watch('role')]}
          {...register('role')}
          error={errorOf('role')}
        >
          {role.options.map((one) => (
            <option key={one} value={one}>
              {common.roles[one]}
            </option>
          ))}
        </SelectField>
        <p className="text-[14px] text-ink-soft">{words.inviteSays}</p>
      </form>
    </Dialog>
  );
}
