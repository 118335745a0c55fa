import { TZDate } from '@date-fns/tz';
import { addDays, format, parseISO } from 'date-fns';
import type { ClockMinutes, PlainDate } from './domain/time/clock-minutes';
import { readEnv } from './env';

/** Where verbs get the present from, so that tests can say what it is. */
export interface Clock {
  now(): Date;
}

export const systemClock: Clock = {
  now() {
    const { fixedNow } = readEnv();
    return fixedNow ? new Date(fixedNow) : new Date();
  },
};

/** The calendar day at `moment` in a company's time zone. */
export function dayIn(timeZone: string, moment: Date): PlainDate {
  return format(new TZDate(moment, timeZone), 'yyyy-MM-dd');
}

/** Minutes after midnight at `moment` in a company's time zone. */
export function clockMinutesIn(timeZone: string, moment: Date): ClockMinutes {
  const local = new TZDate(moment, timeZone);
  return local.getHours() * 60 + local.getMinutes();
}

/** The moment at which `day` begins in a company's time zone, `days` later if asked. */
export function startOfDay(timeZone: string, day: PlainDate, days = 0): Date {
  const [year = 0, month = 1, date = 1] = day.split('-').map(Number);
  return new Date(new TZDate(year, month - 1, date + days, timeZone).getTime());
}

/** The calendar day that many days later, or earlier when `days` is negative. */
export function shiftDay(day: PlainDate, days: number): PlainDate {
  return format(addDays(parseISO(day), days), 'yyyy-MM-dd');
}
