'use client';

import { useRouter } from 'next/navigation';
import { z } from 'zod';
import { ApiForm } from '@/components/forms/api-form';
import { typedForm } from '@/components/forms/typed-form';
import { useApiForm } from '@/components/forms/use-api-form';
import { Button } from '@/components/ui/button';
import { CheckField, SelectField, TextField } from '@/components/ui/field';
import { createRateSheetInput, rateSheetDetail } from '@/lib/contracts/rate-sheets';
import { apiSend } from '@/lib/queries/api';
import { routes } from '@/lib/routes';
import { rateWords as words } from '@/lib/text/messages/en/suppliers';

const form = typedForm(
  z.object({
    name: z.string(),
    jobId: z.string(),
    effectiveFrom: z.string(),
    copyLatest: z.boolean(),
  }),
  createRateSheetInput.omit({ supplierId: true }),
  (typed) => ({ ...typed, jobId: typed.jobId || null }),
);

interface NewSheetFormProps {
  supplierId: string;
  jobs: readonly { id: string; number: string; name: string }[];
}

/** A sheet's name, its first day and whom it is for; its clauses come next. */
export function NewSheetForm({ supplierId, jobs }: NewSheetFormProps) {
  const router = useRouter();
  const state = useApiForm({
    schema: form,
    defaultValues: { name: '', jobId: '', effectiveFrom: '', copyLatest: true },
    send: (values) =>
      apiSend('POST', `/api/suppliers/${supplierId}/rate-sheets`, values, rateSheetDetail),
    onDone: ({ id }) => router.push(routes.rateSheet(id)),
  });
  const { register, errorOf } = state;
  return (
    <ApiForm state={state} className="grid max-w-2xl gap-4 px-4 py-5 md:px-6">
      <TextField
        label={words.name}
        hint={words.nameHint}
        {...register('name')}
        error={errorOf('name')}
      />
      <div className="grid gap-4 sm:grid-cols-2">
        <TextField
          label={words.from}
          type="date"
          {...register('effectiveFrom')}
          error={errorOf('effectiveFrom')}
        />
        <SelectField label={words.forJob} {...register('jobId')} error={errorOf('jobId')}>
          <option value="">{words.general}</option>
          {jobs.map((job) => (
            <option key={job.id} value={job.id}>
              {job.number} {job.name}
            </option>
          ))}
        </SelectField>
      </div>
      <CheckField label={words.copy} {...register('copyLatest')} />
      <Button type="submit" pending={state.pending} className="justify-self-start">
        {words.create}
      </Button>
    </ApiForm>
  );
}
