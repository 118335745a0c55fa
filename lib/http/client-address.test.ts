import { expect, test } from 'vitest';
import { clientAddress, forgetForwarded } from './client-address';

const from = (forwarded: string | null, trustProxy = false) =>
  clientAddress(
    new Headers(forwarded === null ? {} : { 'x-forwarded-for': forwarded }),
    trustProxy,
  );

test.each([
  ['203.0.113.7', '203.0.113.7'],
  ['::ffff:203.0.113.7', '203.0.113.7'],
  ['2001:db8:1:2:aaaa:bbbb:cccc:dddd', '2001:db8:1:2'],
  ['2001:DB8:1:2::1', '2001:db8:1:2'],
  ['2001:db8::1', '2001:db8:0:0'],
  ['::1', '0:0:0:0'],
])('%s is counted as %s', (forwarded, counted) => {
  expect(from(forwarded)).toBe(counted);
});

test('behind a declared proxy only its own entry counts, the last', () => {
  expect(from('10.1.1.1, 203.0.113.7', true)).toBe('203.0.113.7');
});

test('no address is an address too: what has none shares one count', () => {
  expect(from(null)).toBe('unknown');
});

test('what a client claims about itself is dropped', () => {
  const headers = { 'x-forwarded-for': '1.2.3.4', 'x-forwarded-host': 'evil', host: 'ours' };
  forgetForwarded(headers);
  expect(headers).toEqual({ host: 'ours' });
});
