'use client';

import Link from 'next/link';
import { ApiForm } from '@/components/forms/api-form';
import { useApiForm } from '@/components/forms/use-api-form';
import { CopiesSheet } from '@/components/shell/copies-sheet';
import { Button } from '@/components/ui/button';
import { TextField } from '@/components/ui/field';
import { useLocale } from '@/components/ui/locale';
import { Notice } from '@/components/ui/notice';
import { forgotPasswordInput, forgotPasswordOutput } from '@/lib/contracts/auth';
import { apiSend } from '@/lib/queries/api';
import { routes } from '@/lib/routes';
import { authMessages } from '@/lib/text/messages/auth';

export function ForgotPasswordForm() {
  const words = authMessages(useLocale());
  const state = useApiForm({
    schema: forgotPasswordInput,
    defaultValues: { email: '' },
    send: (values) => apiSend('POST', '/api/forgot-password', values, forgotPasswordOutput),
  });
  return (
    <CopiesSheet kind={words.forgot.kind} title={words.forgot.title}>
      {state.doneCount > 0 ? (
        <Notice tone="done">
          <p>{words.forgot.done}</p>
          <p className="mt-2 text-ink-soft">{words.forgot.noMail}</p>
        </Notice>
      ) : (
        <ApiForm state={state} className="grid gap-4">
          <p className="text-ink-soft">{words.forgot.says}</p>
          <TextField
            label={words.email}
            type="email"
            inputMode="email"
            autoComplete="username"
            {...state.register('email')}
            error={state.errorOf('email')}
          />
          <Button type="submit" pending={state.pending} className="min-h-12 md:min-h-11">
            {words.forgot.submit}
          </Button>
        </ApiForm>
      )}
      <p className="mt-4 border-t border-cured pt-3 text-[14.5px]">
        <Link href={routes.signIn()}>{words.forgot.back}</Link>
      </p>
    </CopiesSheet>
  );
}
