'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { SelectField, TextField } from '@/components/ui/field';
import { useLocale } from '@/components/ui/locale';
import { Notice } from '@/components/ui/notice';
import { Section } from '@/components/ui/section';
import type { RateSheetDetail } from '@/lib/contracts/rate-sheets';
import { rateSheetDetail, rateSheetValues } from '@/lib/contracts/rate-sheets';
import { checkClauses } from '@/lib/domain/rating/check-clauses';
import type { Clause } from '@/lib/domain/rating/clauses';
import { clauseSchema } from '@/lib/domain/rating/clauses';
import { ApiFailure, apiSend } from '@/lib/queries/api';
import { rateWords as words } from '@/lib/text/messages/en/suppliers';
import { failureText } from '@/lib/text/problems';
import { ClauseCard } from './clause-card';
import { type DraftClause, NEW_CLAUSES } from './clause-fields';

interface SheetEditorProps {
  sheet: RateSheetDetail;
  /** Whether something is written here that is not saved yet. */
  dirty: boolean;
  onDirty: (dirty: boolean) => void;
  jobs: readonly { id: string; number: string; name: string }[];
}

interface Card {
  readonly key: number;
  readonly draft: DraftClause;
}

const READY_MIX: readonly Clause['kind'][] = [
  'mixPrice',
  'shortLoad',
  'waiting',
  'perLoadFee',
  'perYardFee',
  'tax',
];
const PUMP: readonly Clause['kind'][] = ['pumpTime', 'pumpYards', 'pumpSetUp', 'perLoadFee', 'tax'];

/** What is wrong with the clauses together, by their place; only of those that are complete. */
function problemsOf(cards: readonly Card[]): Map<number, string[]> {
  const complete = cards.flatMap(({ draft }, index) => {
    const parsed = clauseSchema.safeParse(draft);
    return parsed.success ? [{ index, clause: parsed.data }] : [];
  });
  const found = new Map<number, string[]>();
  for (const issue of checkClauses(complete.map((one) => one.clause))) {
    const at = complete[issue.clauseIndex]?.index ?? 0;
    found.set(at, [...(found.get(at) ?? []), issue.sentence]);
  }
  return found;
}

/** The draft of a rate sheet: its days, and its clauses one under the other. */
export function SheetEditor({ sheet, jobs, dirty, onDirty }: SheetEditorProps) {
  const router = useRouter();
  const locale = useLocale();
  const [nextKey, setNextKey] = useState(sheet.lines.length);
  const [cards, setCards] = useState<readonly Card[]>(() =>
    sheet.lines.map(({ clause }, key) => ({ key, draft: clause as DraftClause })),
  );
  const [head, setHead] = useState({
    name: sheet.name,
    jobId: sheet.jobId ?? '',
    effectiveFrom: sheet.effectiveFrom,
    effectiveTo: sheet.effectiveTo ?? '',
  });
  const [strict, setStrict] = useState(false);
  const [pending, setPending] = useState(false);
  const [problem, setProblem] = useState<string | null>(null);
  const [saved, setSaved] = useState(false);
  const kinds = sheet.supplierKind === 'pump' ? PUMP : READY_MIX;
  const values = {
    ...head,
    jobId: head.jobId || null,
    effectiveTo: head.effectiveTo || null,
    clauses: cards.map((card) => card.draft),
  };
  const parsed = rateSheetValues.safeParse(values);
  const headError = (name: string) =>
    strict ? parsed.error?.issues.find((issue) => issue.path[0] === name)?.message : undefined;
  const problems = problemsOf(cards);

  function change(next: readonly Card[]) {
    setCards(next);
    onDirty(true);
    setSaved(false);
  }
  const bind = (name: keyof typeof head) => ({
    value: head[name],
    error: headError(name),
    onChange: (event: { target: { value: string } }) => {
      setHead({ ...head, [name]: event.target.value });
      onDirty(true);
      setSaved(false);
    },
  });
  async function save() {
    setStrict(true);
    setProblem(null);
    if (!parsed.success) return;
    setPending(true);
    try {
      await apiSend('PUT', `/api/rate-sheets/${sheet.id}`, parsed.data, rateSheetDetail);
      onDirty(false);
      setSaved(true);
      router.refresh();
    } catch (error) {
      if (!(error instanceof ApiFailure)) throw error;
      setProblem(failureText(locale, error));
    } finally {
      setPending(false);
    }
  }
  return (
    <>
      <div className="grid max-w-4xl gap-4 px-4 pt-5 sm:grid-cols-4 md:px-6">
        <TextField label={words.name} {...bind('name')} />
        <SelectField label={words.forJob} {...bind('jobId')}>
          <option value="">{words.general}</option>
          {jobs.map((job) => (
            <option key={job.id} value={job.id}>
              {job.number} {job.name}
            </option>
          ))}
        </SelectField>
        <TextField label={words.from} type="date" {...bind('effectiveFrom')} />
        <TextField label={words.to} hint={words.toHint} type="date" {...bind('effectiveTo')} />
      </div>
      <Section title={words.clauses}>
        {cards.length === 0 && <p className="text-ink-soft">{words.noClauses}</p>}
        <ol className="max-w-4xl">
          {cards.map((card, index) => (
            <ClauseCard
              key={card.key}
              draft={card.draft}
              index={index}
              strict={strict}
              problems={problems.get(index) ?? []}
              onChange={(draft) =>
                change(cards.map((one) => (one.key === card.key ? { ...one, draft } : one)))
              }
              onRemove={() => change(cards.filter((one) => one.key !== card.key))}
              onMoveUp={
                index === 0
                  ? null
                  : () => {
                      const next = cards.filter((one) => one.key !== card.key);
                      change([...next.slice(0, index - 1), card, ...next.slice(index - 1)]);
                    }
              }
            />
          ))}
        </ol>
        <div className="flex max-w-4xl flex-wrap items-center gap-2 pt-4">
          <span className="text-[13px] font-semibold text-ink-soft">{words.addClause}:</span>
          {kinds.map((kind) => (
            <Button
              key={kind}
              variant="quiet"
              onClick={() => {
                change([...cards, { key: nextKey, draft: NEW_CLAUSES[kind] }]);
                setNextKey(nextKey + 1);
              }}
            >
              {words.clauseKinds[kind]}
            </Button>
          ))}
        </div>
      </Section>
      <div
        data-no-print
        className="sticky bottom-0 mt-4 flex flex-wrap items-center gap-4 border-t border-wet bg-band px-4 py-3 md:px-6"
      >
        <Button pending={pending} onClick={save}>
          {words.save}
        </Button>
        {problem && <Notice tone="error">{problem}</Notice>}
        {dirty && !problem && <p className="text-[14px] text-ink-soft">{words.unsaved}</p>}
        {saved && !dirty && <Notice tone="done">{words.saved}</Notice>}
      </div>
    </>
  );
}
