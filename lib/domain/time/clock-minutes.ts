/**
 * Clock times are whole minutes after midnight of the pour's date in the company's time zone.
 * A pour that runs past midnight goes on counting: 00:10 of the next day is 1450.
 */
export type ClockMinutes = number;

/** A calendar day, "2026-09-03". Days never carry a time zone. */
export type PlainDate = string;

const CLOCK = /^([01]?\d|2[0-3]):([0-5]\d)$/;

/** "07:26" → 446. Returns null for anything that is not a 24-hour clock time. */
export function parseClock(text: string): ClockMinutes | null {
  const found = CLOCK.exec(text.trim());
  if (!found) return null;
  return Number(found[1]) * 60 + Number(found[2]);
}

/** 446 → "07:26"; 1450 → "00:10". */
export function clockText(minutes: ClockMinutes): string {
  const inDay = ((minutes % 1440) + 1440) % 1440;
  return `${String(Math.floor(inDay / 60)).padStart(2, '0')}:${String(inDay % 60).padStart(2, '0')}`;
}

/**
 * Puts times that a form prints in order onto one growing scale: a time more than twelve hours
 * before the one preceding it is taken as the next day's.
 */
export function unrollPastMidnight(
  times: readonly (ClockMinutes | null)[],
): (ClockMinutes | null)[] {
  let previous: ClockMinutes | null = null;
  return times.map((time) => {
    if (time === null) return null;
    let unrolled = time;
    while (previous !== null && unrolled < previous - 720) unrolled += 1440;
    previous = unrolled;
    return unrolled;
  });
}
