import { expect, test } from 'vitest';
import { tallyShares } from './tally-shares';

const figures = { orderedYd3: '60.00', figuredYd3: '57.10', inYd3: '39.50', toCheckYd3: '10.00' };

test('the bar shows what is in and what is to check, and says what is left', () => {
  expect(tallyShares(figures)).toEqual({
    inPercent: 65.83,
    toCheckPercent: 16.67,
    toGoYd3: '20.50',
    isOver: false,
  });
});

test('more than was ordered fills the bar and is said to be over', () => {
  expect(tallyShares({ ...figures, inYd3: '61.25' })).toEqual({
    inPercent: 100,
    toCheckPercent: 0,
    toGoYd3: '1.25',
    isOver: true,
  });
});

test('without an order the figured yards are the measure and nothing is promised', () => {
  const shares = tallyShares({ ...figures, orderedYd3: null, inYd3: '57.10' });
  expect(shares).toMatchObject({ inPercent: 100, toGoYd3: null, isOver: false });
  expect(tallyShares({ ...figures, orderedYd3: '0.00' }).inPercent).toBe(0);
});
