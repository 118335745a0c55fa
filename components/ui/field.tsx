'use client';

import type { ComponentProps, ReactNode } from 'react';
import { useId } from 'react';
import { classNames } from './class-names';

interface FieldWords {
  label: ReactNode;
  hint?: ReactNode;
  /** What is wrong with the value, in a sentence; read out with the field. */
  error?: string | undefined;
  /** Class names of the whole field, for its place in a form's columns. */
  fieldClassName?: string;
}

const BOX =
  'block w-full rounded-[2px] border bg-sheet px-2.5 py-1.5 text-base text-ink placeholder:text-ink-soft min-h-11 md:min-h-9 md:text-[15px] disabled:bg-band disabled:text-ink-soft [&[readonly]]:bg-band';

function boxClass(error: string | undefined, className: string | undefined): string {
  return classNames(BOX, error ? 'border-2 border-keel' : 'border-wet', className);
}

function useFieldIds(id: string | undefined, hint: ReactNode, error: string | undefined) {
  const own = useId();
  const fieldId = id ?? own;
  const hintId = `${fieldId}-hint`;
  const errorId = `${fieldId}-error`;
  const describedBy = classNames(error && errorId, Boolean(hint) && hintId) || undefined;
  return { fieldId, hintId, errorId, describedBy };
}

function Hint({ id, children }: { id: string; children: ReactNode }) {
  return (
    <p id={id} className="mt-1 text-[13px] text-ink-soft">
      {children}
    </p>
  );
}

function FieldError({ id, children }: { id: string; children: ReactNode }) {
  return (
    <p id={id} className="mt-1 text-[13px] font-semibold text-keel first-letter:uppercase">
      {children}
    </p>
  );
}

type Ids = ReturnType<typeof useFieldIds>;

function Frame({ words, ids, children }: { words: FieldWords; ids: Ids; children: ReactNode }) {
  return (
    <div className={words.fieldClassName}>
      <label htmlFor={ids.fieldId} className="mb-1 block text-[13px] font-semibold text-ink-soft">
        {words.label}
      </label>
      {children}
      {words.error && <FieldError id={ids.errorId}>{words.error}</FieldError>}
      {words.hint && <Hint id={ids.hintId}>{words.hint}</Hint>}
    </div>
  );
}

function split<Props extends FieldWords>(props: Props) {
  const { label, hint, error, fieldClassName, ...native } = props;
  const words: FieldWords = { label, hint, error, ...(fieldClassName ? { fieldClassName } : {}) };
  return { words, native };
}

/** One line of text, a number, a date or a time, under its label. Takes what `register()` gives. */
export function TextField(props: ComponentProps<'input'> & FieldWords) {
  const { words, native } = split(props);
  const ids = useFieldIds(native.id, words.hint, words.error);
  return (
    <Frame words={words} ids={ids}>
      <input
        type="text"
        {...native}
        id={ids.fieldId}
        aria-invalid={words.error ? true : undefined}
        aria-describedby={ids.describedBy}
        className={boxClass(words.error, native.className)}
      />
    </Frame>
  );
}

export function TextAreaField(props: ComponentProps<'textarea'> & FieldWords) {
  const { words, native } = split(props);
  const ids = useFieldIds(native.id, words.hint, words.error);
  return (
    <Frame words={words} ids={ids}>
      <textarea
        rows={4}
        {...native}
        id={ids.fieldId}
        aria-invalid={words.error ? true : undefined}
        aria-describedby={ids.describedBy}
        className={boxClass(words.error, native.className)}
      />
    </Frame>
  );
}

/** A native choice; its options are the children. */
export function SelectField(props: ComponentProps<'select'> & FieldWords) {
  const { words, native } = split(props);
  const ids = useFieldIds(native.id, words.hint, words.error);
  return (
    <Frame words={words} ids={ids}>
      <select
        {...native}
        id={ids.fieldId}
        aria-invalid={words.error ? true : undefined}
        aria-describedby={ids.describedBy}
        className={boxClass(words.error, native.className)}
      />
    </Frame>
  );
}

/** A box to tick, its label beside it; the whole row can be pressed. */
export function CheckField(props: ComponentProps<'input'> & FieldWords) {
  const { words, native } = split(props);
  const ids = useFieldIds(native.id, words.hint, words.error);
  return (
    <div className={words.fieldClassName}>
      <label htmlFor={ids.fieldId} className="flex min-h-11 items-center gap-2.5 md:min-h-8">
        <input
          {...native}
          type="checkbox"
          id={ids.fieldId}
          aria-invalid={words.error ? true : undefined}
          aria-describedby={ids.describedBy}
          className={classNames('size-5 shrink-0 accent-carbon', native.className)}
        />
        <span>{words.label}</span>
      </label>
      {words.error && <FieldError id={ids.errorId}>{words.error}</FieldError>}
      {words.hint && <Hint id={ids.hintId}>{words.hint}</Hint>}
    </div>
  );
}
