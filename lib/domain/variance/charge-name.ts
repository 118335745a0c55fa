/**
 * A fee has a name on the rate sheet and a description on the bill; suppliers shorten. "ENV SRCHG"
 * is the environmental fee, "Fuel surcharge per load" is "Fuel".
 */

const EMPTY_WORDS = new Set(
  (
    'a an and the of per for each ea load loads ld yard yards yd yds cy fee fees charge charges chg ' +
    'chrg surcharge surchg srchg srcharge service misc'
  ).split(' '),
);

function tellingWords(text: string): string[] {
  const words = text.toLowerCase().match(/[a-z]+/g) ?? [];
  return words.filter((word) => !EMPTY_WORDS.has(word));
}

function sameWord(one: string, other: string): boolean {
  if (one === other) return true;
  const [shorter, longer] = one.length < other.length ? [one, other] : [other, one];
  return shorter.length >= 3 && longer.startsWith(shorter);
}

/** 0 to 1: how much of the agreed name the description holds. */
function nameShare(description: string, name: string): number {
  const wanted = tellingWords(name);
  const given = tellingWords(description);
  if (wanted.length === 0) return description.trim().toLowerCase() === name.toLowerCase() ? 1 : 0;
  return wanted.filter((word) => given.some((one) => sameWord(one, word))).length / wanted.length;
}

/** Whether a description says nothing but "fee" or "charge". */
function isNameless(description: string): boolean {
  return tellingWords(description).length === 0;
}

/** Of several agreed names the one that the description means; null where it means none. */
export function bestNamed<T extends { readonly label: string }>(
  description: string,
  candidates: readonly T[],
): T | null {
  let best: { readonly one: T; readonly share: number } | null = null;
  for (const one of candidates) {
    const share = nameShare(description, one.label);
    if (share >= 0.5 && (best === null || share > best.share)) best = { one, share };
  }
  if (best) return best.one;
  const [only] = candidates;
  return candidates.length === 1 && only && isNameless(description) ? only : null;
}
