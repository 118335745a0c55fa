import { type ClockMinutes, clockText } from '../../time/clock-minutes';

/** A stretch of time that is known, or only bounded by the times that are. */
export type TimeSpan =
  | { readonly known: true; readonly minutes: number; readonly words: string }
  | {
      readonly known: false;
      readonly missing: readonly string[];
      readonly atLeastMinutes: number;
      readonly atMostMinutes: number | null;
    };

interface NamedTime {
  readonly name: string;
  readonly at: ClockMinutes | null;
}

interface Bounds {
  readonly start: NamedTime;
  readonly end: NamedTime;
  /** Times that cannot lie before the start or after the end: what they span was waited for sure. */
  readonly inside: readonly (ClockMinutes | null)[];
  /** The nearest time known to lie before the start. */
  readonly before: ClockMinutes | null;
  /** The nearest time known to lie after the end. */
  readonly after: ClockMinutes | null;
}

function known(times: readonly (ClockMinutes | null)[]): ClockMinutes[] {
  return times.filter((time) => time !== null);
}

/** The span from `start` to `end`, or its bounds where one of the two is missing or impossible. */
export function spanOf({ start, end, inside, before, after }: Bounds): TimeSpan {
  if (start.at !== null && end.at !== null) {
    if (end.at >= start.at) {
      const words = `${clockText(start.at)} to ${clockText(end.at)} = ${end.at - start.at} min`;
      return { known: true, minutes: end.at - start.at, words };
    }
    return {
      known: false,
      missing: [`${end.name} after ${start.name}`],
      atLeastMinutes: 0,
      atMostMinutes: null,
    };
  }
  const surely = known([start.at, ...inside, end.at]);
  const first = start.at ?? before;
  const last = end.at ?? after;
  const atLeast = surely.length < 2 ? 0 : Math.max(...surely) - Math.min(...surely);
  return {
    known: false,
    missing: [start, end].filter((one) => one.at === null).map((one) => one.name),
    atLeastMinutes: atLeast,
    atMostMinutes: first === null || last === null ? null : Math.max(last - first, atLeast),
  };
}
