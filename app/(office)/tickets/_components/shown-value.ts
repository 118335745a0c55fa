import { clockText } from '@/lib/domain/time/clock-minutes';
import { dayText } from '@/lib/text/format';
import { pourDay } from '@/lib/text/messages/en/pour-day';

/** A recorded value as people read it; null for nothing. */
export function shownValue(field: string, value: string): string | null {
  if (value === '') return null;
  if (field.endsWith('At')) return clockText(Number(value));
  if (field === 'date') return dayText(value);
  if (field === 'status' && value in pourDay.states) {
    return pourDay.states[value as keyof typeof pourDay.states];
  }
  return value;
}
