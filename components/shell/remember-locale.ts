import type { Locale } from '@/lib/text/locale';
import { LOCALE_COOKIE } from '@/lib/text/locale';

const YEAR_SECONDS = 365 * 24 * 60 * 60;

/** Keeps the language in this browser for a year: no person's data, so plain script may set it. */
export function rememberLocale(locale: Locale): void {
  // biome-ignore lint/suspicious/noDocumentCookie: the Cookie Store API is not in every phone's browser
  document.cookie = `${LOCALE_COOKIE}=${locale}; path=/; max-age=${YEAR_SECONDS}; samesite=lax`;
}
