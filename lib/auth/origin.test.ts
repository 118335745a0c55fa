import { expect, test } from 'vitest';
import { isOwnOrigin } from './origin';

const ask = (headers: Record<string, string>, host = 'strikeoff.example') =>
  isOwnOrigin(new Headers(headers), 'https://strikeoff.example', host);

test.each([
  ['the browser says same-origin', { 'sec-fetch-site': 'same-origin' }, true],
  [
    'it says cross-site, whatever the origin',
    { 'sec-fetch-site': 'cross-site', origin: 'https://strikeoff.example' },
    false,
  ],
  ['it says same-site: another host of the domain', { 'sec-fetch-site': 'same-site' }, false],
  ['it says none: typed into the address bar', { 'sec-fetch-site': 'none' }, false],
  ['an older browser sends our origin', { origin: 'https://strikeoff.example' }, true],
  ['the origin is another’s', { origin: 'https://evil.example' }, false],
  ['the origin only begins like ours', { origin: 'https://strikeoff.example.evil.example' }, false],
  ['a sandboxed page sends null', { origin: 'null' }, false],
  ['nothing is said', {}, false],
])('%s', (_name, headers, allowed) => {
  expect(ask(headers as Record<string, string>)).toBe(allowed);
});

test('a phone on the site’s network reaches the server under another name', () => {
  expect(ask({ origin: 'http://192.168.1.20:3000' }, '192.168.1.20:3000')).toBe(true);
});
