'use client';

import { useRouter } from 'next/navigation';
import { ApiForm } from '@/components/forms/api-form';
import { TimeZoneField } from '@/components/forms/time-zone-field';
import { useApiForm } from '@/components/forms/use-api-form';
import { Button } from '@/components/ui/button';
import { CheckField, SelectField, TextField } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Section } from '@/components/ui/section';
import type { CompanySettingsRow } from '@/lib/contracts/company';
import { companySettings } from '@/lib/contracts/company';
import { apiSend } from '@/lib/queries/api';
import { company } from '@/lib/text/messages/en/company';
import { fromForm, settingsForm, toForm } from './settings-schema';
import { ToleranceTable } from './tolerance-table';

const words = company.settings;

export function SettingsForm({ company: stored }: { company: CompanySettingsRow }) {
  const router = useRouter();
  const state = useApiForm({
    schema: settingsForm,
    defaultValues: toForm(stored),
    send: (values) => apiSend('PUT', '/api/company', fromForm(values), companySettings),
    onDone(saved) {
      state.form.reset(toForm(saved));
      router.refresh();
    },
  });
  const { register, errorOf } = state;
  const { isDirty } = state.form.formState;
  return (
    <ApiForm state={state} className="[&>section]:max-w-5xl">
      <Section title={words.company}>
        <div className="grid gap-4 md:grid-cols-[2fr_2fr_1.2fr]">
          <TextField label={words.name} {...register('name')} error={errorOf('name')} />
          <TimeZoneField
            label={words.timeZone}
            hint={words.timeZoneHint}
            current={stored.timeZone}
            {...register('timeZone')}
            error={errorOf('timeZone')}
          />
          <SelectField label={words.clock} {...register('clock')} error={errorOf('clock')}>
            <option value="12">{words.clock12}</option>
            <option value="24">{words.clock24}</option>
          </SelectField>
        </div>
      </Section>
      <Section title={words.foremen}>
        <div className="grid gap-4 md:grid-cols-2">
          <CheckField
            label={words.foremenSeePrices}
            hint={words.foremenSeePricesHint}
            {...register('foremenSeePrices')}
          />
          <CheckField
            label={words.foremenSeeAllJobs}
            hint={words.foremenSeeAllJobsHint}
            {...register('foremenSeeAllJobs')}
          />
        </div>
      </Section>
      <Section title={words.tolerances} says={words.tolerancesSays}>
        <ToleranceTable register={register} errorOf={errorOf} />
      </Section>
      <div
        data-no-print
        className="sticky bottom-0 mt-4 flex flex-wrap items-center gap-4 border-t border-wet bg-band px-4 py-3 md:px-6"
      >
        <Button type="submit" pending={state.pending}>
          {words.save}
        </Button>
        {isDirty && <p className="text-[14px] text-ink-soft">{words.unsaved}</p>}
        {!isDirty && state.doneCount > 0 && <Notice tone="done">{words.saved}</Notice>}
      </div>
    </ApiForm>
  );
}
