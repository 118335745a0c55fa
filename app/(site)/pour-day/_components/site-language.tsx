'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { rememberLocale } from '@/components/shell/remember-locale';
import { classNames } from '@/components/ui/class-names';
import { useLocale } from '@/components/ui/locale';
import { Notice } from '@/components/ui/notice';
import { account } from '@/lib/contracts/account';
import { ApiFailure, apiSend } from '@/lib/queries/api';
import type { Locale } from '@/lib/text/locale';
import { LOCALES } from '@/lib/text/locale';
import { accountMessages } from '@/lib/text/messages/account';
import { failureText } from '@/lib/text/problems';

/** English or Spanish, kept with the account and in this browser. */
export function SiteLanguage({ name }: { name: string }) {
  const locale = useLocale();
  const router = useRouter();
  const [problem, setProblem] = useState<string | null>(null);
  const words = accountMessages(locale);
  async function speak(next: Locale) {
    setProblem(null);
    try {
      await apiSend('PUT', '/api/account', { name, locale: next }, account);
    } catch (error) {
      if (!(error instanceof ApiFailure)) throw error;
      setProblem(failureText(locale, error));
      return;
    }
    rememberLocale(next);
    router.refresh();
  }
  return (
    <div className="mt-auto px-4 pt-6 pb-4">
      {problem && <Notice tone="error">{problem}</Notice>}
      <fieldset className="flex justify-center">
        <legend className="sr-only">{words.language}</legend>
        {LOCALES.map((one) => (
          <button
            key={one}
            type="button"
            lang={one}
            aria-pressed={one === locale}
            onClick={() => speak(one)}
            className={classNames(
              'min-h-14 px-4',
              one === locale
                ? 'font-semibold text-ink underline decoration-carbon decoration-2 underline-offset-4'
                : 'text-ink-soft',
            )}
          >
            {words.languages[one]}
          </button>
        ))}
      </fieldset>
    </div>
  );
}
