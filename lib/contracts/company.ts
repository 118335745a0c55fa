import { z } from 'zod';
import { VARIANCE_KINDS } from '../domain/variance/finding';
import { timeZone } from './auth';
import { name } from './common';

/** Differences smaller than the larger of the two are struck without asking. */
export const tolerance = z.strictObject({
  /** Dollars, "5.00". */
  absolute: z
    .string()
    .trim()
    .regex(/^\d{1,6}(\.\d{1,2})?$/, 'dollars, such as 5.00'),
  /** Percent of the expected amount, "0.5". */
  percent: z
    .string()
    .trim()
    .regex(/^(100(\.0{1,2})?|\d{1,2}(\.\d{1,2})?)$/, 'a percentage from 0 to 100'),
});
const tolerances = z.partialRecord(z.enum(VARIANCE_KINDS), tolerance);

const settings = {
  name,
  timeZone,
  clock: z.enum(['12', '24']),
  foremenSeePrices: z.boolean(),
  foremenSeeAllJobs: z.boolean(),
  tolerances,
};

export const companySettings = z.object({
  id: z.uuid(),
  ...settings,
  isDemo: z.boolean(),
});
export type CompanySettingsRow = z.infer<typeof companySettings>;

export const getCompanyInput = z.strictObject({});
export const updateCompanyInput = z.strictObject(settings);
