'use client';

import { useRouter } from 'next/navigation';
import type { Locale } from '@/lib/text/locale';
import { authMessages } from '@/lib/text/messages/auth';
import { classNames } from '../ui/class-names';
import { useLocale } from '../ui/locale';
import { rememberLocale } from './remember-locale';

const NAMES: readonly (readonly [Locale, string])[] = [
  ['en', 'English'],
  ['es', 'Español'],
];

export function LanguageSwitch() {
  const locale = useLocale();
  const router = useRouter();
  return (
    <fieldset className="flex">
      <legend className="sr-only">{authMessages(locale).language}</legend>
      {NAMES.map(([one, name]) => (
        <button
          key={one}
          type="button"
          lang={one}
          aria-pressed={one === locale}
          onClick={() => {
            rememberLocale(one);
            router.refresh();
          }}
          className={classNames(
            'min-h-11 px-2.5 text-[14.5px]',
            one === locale
              ? 'font-semibold text-ink underline decoration-carbon decoration-2 underline-offset-4'
              : 'text-ink-soft hover:text-ink',
          )}
        >
          {name}
        </button>
      ))}
    </fieldset>
  );
}
