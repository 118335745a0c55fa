import type { Locale } from '../locale';
import type { AuthMessages } from './en/auth';
import { auth as en } from './en/auth';
import { auth as es } from './es/auth';

const byLocale: Record<Locale, AuthMessages> = { en, es };

export function authMessages(locale: Locale): AuthMessages {
  return byLocale[locale];
}
