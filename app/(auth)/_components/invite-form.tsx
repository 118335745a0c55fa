'use client';

import { useQuery } from '@tanstack/react-query';
import { ApiForm } from '@/components/forms/api-form';
import { PasswordField } from '@/components/forms/password-field';
import { useApiForm } from '@/components/forms/use-api-form';
import { CopiesSheet } from '@/components/shell/copies-sheet';
import { Button, LinkButton } from '@/components/ui/button';
import { TextField } from '@/components/ui/field';
import { useLocale } from '@/components/ui/locale';
import type { InvitationWelcome } from '@/lib/contracts/auth';
import { acceptInvitationInput, invitationWelcome, nextPage } from '@/lib/contracts/auth';
import { ApiFailure, apiGet, apiSend } from '@/lib/queries/api';
import { routes } from '@/lib/routes';
import { authMessages } from '@/lib/text/messages/auth';
import { commonMessages } from '@/lib/text/messages/common';
import { failureText } from '@/lib/text/problems';
import { goTo } from './go-to';

export function InviteForm({ token }: { token: string }) {
  const locale = useLocale();
  const words = authMessages(locale);
  const common = commonMessages(locale);
  const invitation = useQuery({
    queryKey: ['invitation', token],
    queryFn: () => apiGet(`/api/invitations/${encodeURIComponent(token)}`, invitationWelcome),
  });
  if (invitation.data) return <Welcome token={token} invitation={invitation.data} />;
  if (invitation.error) {
    const lost = invitation.error instanceof ApiFailure && isOutage(invitation.error);
    return (
      <CopiesSheet
        kind={words.invite.kind}
        title={lost ? common.broken.title : words.invite.deadTitle}
      >
        <p className="text-ink-soft">
          {lost && invitation.error instanceof ApiFailure
            ? failureText(locale, invitation.error)
            : words.invite.deadSays}
        </p>
        <div className="mt-5">
          {lost ? (
            <Button onClick={() => invitation.refetch()}>{common.tryAgain}</Button>
          ) : (
            <LinkButton href={routes.signIn()}>{words.forgot.back}</LinkButton>
          )}
        </div>
      </CopiesSheet>
    );
  }
  return (
    <CopiesSheet kind={words.invite.kind} title="…">
      <p role="status" className="min-h-48 text-ink-soft">
        {common.loading}
      </p>
    </CopiesSheet>
  );
}

/** The link may be good; it was we who could not answer. */
function isOutage(error: ApiFailure): boolean {
  return error.status === 0 || error.status >= 500 || error.code === 'tooMany';
}

function Welcome({ token, invitation }: { token: string; invitation: InvitationWelcome }) {
  const locale = useLocale();
  const words = authMessages(locale);
  const state = useApiForm({
    schema: acceptInvitationInput.pick({ name: true, password: true }),
    defaultValues: { name: invitation.name, password: '' },
    send: (values) => apiSend('POST', '/api/accept-invitation', { token, ...values }, nextPage),
    onDone: goTo,
  });
  const role = commonMessages(locale).roles[invitation.role];
  return (
    <CopiesSheet kind={words.invite.kind} title={words.invite.title(invitation.companyName)}>
      <ApiForm state={state} className="grid gap-4">
        <p className="text-ink-soft">{words.invite.says(role)}</p>
        <TextField
          label={words.email}
          type="email"
          value={invitation.email}
          readOnly
          autoComplete="username"
        />
        <TextField
          label={words.invite.name}
          autoComplete="name"
          {...state.register('name')}
          error={state.errorOf('name')}
        />
        <PasswordField
          label={words.invite.password}
          hint={words.passwordHint}
          showLabel={words.showPassword}
          hideLabel={words.hidePassword}
          autoComplete="new-password"
          {...state.register('password')}
          error={state.errorOf('password')}
        />
        <Button type="submit" pending={state.pending} className="min-h-12 md:min-h-11">
          {words.invite.submit}
        </Button>
      </ApiForm>
    </CopiesSheet>
  );
}
