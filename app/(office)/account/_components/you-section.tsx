'use client';

import { useRouter } from 'next/navigation';
import { ApiForm } from '@/components/forms/api-form';
import { useApiForm } from '@/components/forms/use-api-form';
import { rememberLocale } from '@/components/shell/remember-locale';
import { Button } from '@/components/ui/button';
import { SelectField, TextField } from '@/components/ui/field';
import { useLocale } from '@/components/ui/locale';
import { Notice } from '@/components/ui/notice';
import { Section } from '@/components/ui/section';
import type { Account } from '@/lib/contracts/account';
import { account as accountSchema, updateAccountInput } from '@/lib/contracts/account';
import { apiSend } from '@/lib/queries/api';
import { LOCALES } from '@/lib/text/locale';
import { accountMessages } from '@/lib/text/messages/account';

export function YouSection({ account }: { account: Account }) {
  const words = accountMessages(useLocale());
  const router = useRouter();
  const state = useApiForm({
    schema: updateAccountInput,
    defaultValues: { name: account.name, locale: account.locale },
    send: (values) => apiSend('PUT', '/api/account', values, accountSchema),
    onDone({ name, locale }) {
      state.form.reset({ name, locale });
      rememberLocale(locale);
      router.refresh();
    },
  });
  return (
    <Section title={words.you}>
      <ApiForm state={state} className="grid gap-4">
        <TextField
          label={words.name}
          autoComplete="name"
          {...state.register('name')}
          error={state.errorOf('name')}
        />
        <SelectField
          label={words.language}
          hint={words.languageHint}
          {...state.register('locale')}
          error={state.errorOf('locale')}
        >
          {LOCALES.map((locale) => (
            <option key={locale} value={locale} lang={locale}>
              {words.languages[locale]}
            </option>
          ))}
        </SelectField>
        <div className="flex flex-wrap items-center gap-3">
          <Button type="submit" pending={state.pending}>
            {words.save}
          </Button>
          {state.doneCount > 0 && !state.form.formState.isDirty && (
            <Notice tone="done">{words.saved}</Notice>
          )}
        </div>
      </ApiForm>
    </Section>
  );
}
