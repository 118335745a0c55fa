'use client';

import { useMutation } from '@tanstack/react-query';
import { Button } from '@/components/ui/button';
import { useWhere } from '@/components/ui/where';
import type { InvitationRow as Invitation } from '@/lib/contracts/people';
import { withdrawInvitationOutput } from '@/lib/contracts/people';
import { apiSend } from '@/lib/queries/api';
import { dayOfMoment, dayText, momentText } from '@/lib/text/format';
import { common } from '@/lib/text/messages/en/common';
import { company } from '@/lib/text/messages/en/company';

const words = company.people;

interface InvitationRowProps {
  invitation: Invitation;
  onWithdrawn: () => Promise<void>;
}

export function InvitationRow({ invitation, onWithdrawn }: InvitationRowProps) {
  const where = useWhere();
  const withdraw = useMutation({
    mutationFn: () =>
      apiSend('DELETE', `/api/people/invitations/${invitation.id}`, {}, withdrawInvitationOutput),
    onSuccess: onWithdrawn,
  });
  return (
    <li className="flex flex-wrap items-center justify-between gap-x-4 gap-y-2 border-b border-cured py-2.5">
      <div className="min-w-0 flex-1 basis-64">
        <p>
          <span className="font-semibold">{invitation.name}</span>
          <span className="text-ink-soft"> · {common.roles[invitation.role]}</span>
        </p>
        <p className="text-[14px] break-words text-ink-soft">
          {invitation.email} ·{' '}
          {words.invitedBy(
            invitation.invitedBy,
            dayText(dayOfMoment(invitation.invitedAt, where.timeZone)),
          )}{' '}
          ·{' '}
          {invitation.state === 'open'
            ? words.openUntil(momentText(invitation.expiresAt, where))
            : words.expired}
        </p>
        {withdraw.error && (
          <p role="alert" className="text-[14px] font-semibold text-keel">
            {withdraw.error.message}
          </p>
        )}
      </div>
      <Button variant="quiet" pending={withdraw.isPending} onClick={() => withdraw.mutate()}>
        {words.withdraw}
      </Button>
    </li>
  );
}
