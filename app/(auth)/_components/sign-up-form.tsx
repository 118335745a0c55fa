'use client';

import Link from 'next/link';
import { useEffect } from 'react';
import { ApiForm } from '@/components/forms/api-form';
import { PasswordField } from '@/components/forms/password-field';
import { TimeZoneField } from '@/components/forms/time-zone-field';
import { useApiForm } from '@/components/forms/use-api-form';
import { CopiesSheet } from '@/components/shell/copies-sheet';
import { Button } from '@/components/ui/button';
import { TextField } from '@/components/ui/field';
import { useLocale } from '@/components/ui/locale';
import { nextPage, signUpInput } from '@/lib/contracts/auth';
import { apiSend } from '@/lib/queries/api';
import { routes } from '@/lib/routes';
import { authMessages } from '@/lib/text/messages/auth';
import { goTo } from './go-to';

export function SignUpForm() {
  const words = authMessages(useLocale());
  const state = useApiForm({
    schema: signUpInput,
    defaultValues: {
      companyName: '',
      timeZone: 'America/Chicago',
      name: '',
      email: '',
      password: '',
    },
    send: (values) => apiSend('POST', '/api/sign-up', values, nextPage),
    onDone: goTo,
  });
  const { form } = state;
  useEffect(() => {
    // Only the browser knows where it is; the server's first answer is a guess.
    form.setValue('timeZone', Intl.DateTimeFormat().resolvedOptions().timeZone);
  }, [form]);
  return (
    <CopiesSheet kind={words.signUp.kind} title={words.signUp.title}>
      <ApiForm state={state} className="grid gap-4">
        <TextField
          label={words.signUp.companyName}
          autoComplete="organization"
          {...state.register('companyName')}
          error={state.errorOf('companyName')}
        />
        <TimeZoneField
          label={words.signUp.timeZone}
          hint={words.signUp.timeZoneHint}
          current={form.watch('timeZone')}
          {...state.register('timeZone')}
          error={state.errorOf('timeZone')}
        />
        <TextField
          label={words.signUp.name}
          autoComplete="name"
          {...state.register('name')}
          error={state.errorOf('name')}
        />
        <TextField
          label={words.email}
          type="email"
          inputMode="email"
          autoComplete="username"
          {...state.register('email')}
          error={state.errorOf('email')}
        />
        <PasswordField
          label={words.password}
          hint={words.passwordHint}
          showLabel={words.showPassword}
          hideLabel={words.hidePassword}
          autoComplete="new-password"
          {...state.register('password')}
          error={state.errorOf('password')}
        />
        <Button type="submit" pending={state.pending} className="min-h-12 md:min-h-11">
          {words.signUp.submit}
        </Button>
        <p className="text-[14px] text-ink-soft">{words.signUp.owner}</p>
      </ApiForm>
      <p className="mt-4 border-t border-cured pt-3 text-[14.5px] text-ink-soft">
        {words.signUp.haveOne} <Link href={routes.signIn()}>{words.signIn.submit}</Link>
      </p>
    </CopiesSheet>
  );
}
