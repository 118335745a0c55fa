'use client';

import { useQuery } from '@tanstack/react-query';
import Link from 'next/link';
import { useRef } from 'react';
import { ApiForm } from '@/components/forms/api-form';
import { PasswordField } from '@/components/forms/password-field';
import { useApiForm } from '@/components/forms/use-api-form';
import { CopiesSheet } from '@/components/shell/copies-sheet';
import { Button } from '@/components/ui/button';
import { TextField } from '@/components/ui/field';
import { useLocale } from '@/components/ui/locale';
import { nextPage, signInHintsOutput, signInInput } from '@/lib/contracts/auth';
import { apiGet, apiSend } from '@/lib/queries/api';
import { routes } from '@/lib/routes';
import { authMessages } from '@/lib/text/messages/auth';
import { DemoPeople } from './demo-people';
import { goTo } from './go-to';

export function SignInForm() {
  const words = authMessages(useLocale());
  const submitButton = useRef<HTMLButtonElement>(null);
  const hints = useQuery({
    queryKey: ['sign-in-hints'],
    queryFn: () => apiGet('/api/sign-in-hints', signInHintsOutput),
    staleTime: Number.POSITIVE_INFINITY,
  });
  const state = useApiForm({
    schema: signInInput,
    defaultValues: { email: '', password: '' },
    send: (values) => apiSend('POST', '/api/sign-in', values, nextPage),
    onDone: goTo,
  });
  function fill(email: string, password: string) {
    state.form.reset({ email, password });
    submitButton.current?.focus();
  }
  return (
    <>
      <CopiesSheet kind={words.signIn.kind} title={words.signIn.title}>
        <ApiForm state={state} className="grid gap-4">
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
            showLabel={words.showPassword}
            hideLabel={words.hidePassword}
            autoComplete="current-password"
            {...state.register('password')}
            error={state.errorOf('password')}
          />
          <Button
            ref={submitButton}
            type="submit"
            pending={state.pending}
            className="min-h-12 md:min-h-11"
          >
            {words.signIn.submit}
          </Button>
        </ApiForm>
        <p className="mt-4 flex flex-wrap justify-between gap-x-4 gap-y-2 border-t border-cured pt-3 text-[14.5px]">
          <Link href={routes.forgotPassword()} className="py-1">
            {words.signIn.forgot}
          </Link>
          <span className="py-1 text-ink-soft">
            {words.signIn.noCompany} <Link href={routes.signUp()}>{words.signIn.signUp}</Link>
          </span>
        </p>
      </CopiesSheet>
      {hints.data?.demo && <DemoPeople demo={hints.data.demo} onTake={fill} />}
    </>
  );
}
