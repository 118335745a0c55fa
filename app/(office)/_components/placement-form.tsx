'use client';

import { useRouter } from 'next/navigation';
import { z } from 'zod';
import { ApiForm } from '@/components/forms/api-form';
import { decimalOrNull, minutesOf, timeText, typedForm } from '@/components/forms/typed-form';
import { useApiForm } from '@/components/forms/use-api-form';
import { Button } from '@/components/ui/button';
import { SelectField, TextAreaField, TextField } from '@/components/ui/field';
import type { PlacementRow } from '@/lib/contracts/placements';
import { PLACEMENT_STATUSES, placementFields, placementRow } from '@/lib/contracts/placements';
import { ELEMENTS } from '@/lib/domain/elements';
import { apiSend } from '@/lib/queries/api';
import { routes } from '@/lib/routes';
import { placementWords as words } from '@/lib/text/messages/en/jobs';
import { slabYards, withWaste } from './slab-yards';

const fields = z.object({
  name: z.string(),
  element: z.string(),
  subgrade: z.string(),
  pourDate: z.string(),
  firstTruckAt: z.string(),
  figuredYd3: z.string(),
  areaFt2: z.string(),
  thicknessIn: z.string(),
  wastePercent: z.string(),
  notes: z.string(),
  status: z.string(),
});
const target = z.strictObject({ ...placementFields, status: z.enum(PLACEMENT_STATUSES) });
const placementForm = typedForm(fields, target, (form) => ({
  ...form,
  firstTruckAt: minutesOf(form.firstTruckAt),
  figuredYd3: decimalOrNull(form.figuredYd3) ?? '',
  areaFt2: decimalOrNull(form.areaFt2),
  thicknessIn: decimalOrNull(form.thicknessIn),
  wastePercent: decimalOrNull(form.wastePercent) ?? '0',
}));

function startOf(placement: PlacementRow | null): z.infer<typeof fields> {
  return {
    name: placement?.name ?? '',
    element: placement?.element ?? 'slab',
    subgrade: placement?.subgrade ?? '',
    pourDate: placement?.pourDate ?? '',
    firstTruckAt: timeText(placement?.firstTruckAt ?? null),
    figuredYd3: placement?.figuredYd3 ?? '',
    areaFt2: placement?.areaFt2 ?? '',
    thicknessIn: placement?.thicknessIn ?? '',
    wastePercent: placement?.wastePercent ?? '5',
    notes: placement?.notes ?? '',
    status: placement?.status ?? 'planned',
  };
}

interface PlacementFormProps {
  jobId: string;
  placement: PlacementRow | null;
}

/** One pour: what, where, when, and its yards. */
export function PlacementForm({ jobId, placement }: PlacementFormProps) {
  const router = useRouter();
  const state = useApiForm({
    schema: placementForm,
    defaultValues: startOf(placement),
    send: ({ status, ...values }) =>
      placement
        ? apiSend('PUT', `/api/placements/${placement.id}`, { ...values, status }, placementRow)
        : apiSend('POST', `/api/jobs/${jobId}/placements`, values, placementRow),
    onDone: ({ id }) => {
      router.push(routes.placement(id));
      router.refresh();
    },
  });
  const { form } = state;
  const field = (name: keyof z.infer<typeof fields>) => ({
    ...state.register(name),
    error: state.errorOf(name),
  });
  const figured = slabYards(form.watch('areaFt2'), form.watch('thicknessIn'));
  const toOrder = withWaste(form.watch('figuredYd3'), form.watch('wastePercent'));
  return (
    <ApiForm state={state} className="grid max-w-3xl gap-4 px-4 py-5 md:px-6">
      <div className="grid gap-4 sm:grid-cols-[1fr_12rem]">
        <TextField label={words.name} hint={words.nameHint} {...field('name')} />
        <SelectField label={words.element} {...field('element')}>
          {ELEMENTS.map((one) => (
            <option key={one} value={one}>
              {words.elements[one]}
            </option>
          ))}
        </SelectField>
      </div>
      <div className="grid gap-4 sm:grid-cols-3">
        <TextField label={words.pourDate} type="date" {...field('pourDate')} />
        <TextField label={words.firstTruckAt} type="time" {...field('firstTruckAt')} />
        <TextField label={words.subgrade} hint={words.subgradeHint} {...field('subgrade')} />
        <TextField label={words.area} inputMode="decimal" {...field('areaFt2')} />
        <TextField label={words.thickness} inputMode="decimal" {...field('thicknessIn')} />
        <div className="self-end">
          {figured && (
            <Button
              variant="quiet"
              onClick={() => form.setValue('figuredYd3', figured, { shouldDirty: true })}
            >
              {words.figureIt(figured)}
            </Button>
          )}
        </div>
        <TextField
          label={words.figured}
          hint={words.figuredHint}
          inputMode="decimal"
          {...field('figuredYd3')}
        />
        <TextField label={words.waste} inputMode="decimal" {...field('wastePercent')} />
        {toOrder && (
          <p className="self-center text-[14px] text-ink-soft">{words.toOrder(toOrder)}</p>
        )}
      </div>
      {placement && (
        <SelectField label={words.status} fieldClassName="max-w-48" {...field('status')}>
          {PLACEMENT_STATUSES.map((one) => (
            <option key={one} value={one}>
              {words.statuses[one]}
            </option>
          ))}
        </SelectField>
      )}
      <TextAreaField label={words.notes} rows={3} {...field('notes')} />
      <Button type="submit" pending={state.pending} className="justify-self-start">
        {words.save}
      </Button>
    </ApiForm>
  );
}
