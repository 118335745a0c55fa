import { expect, test } from 'vitest';
import { coreNumber, foldedNumber, isMistyped, plainNumber } from './numbers';

test.each([
  ['0044-7182', '447182'],
  ['tkt 447182', 'TKT447182'],
  ['000', '0'],
])('plain %s is %s', (number, plain) => expect(plainNumber(number)).toBe(plain));

test.each([
  ['TKT447182', '447182'],
  ['447182-03', '447182'],
  ['03-447182', '447182'],
  ['A-12', null],
])('the core of %s is %s', (number, core) => expect(coreNumber(number)).toBe(core));

test.each([
  ['44718S', '447185'],
  ['O47182', '47182'],
  ['B47l62', '847162'],
])('%s may be a misread %s', (one, other) => expect(foldedNumber(one)).toBe(foldedNumber(other)));

test('mistyped is two digits swapped or one left out, not a neighbour', () => {
  expect(isMistyped('447128', '447182')).toBe(true);
  expect(isMistyped('44718', '447182')).toBe(true);
  expect(isMistyped('447183', '447182')).toBe(false);
  expect(isMistyped('447182', '447182')).toBe(false);
});
