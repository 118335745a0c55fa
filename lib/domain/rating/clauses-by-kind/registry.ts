import type { ChargeKind, PumpTicketFacts } from '../../facts';
import type { Clause, ClauseKind } from '../clauses';
import { perLoadFeeRule, perYardFeeRule } from './fees';
import { mixPriceRule } from './mix-price';
import { pumpSetUpRule, pumpTimeRule, pumpYardsRule } from './pump';
import type { ClauseOf, LoadFacts, LoadRule, PumpRule, Rated } from './rule';
import { shortLoadRule } from './short-load';
import { taxRule } from './tax';
import { waitingRule } from './waiting';

/** Every kind of clause, by what it is rated on. A new kind is one module and one line here. */

const LOAD_KINDS = [
  'mixPrice',
  'shortLoad',
  'waiting',
  'perLoadFee',
  'perYardFee',
] as const satisfies readonly ClauseKind[];
export type LoadKind = (typeof LOAD_KINDS)[number];

export const PUMP_KINDS = [
  'pumpTime',
  'pumpYards',
  'pumpSetUp',
] as const satisfies readonly ClauseKind[];
export type PumpKind = (typeof PUMP_KINDS)[number];

const LOAD_RULES: { readonly [K in LoadKind]: LoadRule<K> } = {
  mixPrice: mixPriceRule,
  shortLoad: shortLoadRule,
  waiting: waitingRule,
  perLoadFee: perLoadFeeRule,
  perYardFee: perYardFeeRule,
};

const PUMP_RULES: { readonly [K in PumpKind]: PumpRule<K> } = {
  pumpTime: pumpTimeRule,
  pumpYards: pumpYardsRule,
  pumpSetUp: pumpSetUpRule,
};

type Describers = { readonly [K in ClauseKind]: { describe(clause: ClauseOf<K>): string } };
const DESCRIBERS: Describers = { ...LOAD_RULES, ...PUMP_RULES, tax: taxRule };

export const CHARGE_KIND_OF: Readonly<Record<ClauseKind, ChargeKind>> = {
  mixPrice: 'mix',
  shortLoad: 'shortLoad',
  waiting: 'waiting',
  perLoadFee: 'perLoadFee',
  perYardFee: 'perYardFee',
  pumpTime: 'pumpTime',
  pumpYards: 'pumpYards',
  pumpSetUp: 'pumpSetUp',
  tax: 'tax',
};

function describeAs<K extends ClauseKind>(kind: K, clause: ClauseOf<K>): string {
  return DESCRIBERS[kind].describe(clause);
}

/** A clause in plain words, one sentence. */
export function describeClause(clause: Clause): string {
  return describeAs(clause.kind, clause);
}

export function isLoadClause(clause: Clause): clause is ClauseOf<LoadKind> {
  return clause.kind in LOAD_RULES;
}

export function isPumpClause(clause: Clause): clause is ClauseOf<PumpKind> {
  return clause.kind in PUMP_RULES;
}

function rateLoadAs<K extends LoadKind>(kind: K, clause: ClauseOf<K>, load: LoadFacts): Rated {
  return LOAD_RULES[kind].rate(clause, load);
}

export function rateLoad(clause: ClauseOf<LoadKind>, load: LoadFacts): Rated {
  return rateLoadAs(clause.kind, clause, load);
}

function ratePumpAs<K extends PumpKind>(
  kind: K,
  clause: ClauseOf<K>,
  ticket: PumpTicketFacts,
): Rated {
  return PUMP_RULES[kind].rate(clause, ticket);
}

export function ratePump(clause: ClauseOf<PumpKind>, ticket: PumpTicketFacts): Rated {
  return ratePumpAs(clause.kind, clause, ticket);
}
