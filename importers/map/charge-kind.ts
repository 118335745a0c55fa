import type { ChargeKind } from '@/lib/domain/facts';
import { knownUnit } from './units';

/** What is known of a line when its kind of charge is told. */
export interface ChargeClues {
  readonly description: string;
  readonly itemCode: string | null;
  readonly unit: string | null;
  readonly quantity: string | null;
  readonly ticketNumber: string | null;
  /** Yards of the mix billed on the same ticket, where the bill has such a line. */
  readonly ticketYards: string | null;
}

export interface ChargeReading {
  readonly kind: ChargeKind;
  /** Why, in a few words: `says "short load"`. */
  readonly reason: string;
  readonly sure: boolean;
}

type RuleKind = ChargeKind | 'feeByUnit';

interface Rule {
  readonly kind: RuleKind;
  readonly words: RegExp;
}

/**
 * Tried in order; the first that is found decides. Charges whose names contain another's words
 * come first: a "short load" of "concrete" is a short load, a "pump mix" is a mix.
 */
const RULES: readonly Rule[] = [
  { kind: 'tax', words: /\b(sales|use|state|county|city|local)[ /&]+tax(es)?\b|\btax(es)?\b/i },
  {
    kind: 'shortLoad',
    words:
      /\b(short|small|under|partial|light|less[- ]than[- ]full)[- ]?loads?\b|\bshort[- ](ld|yards?|yds?)\b|\bminimum (load|haul|delivery)\b|\bmin\.? (load|haul)\b|\bS\/L\b/i,
  },
  {
    kind: 'waiting',
    words:
      /\bwait(ing)?\b|\bstand(ing|[- ]?by)\b|\bdemurrage\b|\bdetention\b|\b(unload(ing)?|excess|extra|site|over) ?time\b|\bdelay\b|(?<!pump )\btruck[- ]?time\b|\btime on (site|job)\b/i,
  },
  {
    kind: 'feeByUnit',
    words: /\b(fuel|enviro\w*|env\.?|surcharge|energy|regulatory|compliance)\b/i,
  },
  { kind: 'mix', words: /\bpump ?mix\b|\b\d{4}[- ]?psi\b|\bpsi\b|\bmpa\b/i },
  {
    kind: 'pumpSetUp',
    words:
      /\bset[- ]?up\b|\bmobili[sz]ation\b|\bpump\b.*\b(travel|trip charge|move)\b|\bshow[- ]?up\b/i,
  },
  { kind: 'other', words: /\bprim(e|er|ing)\b|\bhose\b/i },
  {
    kind: 'pumpMinimum',
    words: /\bpump\w*\b.*\bmin(imum|\.)?(?! ?utes)\b|\bmin(imum|\.)?\b.*\bpump/i,
  },
  { kind: 'pumpMinimum', words: /\b\d+ ?-?(hr|hour)s?\.? min(imum)?\b|\bhour(ly)? minimum\b/i },
  {
    kind: 'pumpYards',
    words:
      /\bpump\w*\b.*\b(yards?|yds?|yardage|cy|per yd)\b|\b(yards?|yds?|yardage) pumped\b|\byardage\b/i,
  },
  {
    kind: 'pumpTime',
    words:
      /\bpump\w*\b.*\b(hours?|hrs?|hourly|time)\b|\b(boom|line)[- ]?pump\b|\b\d{2} ?m(eter)?\b.*\b(boom|pump)\b|\bboom\b|\bpumping\b/i,
  },
  {
    kind: 'feeByUnit',
    words:
      /\b(winter|summer|hot water|chilled|ice|heat(ed|ing)?|wash ?-?out|dispatch|delivery|haul(ing)?|saturday|sunday|holiday|weekend|after hours|plant opening|opening|fee|cleanup|clean-up|zone)\b/i,
  },
  {
    kind: 'mix',
    words:
      /\b(mix|concrete|ready[- ]?mix|grout|flow(able)?[- ]?fill|slurry|\d(\.\d)? ?(sack|sk|bag)|fly ash|air entrained|exterior|interior slab)\b/i,
  },
];

/** Additions are priced by the yard and dosed to the mix, but are no mix. */
const ADDITION =
  /\b(fib(er|re)s?|accelerat\w*|calcium|retard\w*|water reduc\w*|plasticiz\w*|superplast\w*|mid-?range|color|colour|air entrain(er|ing)|admix\w*)\b/i;

/** Characters that tell what is charged; a text that goes on costs no further time. */
const LOOKED_AT = 200;

function quoted(found: RegExpExecArray): string {
  return `says “${found[0].trim().toLowerCase()}”`;
}

function sameNumber(left: string | null, right: string | null): boolean {
  return left !== null && right !== null && Number(left) === Number(right);
}

/** A fee is by the yard where its unit or its quantity says so, else by the load. */
function feeKind(clues: ChargeClues, because: string): ChargeReading {
  const unit = knownUnit(clues.unit);
  if (unit === 'yd') return { kind: 'perYardFee', reason: `${because}, by the yard`, sure: true };
  if (unit === 'load' || unit === 'each') {
    return {
      kind: 'perLoadFee',
      reason: `${because}, ${unit === 'load' ? 'by the load' : 'each'}`,
      sure: true,
    };
  }
  if (/\b(per|\/) ?(yd|yard|cy)\b/i.test(clues.description)) {
    return { kind: 'perYardFee', reason: `${because}, by the yard`, sure: true };
  }
  if (sameNumber(clues.quantity, clues.ticketYards) && !sameNumber(clues.quantity, '1')) {
    return {
      kind: 'perYardFee',
      reason: `${because}, and its quantity is the load's yards`,
      sure: true,
    };
  }
  return { kind: 'perLoadFee', reason: `${because}, by the load`, sure: true };
}

function fromRule(rule: Rule, found: RegExpExecArray, clues: ChargeClues): ChargeReading {
  const because = quoted(found);
  if (rule.kind === 'feeByUnit') return feeKind(clues, because);
  if (rule.kind === 'pumpTime' && knownUnit(clues.unit) === 'yd') {
    return { kind: 'pumpYards', reason: `${because}, by the yard`, sure: true };
  }
  return { kind: rule.kind, reason: because, sure: true };
}

/** Tells what a line charges for, from its words, its item code and its unit. */
export function readChargeKind(clues: ChargeClues): ChargeReading {
  const description = clues.description.slice(0, LOOKED_AT);
  const words = `${description} ${(clues.itemCode ?? '').slice(0, LOOKED_AT)}`.trim();
  const addition = ADDITION.exec(words);
  const strongMix = /\bpsi\b|\bmpa\b|\bmix\b/i.test(words);
  if (addition && !strongMix && !/\btax\b/i.test(words)) {
    const reason = `${quoted(addition)}, an addition to the mix`;
    const byYard = knownUnit(clues.unit) === 'yd';
    return { kind: byYard ? 'perYardFee' : 'other', reason, sure: true };
  }
  for (const rule of RULES) {
    const found = rule.words.exec(words);
    if (found) return fromRule(rule, found, clues);
  }
  const unit = knownUnit(clues.unit);
  if (clues.ticketNumber !== null && clues.quantity !== null && (unit === 'yd' || unit === null)) {
    if (clues.itemCode !== null || /\d/.test(clues.description)) {
      return { kind: 'mix', reason: 'yards with an item code on a ticket', sure: unit === 'yd' };
    }
  }
  return { kind: 'other', reason: 'no word in it is known', sure: false };
}
