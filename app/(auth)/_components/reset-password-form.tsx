'use client';

import Link from 'next/link';
import { ApiForm } from '@/components/forms/api-form';
import { PasswordField } from '@/components/forms/password-field';
import { useApiForm } from '@/components/forms/use-api-form';
import { CopiesSheet } from '@/components/shell/copies-sheet';
import { Button } from '@/components/ui/button';
import { useLocale } from '@/components/ui/locale';
import { nextPage, resetPasswordInput } from '@/lib/contracts/auth';
import { apiSend } from '@/lib/queries/api';
import { routes } from '@/lib/routes';
import { authMessages } from '@/lib/text/messages/auth';
import { goTo } from './go-to';

export function ResetPasswordForm({ token }: { token: string }) {
  const words = authMessages(useLocale());
  const state = useApiForm({
    schema: resetPasswordInput.pick({ password: true }),
    defaultValues: { password: '' },
    send: (values) => apiSend('POST', '/api/reset-password', { token, ...values }, nextPage),
    onDone: goTo,
  });
  return (
    <CopiesSheet kind={words.reset.kind} title={words.reset.title}>
      <ApiForm state={state} className="grid gap-4">
        <PasswordField
          label={words.reset.newPassword}
          hint={words.passwordHint}
          showLabel={words.showPassword}
          hideLabel={words.hidePassword}
          autoComplete="new-password"
          {...state.register('password')}
          error={state.errorOf('password')}
        />
        <Button type="submit" pending={state.pending} className="min-h-12 md:min-h-11">
          {words.reset.submit}
        </Button>
        <p className="text-[14px] text-ink-soft">{words.reset.ends}</p>
      </ApiForm>
      <p className="mt-4 border-t border-cured pt-3 text-[14.5px]">
        <Link href={routes.forgotPassword()}>{words.signIn.forgot}</Link>
      </p>
    </CopiesSheet>
  );
}
