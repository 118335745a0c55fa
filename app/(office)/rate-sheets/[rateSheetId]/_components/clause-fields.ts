import type { Clause } from '@/lib/domain/rating/clauses';
import { TAXABLE_KINDS } from '@/lib/domain/rating/clauses';
import { rateWords } from '@/lib/text/messages/en/suppliers';

const words = rateWords.fields;

/** A clause while it is written: text that may not be right yet. */
export type DraftClause = Readonly<Record<string, unknown>> & { readonly kind: Clause['kind'] };

export interface ClauseField {
  /** Where the value stands in the clause: "charge.dollars". */
  readonly path: string;
  readonly label: string;
  readonly hint?: string;
  readonly as: 'number' | 'text' | 'check' | 'choice' | 'kinds';
  readonly choices?: readonly { readonly value: string; readonly label: string }[];
  /** Empty text means null, not "". */
  readonly nullable?: boolean;
}

const number = (path: string, label: string): ClauseField => ({ path, label, as: 'number' });

/** The fields that each kind of clause is written with. */
export const CLAUSE_FIELDS: Readonly<
  Record<Clause['kind'], (draft: DraftClause) => readonly ClauseField[]>
> = {
  mixPrice: () => [
    {
      path: 'mixCode',
      label: words.mixCode,
      hint: words.mixCodeHint,
      as: 'text',
      nullable: true,
    },
    { path: 'description', label: words.description, as: 'text', nullable: true },
    number('dollarsPerYd3', words.dollarsPerYd3),
  ],
  shortLoad: (draft) => [
    number('thresholdYd3', words.thresholdYd3),
    {
      path: 'charge.basis',
      label: words.basis,
      as: 'choice',
      choices: [
        { value: 'flatPerLoad', label: words.flatPerLoad },
        { value: 'perShortYd3', label: words.perShortYd3 },
      ],
    },
    valueAt(draft, 'charge.basis') === 'perShortYd3'
      ? number('charge.dollarsPerYd3', words.dollarsPerYd3)
      : number('charge.dollars', words.dollars),
    { path: 'balanceLoadExempt', label: words.balanceLoadExempt, as: 'check' },
  ],
  waiting: (draft) => [
    {
      path: 'free.basis',
      label: words.free,
      as: 'choice',
      choices: [
        { value: 'perLoad', label: words.perLoad },
        { value: 'perYd3', label: words.perYd3 },
      ],
    },
    valueAt(draft, 'free.basis') === 'perYd3'
      ? number('free.minutesPerYd3', words.minutes)
      : number('free.minutes', words.minutes),
    number('dollarsPerMinute', words.dollarsPerMinute),
    {
      path: 'until',
      label: words.until,
      as: 'choice',
      choices: [
        { value: 'finished', label: words.finished },
        { value: 'left', label: words.left },
      ],
    },
  ],
  perLoadFee: () => [
    { path: 'name', label: words.name, as: 'text' },
    number('dollars', words.dollars),
  ],
  perYardFee: () => [
    { path: 'name', label: words.name, as: 'text' },
    number('dollarsPerYd3', words.dollarsPerYd3),
  ],
  pumpTime: () => [
    number('dollarsPerHour', words.dollarsPerHour),
    number('minimumHours', words.minimumHours),
    {
      path: 'measured',
      label: words.measured,
      as: 'choice',
      choices: [
        { value: 'onSite', label: words.onSite },
        { value: 'portalToPortal', label: words.portalToPortal },
      ],
    },
    number('incrementHours', words.incrementHours),
  ],
  pumpYards: () => [
    number('dollarsPerYd3', words.dollarsPerYd3),
    number('beyondYd3', words.beyondYd3),
  ],
  pumpSetUp: () => [number('dollarsEach', words.dollarsEach)],
  tax: () => [
    number('ratePercent', words.ratePercent),
    {
      path: 'taxes',
      label: words.taxes,
      as: 'kinds',
      choices: TAXABLE_KINDS.map((kind) => ({
        value: kind,
        label: rateWords.clauseKinds[kind].toLowerCase(),
      })),
    },
  ],
};

/** A new clause of a kind, with what is usual and nothing made up: prices stay empty. */
export const NEW_CLAUSES: Readonly<Record<Clause['kind'], DraftClause>> = {
  mixPrice: { kind: 'mixPrice', mixCode: null, description: null, dollarsPerYd3: '' },
  shortLoad: {
    kind: 'shortLoad',
    thresholdYd3: '',
    charge: { basis: 'flatPerLoad', dollars: '' },
    balanceLoadExempt: false,
  },
  waiting: {
    kind: 'waiting',
    free: { basis: 'perLoad', minutes: '' },
    dollarsPerMinute: '',
    until: 'finished',
  },
  perLoadFee: { kind: 'perLoadFee', name: '', dollars: '' },
  perYardFee: { kind: 'perYardFee', name: '', dollarsPerYd3: '' },
  pumpTime: {
    kind: 'pumpTime',
    dollarsPerHour: '',
    minimumHours: '',
    measured: 'onSite',
    incrementHours: '0.25',
  },
  pumpYards: { kind: 'pumpYards', dollarsPerYd3: '', beyondYd3: '0' },
  pumpSetUp: { kind: 'pumpSetUp', dollarsEach: '' },
  tax: { kind: 'tax', ratePercent: '', taxes: ['mixPrice'] },
};

export function valueAt(draft: DraftClause, path: string): unknown {
  return path
    .split('.')
    .reduce<unknown>(
      (at, key) =>
        typeof at === 'object' && at !== null ? (at as Record<string, unknown>)[key] : undefined,
      draft,
    );
}

/** The clause with a value changed; another basis begins with an empty figure. */
export function withValue(draft: DraftClause, path: string, value: unknown): DraftClause {
  if (path === 'charge.basis') {
    const figure = value === 'perShortYd3' ? { dollarsPerYd3: '' } : { dollars: '' };
    return { ...draft, charge: { basis: value, ...figure } };
  }
  if (path === 'free.basis') {
    const figure = value === 'perYd3' ? { minutesPerYd3: '' } : { minutes: '' };
    return { ...draft, free: { basis: value, ...figure } };
  }
  const [head = '', tail] = path.split('.');
  if (tail === undefined) return { ...draft, [head]: value };
  return { ...draft, [head]: { ...(draft[head] as object), [tail]: value } };
}
