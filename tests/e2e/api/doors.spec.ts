import { expect, test } from '@playwright/test';

const PASSWORD = 'gravel lantern nine';
const json = { 'content-type': 'application/json' };

/** An origin is sent as a browser's page would send it. */
const ours = (baseURL: string | undefined) => ({ ...json, origin: new URL(baseURL ?? '').origin });

test('the health page answers without telling what runs', async ({ request }) => {
  const answer = await request.get('/api/health');
  expect(await answer.json()).toEqual({ status: 'ok' });
  const headers = JSON.stringify(answer.headers()).toLowerCase();
  expect(headers).not.toContain('next.js');
  expect(headers).not.toContain('x-powered-by');
});

test('pages and answers carry the headers that protect them', async ({ request }) => {
  const page = (await request.get('/sign-in')).headers();
  const policy = page['content-security-policy'] ?? '';
  expect(policy).toMatch(/script-src 'self' 'nonce-[\w+/=]+' 'strict-dynamic' 'wasm-unsafe-eval';/);
  expect(policy).toContain("frame-ancestors 'none'");
  const again = (await request.get('/sign-in')).headers()['content-security-policy'];
  expect(again).not.toBe(policy);
  const api = (await request.get('/api/sign-in-hints')).headers();
  expect(api['content-security-policy']).toBe("default-src 'none'; frame-ancestors 'none'");
  expect(api['cache-control']).toBe('no-store');
  for (const headers of [page, api]) {
    expect(headers['x-content-type-options']).toBe('nosniff');
    expect(headers['referrer-policy']).toBe('same-origin');
    expect(headers['permissions-policy']).toContain('camera=(self)');
    expect(headers['cross-origin-resource-policy']).toBe('same-origin');
  }
});

test('a change from another site, or from nowhere, is refused before it is read', async ({
  request,
}) => {
  const data = { email: 'ruth@bluestem.example', password: 'strike the slab' };
  for (const headers of [
    json,
    { ...json, origin: 'https://evil.example' },
    { ...json, origin: 'null' },
    { ...json, 'sec-fetch-site': 'cross-site' },
  ]) {
    const answer = await request.post('/api/sign-in', { data, headers });
    expect(answer.status()).toBe(403);
    expect(answer.headers()['set-cookie']).toBeUndefined();
  }
});

test('what is no JSON object, or too large, is refused with a sentence', async ({
  request,
  baseURL,
}) => {
  const headers = ours(baseURL);
  const send = (data: string | Buffer, more: Record<string, string> = {}) =>
    request.post('/api/sign-in', { data, headers: { ...headers, ...more } });
  expect((await send('[1]')).status()).toBe(422);
  expect((await send('{"email":')).status()).toBe(422);
  expect((await send('a=b', { 'content-type': 'text/plain' })).status()).toBe(415);
  const large = await send(Buffer.from(`{"email":"${'x'.repeat(1_100_000)}"}`));
  expect(large.status()).toBe(413);
  expect((await large.json()).error.message).toContain('1 MB');
});

test('the cookie of a session is out of reach of scripts and of other sites', async ({
  request,
  baseURL,
}) => {
  const answer = await request.post('/api/sign-up', {
    headers: ours(baseURL),
    data: {
      companyName: 'Doors Flatwork',
      timeZone: 'America/Chicago',
      name: 'Dora',
      email: `dora-${Date.now()}-${Math.random()}@doors.example`,
      password: PASSWORD,
    },
  });
  expect(answer.status()).toBe(200);
  const cookie = answer.headers()['set-cookie'] ?? '';
  expect(cookie).toMatch(/; Path=\/; HttpOnly; SameSite=Lax; Max-Age=7776000$/);
  expect((await request.get('/api/account')).status()).toBe(200);
  await request.post('/api/sign-out', { headers: ours(baseURL), data: {} });
  const kept = cookie.split(';')[0] ?? '';
  const stolen = await request.get('/api/account', { headers: { cookie: kept } });
  expect(stolen.status()).toBe(401);
});

test('a key works for scripts without an origin, as a bookkeeper and no more', async ({
  request,
  playwright,
  baseURL,
}) => {
  const headers = ours(baseURL);
  await request.post('/api/sign-in', {
    headers,
    data: { email: 'ruth@bluestem.example', password: 'strike the slab' },
  });
  const issued = await request.post('/api/keys', { headers, data: { name: 'Doors test' } });
  const { key, row } = await issued.json();
  const script = await playwright.request.newContext({
    baseURL: baseURL ?? '',
    extraHTTPHeaders: { authorization: `Bearer ${key}` },
  });
  expect((await script.get('/api/jobs')).status()).toBe(200);
  expect((await script.get('/api/people')).status()).toBe(403);
  expect((await script.get('/api/account')).status()).toBe(403);
  await request.delete(`/api/keys/${row.id}`, { headers });
  expect((await script.get('/api/jobs')).status()).toBe(401);
  await script.dispose();
});

test('an address that a client invents does not get it another count', async ({
  request,
  baseURL,
}) => {
  const email = `nobody-${Math.random()}@doors.example`;
  const statuses: number[] = [];
  for (let i = 0; i < 9; i += 1) {
    const answer = await request.post('/api/sign-in', {
      headers: { ...ours(baseURL), 'x-forwarded-for': `198.51.100.${i}` },
      data: { email, password: `guess number ${i}` },
    });
    statuses.push(answer.status());
  }
  expect(statuses).toEqual([...Array<number>(8).fill(401), 429]);
});

test('the API describes itself', async ({ request }) => {
  const document = await (await request.get('/api/openapi.json')).json();
  expect(document.openapi).toBe('3.1.0');
  expect(document.components.securitySchemes.accessKey).toEqual({ type: 'http', scheme: 'bearer' });
  expect(Object.keys(document.paths)).toContain('/api/jobs/{jobId}');
});
