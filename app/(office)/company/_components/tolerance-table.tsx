'use client';

import type { z } from 'zod';
import type { ApiForm } from '@/components/forms/use-api-form';
import { classNames } from '@/components/ui/class-names';
import { VARIANCE_KINDS } from '@/lib/domain/variance/finding';
import { company } from '@/lib/text/messages/en/company';
import { varianceKinds } from '@/lib/text/messages/en/variance-kinds';
import type { settingsForm } from './settings-schema';

const words = company.settings;
type SettingsState = ApiForm<z.input<typeof settingsForm>, z.output<typeof settingsForm>>;

interface ToleranceTableProps {
  register: SettingsState['register'];
  errorOf: SettingsState['errorOf'];
}

/** Two boxes for each kind of variance, written like a ruled form. */
export function ToleranceTable({ register, errorOf }: ToleranceTableProps) {
  return (
    <fieldset className="gap-x-12 md:columns-2">
      <legend className="sr-only">{words.tolerances}</legend>
      {VARIANCE_KINDS.map((kind) => {
        const problem =
          errorOf(`tolerances.${kind}.absolute`) ?? errorOf(`tolerances.${kind}.percent`);
        const problemId = `tolerance-${kind}-error`;
        const box = (field: 'absolute' | 'percent', label: string) => (
          <input
            {...register(`tolerances.${kind}.${field}`)}
            aria-label={label}
            inputMode="decimal"
            aria-invalid={errorOf(`tolerances.${kind}.${field}`) ? true : undefined}
            aria-describedby={problem ? problemId : undefined}
            className={classNames(
              'min-h-11 w-16 border-b bg-sheet px-1.5 text-right md:min-h-8',
              errorOf(`tolerances.${kind}.${field}`) ? 'border-2 border-keel' : 'border-wet',
            )}
          />
        );
        return (
          <div key={kind} className="break-inside-avoid border-b border-cured py-1.5">
            <div className="flex items-center gap-2">
              <span className="mr-auto text-[14.5px]">{varianceKinds[kind]}</span>
              <span aria-hidden className="text-ink-soft">
                $
              </span>
              {box('absolute', words.dollarsOf(varianceKinds[kind]))}
              {box('percent', words.percentOf(varianceKinds[kind]))}
              <span aria-hidden className="text-ink-soft">
                %
              </span>
            </div>
            {problem && (
              <p
                id={problemId}
                className="mt-1 text-right text-[13px] font-semibold text-keel first-letter:uppercase"
              >
                {problem}
              </p>
            )}
          </div>
        );
      })}
    </fieldset>
  );
}
