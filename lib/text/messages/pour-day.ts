import type { Locale } from '../locale';
import type { PourDayMessages } from './en/pour-day';
import { pourDay as en } from './en/pour-day';
import { pourDay as es } from './es/pour-day';

const byLocale: Record<Locale, PourDayMessages> = { en, es };

/** The foreman's words in one language. */
export function pourDayMessages(locale: Locale): PourDayMessages {
  return byLocale[locale];
}
