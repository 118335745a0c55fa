'use client';

import type { ReactNode } from 'react';
import { createContext, useContext } from 'react';
import type { Locale } from '@/lib/text/locale';
import { commonMessages } from '@/lib/text/messages/common';

const LocaleContext = createContext<Locale>('en');

/** Says in which language the parts below it speak. */
export function LocaleProvider({ locale, children }: { locale: Locale; children: ReactNode }) {
  return <LocaleContext value={locale}>{children}</LocaleContext>;
}

export function useLocale(): Locale {
  return useContext(LocaleContext);
}

/** The frame's words in the language of the screen. */
export function useCommon() {
  return commonMessages(useLocale());
}
