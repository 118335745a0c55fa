/**
 * Ticket numbers as people, printers and readers write them. Each form is a looser reading of the
 * one before; the matcher tries them in this order.
 */

/** No separators, no case, no leading zeros: "TKT 0044-7182" is "TKT447182" only if so printed. */
export function plainNumber(number: string): string {
  return number
    .toUpperCase()
    .replace(/[^A-Z0-9]/g, '')
    .replace(/^0+(?=.)/, '');
}

/** The longest run of at least three digits: prefixes, plant suffixes and leading zeros gone. */
export function coreNumber(number: string): string | null {
  const runs = number.split(/[^0-9]+/).map((run) => run.replace(/^0+(?=.)/, ''));
  const longest = runs.reduce((best, run) => (run.length > best.length ? run : best), '');
  return longest.length >= 3 ? longest : null;
}

const CONFUSED: Readonly<Record<string, string>> = {
  O: '0',
  I: '1',
  L: '1',
  '7': '1',
  S: '5',
  B: '8',
  G: '6',
};

/** Characters that a reader confuses (0/O, 1/I/7, 5/S, 8/B, 6/G) folded into one. */
export function foldedNumber(number: string): string | null {
  const folded = [...plainNumber(number)].map((char) => CONFUSED[char] ?? char).join('');
  return coreNumber(folded);
}

/** Two digits swapped, or one left out: how a clerk mistypes a number. Not "one higher". */
export function isMistyped(one: string, other: string): boolean {
  const [first, second] = [plainNumber(one), plainNumber(other)];
  if (first === second) return false;
  if (first.length === second.length) {
    const differing = [...first].flatMap((char, at) => (char === second[at] ? [] : [at]));
    const [left = 0, right = 0] = differing;
    return (
      differing.length === 2 &&
      right === left + 1 &&
      first[left] === second[right] &&
      first[right] === second[left]
    );
  }
  const [shorter, longer] = first.length < second.length ? [first, second] : [second, first];
  if (shorter.length < 4 || longer.length - shorter.length !== 1) return false;
  return [...longer].some((_, at) => longer.slice(0, at) + longer.slice(at + 1) === shorter);
}
