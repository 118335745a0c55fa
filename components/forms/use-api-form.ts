'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import type { DefaultValues, FieldValues, Path, UseFormReturn } from 'react-hook-form';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import { ApiFailure } from '@/lib/queries/api';
import { failureText, issueText } from '@/lib/text/problems';
import { useLocale } from '../ui/locale';

type FormSchema = z.ZodType<FieldValues, FieldValues>;

interface ApiFormOptions<Schema extends FormSchema, Answer> {
  /** The verb's own input schema, or the part of it that the form asks for. */
  readonly schema: Schema;
  readonly defaultValues: DefaultValues<z.input<Schema>>;
  /** Makes the API call with the parsed values. */
  readonly send: (values: z.output<Schema>) => Promise<Answer>;
  readonly onDone?: (answer: Answer, values: z.output<Schema>) => void | Promise<void>;
}

export interface ApiForm<Input extends FieldValues, Output> {
  readonly form: UseFormReturn<Input, unknown, Output>;
  readonly register: UseFormReturn<Input, unknown, Output>['register'];
  /** What is wrong with a field ("name", "lines.0.quantity"), from our schema or the server. */
  readonly errorOf: (path: Path<Input>) => string | undefined;
  /** Why the last attempt failed as a whole; null when it did not. */
  readonly problem: string | null;
  /** How many attempts have succeeded since the form was opened. */
  readonly doneCount: number;
  readonly pending: boolean;
  readonly submit: (event?: React.BaseSyntheticEvent) => Promise<void>;
}

/** "lines.0.quantity" in a form's nested errors. */
function errorAt(errors: unknown, path: string): string | undefined {
  let at: unknown = errors;
  for (const key of path.split('.')) {
    if (typeof at !== 'object' || at === null) return undefined;
    at = (at as Record<string, unknown>)[key];
  }
  if (typeof at !== 'object' || at === null) return undefined;
  const { message, root } = at as { message?: unknown; root?: { message?: unknown } };
  if (typeof message === 'string') return message;
  return typeof root?.message === 'string' ? root.message : undefined;
}

/**
 * A form checked by the verb's schema and sent to the API. What the server says about a field
 * lands on that field; anything else becomes `problem`. Bugs are not swallowed: they are thrown
 * on to the page's error boundary by React.
 */
export function useApiForm<Schema extends FormSchema, Answer>(
  options: ApiFormOptions<Schema, Answer>,
): ApiForm<z.input<Schema>, z.output<Schema>> {
  const locale = useLocale();
  const [problem, setProblem] = useState<string | null>(null);
  const [doneCount, setDoneCount] = useState(0);
  const form = useForm<z.input<Schema>, unknown, z.output<Schema>>({
    resolver: zodResolver(options.schema),
    defaultValues: options.defaultValues,
  });

  async function attempt(values: z.output<Schema>): Promise<void> {
    setProblem(null);
    let answer: Answer;
    try {
      answer = await options.send(values);
    } catch (error) {
      if (!(error instanceof ApiFailure)) throw error;
      const known = new Set(Object.keys(form.getValues()));
      const foreign: string[] = [];
      for (const issue of error.issues) {
        if (known.has(issue.path.split('.')[0] ?? '')) {
          form.setError(issue.path as Path<z.input<Schema>>, { message: issue.message });
        } else {
          foreign.push(issue.path ? `${issue.path}: ${issue.message}` : issue.message);
        }
      }
      setProblem([failureText(locale, error), ...foreign].join(' '));
      return;
    }
    setDoneCount((count) => count + 1);
    await options.onDone?.(answer, values);
  }

  return {
    form,
    register: form.register,
    errorOf: (path) => {
      const message = errorAt(form.formState.errors, path);
      return message === undefined ? undefined : issueText(locale, message);
    },
    problem,
    doneCount,
    pending: form.formState.isSubmitting,
    submit: form.handleSubmit(attempt),
  };
}
