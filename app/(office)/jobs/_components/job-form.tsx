'use client';

import { useRouter } from 'next/navigation';
import { z } from 'zod';
import { ApiForm } from '@/components/forms/api-form';
import { useApiForm } from '@/components/forms/use-api-form';
import { Button } from '@/components/ui/button';
import { CheckField, SelectField, TextField } from '@/components/ui/field';
import type { JobRow } from '@/lib/contracts/jobs';
import { jobFields, jobRow } from '@/lib/contracts/jobs';
import { apiSend } from '@/lib/queries/api';
import { routes } from '@/lib/routes';
import { jobWords as words } from '@/lib/text/messages/en/jobs';

const form = z.object({
  ...jobFields,
  status: z.enum(['open', 'finished']),
  crewIds: z.array(z.string()),
});

interface JobFormProps {
  job: JobRow | null;
  foremen: readonly { id: string; name: string }[];
}

/** A new job, or a change to one. */
export function JobForm({ job, foremen }: JobFormProps) {
  const router = useRouter();
  const state = useApiForm({
    schema: form,
    defaultValues: job
      ? { ...job, crewIds: job.crew.map((one) => one.id) }
      : {
          number: '',
          name: '',
          customer: '',
          address: '',
          taxable: true,
          status: 'open' as const,
          crewIds: [],
        },
    send: ({ number, name, customer, address, taxable, status, crewIds }) => {
      const values = { number, name, customer, address, taxable, crewIds };
      return job
        ? apiSend('PUT', `/api/jobs/${job.id}`, { ...values, status }, jobRow)
        : apiSend('POST', '/api/jobs', values, jobRow);
    },
    onDone: ({ id }) => {
      router.push(routes.job(id));
      router.refresh();
    },
  });
  const { register, errorOf } = state;
  return (
    <ApiForm state={state} className="grid max-w-3xl gap-4 px-4 py-5 md:px-6">
      <div className="grid gap-4 sm:grid-cols-[10rem_1fr]">
        <TextField
          label={words.number}
          autoComplete="off"
          {...register('number')}
          error={errorOf('number')}
        />
        <TextField label={words.name} {...register('name')} error={errorOf('name')} />
      </div>
      <TextField label={words.customer} {...register('customer')} error={errorOf('customer')} />
      <TextField label={words.address} {...register('address')} error={errorOf('address')} />
      {job && (
        <SelectField label={words.status} fieldClassName="max-w-48" {...register('status')}>
          <option value="open">{words.statuses.open}</option>
          <option value="finished">{words.statuses.finished}</option>
        </SelectField>
      )}
      <CheckField label={words.taxable} hint={words.taxableSays} {...register('taxable')} />
      <fieldset>
        <legend className="mb-1 text-[13px] font-semibold text-ink-soft">{words.crew}</legend>
        <p className="text-[13px] text-ink-soft">{words.crewSays}</p>
        <div className="grid sm:grid-cols-2">
          {foremen.map((one) => (
            <CheckField key={one.id} label={one.name} value={one.id} {...register('crewIds')} />
          ))}
        </div>
      </fieldset>
      <Button type="submit" pending={state.pending} className="justify-self-start">
        {words.save}
      </Button>
    </ApiForm>
  );
}
