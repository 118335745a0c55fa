import type { Locale } from '../locale';
import type { CommonMessages } from './en/common';
import { common as en } from './en/common';
import { common as es } from './es/common';

const byLocale: Record<Locale, CommonMessages> = { en, es };

/** The frame's words in one language. */
export function commonMessages(locale: Locale): CommonMessages {
  return byLocale[locale];
}
