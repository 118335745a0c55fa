import { z } from 'zod';
import type { CompanySettingsRow } from '@/lib/contracts/company';
import { tolerance, updateCompanyInput } from '@/lib/contracts/company';
import type { VarianceKind } from '@/lib/domain/variance/finding';
import { VARIANCE_KINDS } from '@/lib/domain/variance/finding';

/** A box of the form that may stay empty; else it must be what the contract takes. */
function emptyOr(schema: z.ZodString) {
  return z.string().superRefine((text, context) => {
    if (text.trim() === '') return;
    const read = schema.safeParse(text);
    if (!read.success) context.addIssue(read.error.issues[0]?.message ?? '');
  });
}

/** The settings as the form has them: every kind of variance has two boxes, most of them empty. */
export const settingsForm = updateCompanyInput.extend({
  tolerances: z.record(
    z.enum(VARIANCE_KINDS),
    z.object({
      absolute: emptyOr(tolerance.shape.absolute),
      percent: emptyOr(tolerance.shape.percent),
    }),
  ),
});
type SettingsValues = z.output<typeof settingsForm>;

export function toForm(company: CompanySettingsRow): SettingsValues {
  const tolerances = {} as SettingsValues['tolerances'];
  for (const kind of VARIANCE_KINDS) {
    tolerances[kind] = company.tolerances[kind] ?? { absolute: '', percent: '' };
  }
  const { name, timeZone, clock, foremenSeePrices, foremenSeeAllJobs } = company;
  return { name, timeZone, clock, foremenSeePrices, foremenSeeAllJobs, tolerances };
}

/** Back to the contract: a kind with two empty boxes has no tolerance, one empty box is zero. */
export function fromForm(values: SettingsValues): z.input<typeof updateCompanyInput> {
  const tolerances: Partial<Record<VarianceKind, { absolute: string; percent: string }>> = {};
  for (const kind of VARIANCE_KINDS) {
    const { absolute, percent } = values.tolerances[kind];
    if (absolute.trim() === '' && percent.trim() === '') continue;
    tolerances[kind] = { absolute: absolute.trim() || '0', percent: percent.trim() || '0' };
  }
  return { ...values, tolerances };
}
