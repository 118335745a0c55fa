import { describe, expect, it } from 'vitest';
import { updateCompanyInput } from '@/lib/contracts/company';
import { fromForm, settingsForm, toForm } from './settings-schema';

const stored = {
  id: '3f8f6a0e-5d0c-4c7e-9d0a-2f1f0f6f2c11',
  name: 'Bluestem Flatwork',
  timeZone: 'America/Chicago',
  clock: '12' as const,
  foremenSeePrices: false,
  foremenSeeAllJobs: true,
  tolerances: { priceDiffers: { absolute: '5.00', percent: '0.5' } },
  isDemo: false,
};

describe('the settings form', () => {
  it('gives back what it was given', () => {
    const { id, isDemo, ...settings } = stored;
    expect(fromForm(toForm(stored))).toEqual(settings);
  });

  it('takes one empty box for zero and two for no tolerance', () => {
    const values = toForm(stored);
    values.tolerances.taxWrong = { absolute: '1', percent: ' ' };
    values.tolerances.priceDiffers = { absolute: '', percent: '' };
    const sent = fromForm(settingsForm.parse(values));
    expect(sent.tolerances).toEqual({ taxWrong: { absolute: '1', percent: '0' } });
    expect(updateCompanyInput.safeParse(sent).success).toBe(true);
  });

  it('says which box is wrong, in the contract’s own words', () => {
    const values = toForm(stored);
    values.tolerances.taxWrong = { absolute: '-1', percent: '101' };
    const read = settingsForm.safeParse(values);
    expect(read.error?.issues.map(({ path, message }) => [path.join('.'), message])).toEqual([
      ['tolerances.taxWrong.absolute', 'dollars, such as 5.00'],
      ['tolerances.taxWrong.percent', 'a percentage from 0 to 100'],
    ]);
  });
});
