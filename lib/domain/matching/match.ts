/** Why a billed line and a delivery were put together, from surest to least sure. */
export const MATCH_METHODS = [
  'hand',
  'number',
  'normalizedNumber',
  'score',
  'sum',
  'followsTicket',
  'followsDay',
] as const;
export type MatchMethod = (typeof MATCH_METHODS)[number];

/** A billed line's tie to one delivery. A line that covers a day's loads has several. */
export interface Match {
  readonly billLineId: string;
  readonly delivery: { readonly kind: 'ticket' | 'pumpTicket'; readonly id: string };
  readonly method: MatchMethod;
  /** 0 to 1; 1 is an exact number. */
  readonly confidence: number;
  readonly reason: string;
}

/**
 * A person's own word about a billed line: the delivery it is for, or null for "none of them".
 * The engine keeps it and looks no further for that line.
 */
export interface HandMatch {
  readonly billLineId: string;
  readonly delivery: Match['delivery'] | null;
}

export interface MatchResult {
  readonly matches: readonly Match[];
  readonly unmatchedLineIds: readonly string[];
  readonly unbilledTicketIds: readonly string[];
  readonly unbilledPumpTicketIds: readonly string[];
}
