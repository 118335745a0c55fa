import { expect, test } from 'vitest';
import { clearedSessionCookie, sessionCookie, sessionCookieName } from './cookie';

test('over https the cookie can’t be set by another host or read by a script', () => {
  expect(sessionCookie('abc', 'https://strikeoff.example')).toBe(
    '__Host-strikeoff=abc; Path=/; HttpOnly; SameSite=Lax; Max-Age=7776000; Secure',
  );
});

test('on plain http it has a name that browsers accept there', () => {
  expect(sessionCookie('abc', 'http://localhost:3000')).toBe(
    'strikeoff_session=abc; Path=/; HttpOnly; SameSite=Lax; Max-Age=7776000',
  );
});

test('clearing names the same cookie', () => {
  for (const origin of ['https://strikeoff.example', 'http://localhost:3000']) {
    expect(clearedSessionCookie(origin)).toMatch(
      new RegExp(`^${sessionCookieName(origin)}=; .*Max-Age=0`),
    );
  }
});
