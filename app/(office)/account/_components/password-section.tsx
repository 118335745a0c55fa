'use client';

import { useState } from 'react';
import { ApiForm } from '@/components/forms/api-form';
import { PasswordField } from '@/components/forms/password-field';
import { useApiForm } from '@/components/forms/use-api-form';
import { Button } from '@/components/ui/button';
import { useLocale } from '@/components/ui/locale';
import { Notice } from '@/components/ui/notice';
import { Section } from '@/components/ui/section';
import { changePasswordInput, changePasswordOutput } from '@/lib/contracts/account';
import { apiSend } from '@/lib/queries/api';
import { accountMessages } from '@/lib/text/messages/account';
import { authMessages } from '@/lib/text/messages/auth';

export function PasswordSection({ email }: { email: string }) {
  const locale = useLocale();
  const words = accountMessages(locale);
  const auth = authMessages(locale);
  const [ended, setEnded] = useState<number | null>(null);
  const state = useApiForm({
    schema: changePasswordInput,
    defaultValues: { currentPassword: '', newPassword: '' },
    send: (values) => apiSend('PUT', '/api/account/password', values, changePasswordOutput),
    onDone({ endedSessions }) {
      state.form.reset();
      setEnded(endedSessions);
    },
  });
  const shared = { showLabel: auth.showPassword, hideLabel: auth.hidePassword };
  return (
    <Section title={words.password}>
      <ApiForm state={state} className="grid gap-4">
        {/* For password managers, which file a password under the address they find beside it. */}
        <input type="email" autoComplete="username" value={email} readOnly hidden />
        <PasswordField
          {...shared}
          label={words.currentPassword}
          autoComplete="current-password"
          {...state.register('currentPassword')}
          error={state.errorOf('currentPassword')}
        />
        <PasswordField
          {...shared}
          label={words.newPassword}
          hint={auth.passwordHint}
          autoComplete="new-password"
          {...state.register('newPassword')}
          error={state.errorOf('newPassword')}
        />
        <div>
          <Button type="submit" pending={state.pending}>
            {words.changePassword}
          </Button>
        </div>
        {ended !== null && <Notice tone="done">{words.passwordChanged(ended)}</Notice>}
      </ApiForm>
    </Section>
  );
}
