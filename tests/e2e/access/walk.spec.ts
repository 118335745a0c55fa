import { randomUUID } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import type { APIRequestContext } from '@playwright/test';
import { expect, test } from '@playwright/test';
import { requestsOf, signedIn } from '../support/sign-in';
import { PAGES, ROUTES, type Who } from './matrix';
import { findSamples, type Samples } from './samples';

const LETTER = { foreman: 'F', bookkeeper: 'B', owner: 'O' } as const;
const ROLES = ['foreman', 'bookkeeper', 'owner'] as const;

/** Files of that name anywhere under app, as their folder's path: "/api/jobs". */
function foldersWith(name: string): string[] {
  return readdirSync('app', { recursive: true, encoding: 'utf8' })
    .filter((file) => path.basename(file) === name)
    .map((file) => `/${path.dirname(file)}`.replace('/.', ''));
}
const bare = (folder: string) => folder.replace(/\/\([^)]+\)/g, '') || '/';

test('the matrix has every page and every route, and no other', () => {
  const pages = foldersWith('page.tsx').map(bare);
  expect(Object.keys(PAGES).sort()).toEqual(pages.sort());
  const routes = foldersWith('route.ts').flatMap((folder) => {
    const methods = readFileSync(`app${folder}/route.ts`, 'utf8').matchAll(
      /export (?:const|(?:async )?function) (GET|POST|PUT|PATCH|DELETE)\b/g,
    );
    return [...methods].map((found) => `${found[1]} ${folder}`);
  });
  expect(Object.keys(ROUTES).sort()).toEqual(routes.sort());
});

function filled(pattern: string, samples: Samples): string {
  return pattern.replace(/\[(\w+)\]/g, (_, name: string) => {
    const sample = samples[name];
    if (!sample) throw new Error(`no sample for ${name} in ${pattern}`);
    return sample;
  });
}
/** The same address with records that don't exist, so that a change changes nothing. */
const emptied = (pattern: string) => pattern.replace(/\[\w+\]/g, () => randomUUID());
const namesRecord = (pattern: string) => /\[(?!token\]|name\])/.test(pattern);

let samples: Samples;
const asked: Record<string, APIRequestContext> = {};

test.beforeAll(async ({ baseURL }) => {
  for (const role of ROLES) asked[role] = await signedIn(baseURL, role);
  asked.nobody = await requestsOf(baseURL);
  asked.stranger = await requestsOf(baseURL);
  const signUp = await asked.stranger.post('/api/sign-up', {
    data: {
      companyName: 'Another Flatwork',
      timeZone: 'America/Denver',
      name: 'Other Owner',
      email: `stranger-${randomUUID()}@other.example`,
      password: 'gravel lantern nine',
    },
  });
  expect(signUp.status(), await signUp.text()).toBe(200);
  samples = await findSamples(of('owner'), of('foreman'));
});
test.afterAll(async () => {
  for (const context of Object.values(asked)) await context.dispose();
});

const of = (who: string) => asked[who] as APIRequestContext;
const may = (who: Who, role: (typeof ROLES)[number]) =>
  who === 'public' || who.includes(LETTER[role]);

async function statusOf(
  requests: APIRequestContext,
  method: string,
  address: string,
  more: object = {},
): Promise<number> {
  const answer = await requests.fetch(address, { method, maxRedirects: 0, ...more });
  return answer.status();
}

/** What a page says that is not for whoever asked; a page that has begun to stream says 200. */
async function pageAnswer(requests: APIRequestContext, address: string): Promise<string> {
  const answer = await requests.get(address, { maxRedirects: 0 });
  const text = await answer.text();
  const status = answer.status();
  if (status === 307 || text.includes('NEXT_REDIRECT;replace;/sign-in')) return 'sign in';
  if (status === 403 || text.includes('NEXT_HTTP_ERROR_FALLBACK;403')) return 'refused';
  if (status === 404 || text.includes('NEXT_HTTP_ERROR_FALLBACK;404')) return 'not found';
  return status === 200 ? 'shown' : String(status);
}

for (const [pattern, who] of Object.entries(PAGES)) {
  test(`page ${pattern} is for ${who}`, async () => {
    const address = filled(pattern, samples);
    const seen: Record<string, string> = {};
    const wanted: Record<string, string> = {};
    for (const role of ROLES) {
      seen[role] = await pageAnswer(of(role), address);
      wanted[role] = may(who, role) ? 'shown' : 'refused';
    }
    seen.nobody = await pageAnswer(of('nobody'), address);
    wanted.nobody = who === 'public' ? 'shown' : 'sign in';
    seen.stranger = await pageAnswer(of('stranger'), address);
    wanted.stranger = namesRecord(pattern) ? 'not found' : 'shown';
    if (who === 'public') {
      // Someone who is signed in already may be sent on from a door.
      for (const name of [...ROLES, 'stranger']) delete seen[name];
      for (const name of [...ROLES, 'stranger']) delete wanted[name];
    }
    expect(seen).toEqual(wanted);
  });
}

for (const [line, who] of Object.entries(ROUTES)) {
  const [method = '', pattern = ''] = line.split(' ');
  test(`route ${line} is for ${who}`, async () => {
    const address = filled(pattern, samples);
    if (who === 'public') {
      const status = await statusOf(of('nobody'), method, address, body(method));
      expect([200, 404, 409, 422]).toContain(status);
      return;
    }
    const refused = ROLES.filter((role) => !may(who, role));
    const allowed = ROLES.filter((role) => may(who, role));
    expect(await statusOf(of('nobody'), method, address, body(method))).toBe(401);
    for (const role of refused) {
      expect(await statusOf(of(role), method, address, body(method)), role).toBe(403);
    }
    for (const role of allowed) {
      const status =
        method === 'GET'
          ? await statusOf(of(role), method, inReach(address, role))
          : await statusOf(of(role), method, emptied(pattern), body(method));
      expect(method === 'GET' ? [200] : [404, 422, 415], `${role} ${status}`).toContain(status);
    }
    const stranger = await statusOf(of('stranger'), method, address, body(method));
    const none = namesRecord(pattern) || pattern.includes('[name]');
    // A change with a body that is not right is refused before the record is looked for.
    expect(none ? [404, 422, 415] : [200, 422, 415, 404]).toContain(stranger);
    if (none && method === 'GET') expect(stranger).toBe(404);
  });
}

/** A body that no verb takes, so that an allowed change is let in and changes nothing. */
function body(method: string) {
  return method === 'GET' ? {} : { data: { nothingOfThisName: true } };
}

/** The foreman's own: the suppliers' bills are not among the files that he may try. */
function inReach(address: string, role: string): string {
  return role === 'foreman' && address.startsWith('/api/demo/files/')
    ? '/api/demo/files/558901.jpg'
    : address;
}
