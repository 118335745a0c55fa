import type { Locale } from '../locale';
import type { AccountMessages } from './en/account';
import { account as en } from './en/account';
import { account as es } from './es/account';

const byLocale: Record<Locale, AccountMessages> = { en, es };

export function accountMessages(locale: Locale): AccountMessages {
  return byLocale[locale];
}
