import type { Locale } from '../locale';
import type { HomeMessages } from './en/home';
import { home as en } from './en/home';
import { home as es } from './es/home';

const byLocale: Record<Locale, HomeMessages> = { en, es };

export function homeMessages(locale: Locale): HomeMessages {
  return byLocale[locale];
}
