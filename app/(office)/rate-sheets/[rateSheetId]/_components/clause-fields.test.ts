import { describe, expect, it } from 'vitest';
import type { Clause } from '@/lib/domain/rating/clauses';
import { clauseSchema } from '@/lib/domain/rating/clauses';
import { CLAUSE_FIELDS, NEW_CLAUSES, valueAt, withValue } from './clause-fields';

const KINDS = Object.keys(NEW_CLAUSES) as Clause['kind'][];

describe('the clause editor', () => {
  it('has a form for every kind of clause, and its figures filled in make the clause', () => {
    expect([...KINDS].sort()).toEqual(
      clauseSchema.options.map((option) => option.shape.kind.value).sort(),
    );
    for (const kind of KINDS) {
      let draft = NEW_CLAUSES[kind];
      for (const field of CLAUSE_FIELDS[kind](draft)) {
        if (field.as === 'number') draft = withValue(draft, field.path, '2.50');
        if (field.as === 'text') draft = withValue(draft, field.path, 'Fuel');
      }
      expect(clauseSchema.safeParse(draft).error?.issues ?? [], kind).toEqual([]);
    }
  });

  it('begins a figure anew when its basis changes', () => {
    const flat = withValue(NEW_CLAUSES.shortLoad, 'charge.dollars', '120');
    const perYard = withValue(flat, 'charge.basis', 'perShortYd3');
    expect(valueAt(perYard, 'charge.dollarsPerYd3')).toBe('');
    expect(valueAt(perYard, 'charge.dollars')).toBeUndefined();
    const perLoad = withValue(NEW_CLAUSES.waiting, 'free.basis', 'perYd3');
    expect(CLAUSE_FIELDS.waiting(perLoad).map((field) => field.path)).toContain(
      'free.minutesPerYd3',
    );
  });
});
