import type { Candidate } from './candidates';
import { type CheckResult, checkFields } from './checks';
import type { Rect } from './image/grey';
import type { ReadContext, TicketField } from './reading';
import { knownName } from './supplier';

/** What several looks at one field came to. */
export interface Settled {
  readonly field: TicketField;
  readonly value: string;
  readonly box: Rect;
  readonly confidence: number;
  readonly doubtful: boolean;
}

interface Tally {
  readonly value: string;
  readonly box: Rect;
  /** Looks that read exactly this, with nothing put right on the way. */
  readonly plainVotes: number;
  readonly bestConfidence: number;
  readonly weight: number;
}

/** A look that is this sure of something else is a voice against. */
const HEARD_CONFIDENCE = 0.5;
/** Two looks that agree are still not believed when both were unsure. */
const BELIEVED_CONFIDENCE = 0.8;
const CONFIRMED_CONFIDENCE = 0.6;

/** Letter case is not what looks disagree about. */
function sameValue(a: string, b: string): boolean {
  return a.toUpperCase() === b.toUpperCase();
}

function tally(votes: readonly Candidate[]): Tally[] {
  const tallies: Tally[] = [];
  for (const vote of votes) {
    if (tallies.some((one) => sameValue(one.value, vote.value))) continue;
    const same = votes.filter((other) => sameValue(other.value, vote.value));
    const plain = same.filter((other) => !other.repaired);
    const best = [...same].sort((a, b) => b.confidence - a.confidence)[0] ?? vote;
    tallies.push({
      value: best.value,
      box: best.box,
      plainVotes: plain.length,
      bestConfidence: Math.max(...(plain.length > 0 ? plain : same).map((one) => one.confidence)),
      weight: same.reduce((sum, one) => sum + one.confidence * (one.repaired ? 0.4 : 1), 0),
    });
  }
  return tallies.sort((a, b) => b.weight - a.weight);
}

/** Two looks that agree, plainly and surely: a third would add nothing. */
export function isAgreed(votes: readonly Candidate[]): boolean {
  const [first] = tally(votes);
  const unanimous = votes.every((vote) => first && sameValue(vote.value, first.value));
  const sure = votes.every((vote) => !vote.repaired && vote.confidence >= 0.85);
  return votes.length >= 2 && unanimous && sure;
}

function isContested(votes: readonly Candidate[], value: string): boolean {
  return votes.some(
    (vote) =>
      !sameValue(vote.value, value) && !vote.repaired && vote.confidence >= HEARD_CONFIDENCE,
  );
}

/** Writes names as they are known, so that "HALVORSEN CONCRETE" finds its supplier. */
function inKnownWords(vote: Candidate, context: ReadContext): Candidate {
  if (vote.field !== 'jobName') return vote;
  return { ...vote, value: knownName(vote.value, context.jobs ?? []) ?? vote.value };
}

function verdict(
  field: TicketField,
  winner: Tally,
  votes: readonly Candidate[],
  checks: CheckResult,
): Settled {
  const contested = isContested(votes, winner.value);
  const confirmed = checks.confirmed.has(field) && winner.bestConfidence >= CONFIRMED_CONFIDENCE;
  const agreed = winner.plainVotes >= 2 && winner.bestConfidence >= BELIEVED_CONFIDENCE;
  const sure = !checks.disputed.has(field) && ((agreed && !contested) || confirmed);
  const share = winner.weight / votes.reduce((sum, vote) => sum + vote.confidence, 0.001);
  const belief = Math.min(1, winner.bestConfidence * (0.5 + 0.5 * Math.min(1, share)));
  const confidence = sure ? Math.max(0.9, belief) : Math.min(0.6, belief * 0.7);
  return {
    field,
    value: winner.value,
    box: winner.box,
    confidence: Math.round(confidence * 100) / 100,
    doubtful: !sure,
  };
}

/**
 * Decides each field from the looks' votes. A value is certain only when two looks read it the
 * same and nothing speaks against it, or when arithmetic or the ledger confirms it: a doubt too
 * many costs a glance, a silent error costs money.
 */
export function settle(
  votes: ReadonlyMap<TicketField, readonly Candidate[]>,
  context: ReadContext,
): { fields: Settled[]; checks: CheckResult } {
  const winners = new Map<TicketField, { winner: Tally; votes: readonly Candidate[] }>();
  for (const [field, raw] of votes) {
    const known = raw.map((vote) => inKnownWords(vote, context));
    const [winner] = tally(known);
    if (winner) winners.set(field, { winner, votes: known });
  }
  const values = new Map([...winners].map(([field, { winner }]) => [field, winner.value]));
  const checks = checkFields(values, context);
  const fields = [...winners].map(([field, one]) => verdict(field, one.winner, one.votes, checks));
  return { fields, checks };
}
