/** The languages that the product speaks. */
export const LOCALES = ['en', 'es'] as const;
export type Locale = (typeof LOCALES)[number];

/** Remembers the language of someone who is not signed in, and of the page frame. */
export const LOCALE_COOKIE = 'strikeoff_locale';

/** The language named by a cookie's value; English where it names none that we speak. */
export function localeOf(value: string | undefined): Locale {
  return value === 'es' ? 'es' : 'en';
}
