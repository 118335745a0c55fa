'use client';

import { Button } from '@/components/ui/button';
import { CheckField, SelectField, TextField } from '@/components/ui/field';
import { clauseSchema } from '@/lib/domain/rating/clauses';
import { describeClause } from '@/lib/domain/rating/clauses-by-kind/registry';
import { rateWords as words } from '@/lib/text/messages/en/suppliers';
import {
  CLAUSE_FIELDS,
  type ClauseField,
  type DraftClause,
  valueAt,
  withValue,
} from './clause-fields';

interface ClauseCardProps {
  draft: DraftClause;
  index: number;
  /** Whether what is missing is said yet: not while a new clause is first written. */
  strict: boolean;
  problems: readonly string[];
  onChange: (draft: DraftClause) => void;
  onRemove: () => void;
  onMoveUp: (() => void) | null;
}

/** One clause: its fields, and how it will read. */
export function ClauseCard(props: ClauseCardProps) {
  const { draft, index, strict, problems, onChange, onRemove, onMoveUp } = props;
  const parsed = clauseSchema.safeParse(draft);
  const errorOf = (path: string) =>
    strict
      ? parsed.error?.issues.find((issue) => issue.path.join('.') === path)?.message
      : undefined;
  return (
    <li className="border-b border-cured py-4 last:border-0">
      <fieldset>
        <legend className="flex w-full items-baseline gap-3">
          <span className="sr-only">{words.editClause(index)}: </span>
          <span className="font-head font-semibold">{words.clauseKinds[draft.kind]}</span>
        </legend>
        <div className="mt-2 grid grid-cols-2 gap-3 sm:grid-cols-4">
          {CLAUSE_FIELDS[draft.kind](draft).map((field) => (
            <Field
              key={field.path}
              field={field}
              value={valueAt(draft, field.path)}
              error={errorOf(field.path)}
              onValue={(value) => onChange(withValue(draft, field.path, value))}
            />
          ))}
        </div>
        <div className="mt-2 flex flex-wrap items-center gap-3 text-[14px]">
          {parsed.success && (
            <p className="min-w-0 flex-1">
              <span className="text-ink-soft">{words.reads}</span> {describeClause(parsed.data)}
            </p>
          )}
          <span className="ml-auto flex gap-2">
            {onMoveUp && (
              <Button variant="quiet" aria-label={words.moveUp(index)} onClick={onMoveUp}>
                ↑
              </Button>
            )}
            <Button variant="quiet" aria-label={words.removeClause(index)} onClick={onRemove}>
              ×
            </Button>
          </span>
        </div>
        {problems.map((problem) => (
          <p key={problem} className="mt-1 text-[13.5px] font-semibold text-keel">
            {problem}
          </p>
        ))}
      </fieldset>
    </li>
  );
}

interface FieldProps {
  field: ClauseField;
  value: unknown;
  error: string | undefined;
  onValue: (value: unknown) => void;
}

function Field({ field, value, error, onValue }: FieldProps) {
  const { label, hint, as, choices = [] } = field;
  if (as === 'check') {
    return (
      <CheckField
        label={label}
        checked={value === true}
        fieldClassName="col-span-2 self-end"
        onChange={(event) => onValue(event.target.checked)}
      />
    );
  }
  if (as === 'choice') {
    return (
      <SelectField
        label={label}
        value={String(value)}
        error={error}
        onChange={(event) => onValue(event.target.value)}
      >
        {choices.map((choice) => (
          <option key={choice.value} value={choice.value}>
            {choice.label}
          </option>
        ))}
      </SelectField>
    );
  }
  if (as === 'kinds') {
    const chosen = Array.isArray(value) ? (value as string[]) : [];
    return (
      <fieldset className="col-span-full">
        <legend className="text-[13px] font-semibold text-ink-soft">{label}</legend>
        <div className="grid grid-cols-2 gap-x-4 sm:grid-cols-4">
          {choices.map((choice) => (
            <CheckField
              key={choice.value}
              label={choice.label}
              checked={chosen.includes(choice.value)}
              onChange={(event) =>
                onValue(
                  event.target.checked
                    ? [...chosen, choice.value]
                    : chosen.filter((one) => one !== choice.value),
                )
              }
            />
          ))}
        </div>
      </fieldset>
    );
  }
  return (
    <TextField
      label={label}
      hint={hint}
      value={value === null || value === undefined ? '' : String(value)}
      error={error}
      autoComplete="off"
      {...(as === 'number' ? { inputMode: 'decimal' as const } : {})}
      onChange={(event) => {
        const text = event.target.value;
        onValue(field.nullable && text.trim() === '' ? null : text);
      }}
    />
  );
}
