import { randomUUID } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { z } from 'zod';
import type { Store } from '../../db/client';
import type { Actor } from '../../lib/auth/actor';
import type { Role } from '../../lib/auth/policy';
import { POLICY, roleMay } from '../../lib/auth/policy';
import { describeApi } from '../../lib/http/openapi';
import { PUBLIC_ADDRESSES, PUBLIC_REGISTRY } from '../../lib/services/public-registry';
import { callPublicVerb } from '../../lib/services/public-verb';
import { REGISTRY } from '../../lib/services/registry';
import { callVerb } from '../../lib/services/verb';
import { type TestCompany, testCompany } from '../support/company';
import { testStore } from '../support/store';

const ROOT = path.resolve(import.meta.dirname, '../..');
const ROLES: readonly Role[] = ['owner', 'bookkeeper', 'foreman'];
const ALL = [...REGISTRY, ...PUBLIC_REGISTRY];

let store: Store;
let company: TestCompany;
beforeAll(async () => {
  store = await testStore();
  company = await testCompany(store);
});
afterAll(() => store.close());

const actorOf = (role: Role): Actor => company[role];

function filesUnder(folder: string, fits: (name: string) => boolean): string[] {
  return fs
    .readdirSync(path.join(ROOT, folder), { recursive: true, encoding: 'utf8' })
    .filter((name) => fits(path.basename(name)))
    .map((name) => path.join(folder, name))
    .sort();
}

const routeFileOf = (address: string) =>
  path.join('app', address.replace(/\{(\w+)\}/g, '[$1]'), 'route.ts');

/** Every exported verb of lib/services, by the name it is exported under. */
async function exportedVerbs(): Promise<Map<unknown, string>> {
  const found = new Map<unknown, string>();
  for (const file of filesUnder(
    'lib/services',
    (name) => name.endsWith('.ts') && !name.endsWith('.test.ts'),
  )) {
    const module: Record<string, unknown> = await import(path.join(ROOT, file));
    for (const [name, value] of Object.entries(module)) {
      const isVerb =
        typeof value === 'object' && value !== null && 'run' in value && 'http' in value;
      if (isVerb) found.set(value, name);
    }
  }
  return found;
}

test('every verb that is written is in a registry, and only once', async () => {
  const exported = await exportedVerbs();
  expect(exported.size).toBeGreaterThan(30);
  const registered = new Set<unknown>(ALL);
  expect([...exported].filter(([verb]) => !registered.has(verb)).map(([, name]) => name)).toEqual(
    [],
  );
  expect(registered.size).toBe(ALL.length);
});

test('no two verbs share a name or an address', () => {
  const names = ALL.map((verb) => verb.name);
  const addresses = ALL.map((verb) => `${verb.http.method} ${verb.http.path}`);
  expect(names.length - new Set(names).size).toBe(0);
  expect(addresses.length - new Set(addresses).size).toBe(0);
});

test('every verb is mounted at its address, under its method', async () => {
  const exported = await exportedVerbs();
  const unmounted = ALL.filter((verb) => {
    const file = path.join(ROOT, routeFileOf(verb.http.path));
    if (!fs.existsSync(file)) return true;
    const door = new RegExp(
      `export const ${verb.http.method} = \\w*[rR]oute\\(\\s*${exported.get(verb)}\\b`,
    );
    return !door.test(fs.readFileSync(file, 'utf8'));
  });
  expect(unmounted.map((verb) => verb.name)).toEqual([]);
});

test('nothing else answers under /api', () => {
  const known = new Map<string, Set<string>>();
  for (const { http } of ALL) {
    const file = routeFileOf(http.path);
    known.set(file, new Set([...(known.get(file) ?? []), http.method]));
  }
  for (const address of PUBLIC_ADDRESSES) known.set(routeFileOf(address), new Set(['GET']));
  const unknown = filesUnder('app/api', (name) => name === 'route.ts').flatMap((file) => {
    const text = fs.readFileSync(path.join(ROOT, file), 'utf8');
    const methods = [...text.matchAll(/^export (?:const|(?:async )?function) ([A-Z]+)\b/gm)];
    return methods
      .map((match) => match[1] ?? '')
      .filter((method) => !known.get(file)?.has(method))
      .map((method) => `${method} ${file}`);
  });
  expect(unknown).toEqual([]);
});

test('every permission has somebody who has it', () => {
  for (const { roles } of Object.values(POLICY)) expect(roles).toContain('owner');
});

describe.each(REGISTRY.map((verb) => [verb.name, verb] as const))('%s', (_name, verb) => {
  const allowed = ROLES.filter((role) => roleMay(role, verb.permission));
  const refused = ROLES.filter((role) => !roleMay(role, verb.permission));

  test(`lets ${allowed.join(', ')} in and refuses an unknown field`, async () => {
    for (const role of allowed) {
      const result = await callVerb(verb, actorOf(role), { noSuchField: true });
      expect(result).toMatchObject({ ok: false, error: { code: 'invalid' } });
      const said = JSON.stringify(result.ok || result.error.issues);
      expect(said).toContain('noSuchField');
    }
  });

  if (refused.length > 0)
    test(`refuses ${refused.join(', ')}, whatever is sent`, async () => {
      for (const role of refused) {
        for (const input of [{}, { noSuchField: true }, null]) {
          const result = await callVerb(verb, actorOf(role), input);
          expect(result).toMatchObject({ ok: false, error: { code: 'notAllowed' } });
        }
      }
    });

  const inPath = [...verb.http.path.matchAll(/\{(\w+)\}/g)].map((match) => match[1] ?? '');
  const asked = verb.kind === 'read' && inPath.length > 0;
  if (asked)
    test('finds nothing under an id that is not there', async () => {
      const input = Object.fromEntries(inPath.map((name) => [name, randomUUID()]));
      const result = await callVerb(verb, company.owner, input);
      expect(result).toMatchObject({ ok: false, error: { code: 'notFound' } });
    });
});

test.each(PUBLIC_REGISTRY.map((verb) => [verb.name, verb] as const))(
  '%s refuses an unknown field',
  async (_name, verb) => {
    const caller = { address: '192.0.2.1', sessionToken: null, showsDemo: false };
    const { result } = await callPublicVerb(verb, { noSuchField: true }, caller);
    expect(result).toMatchObject({ ok: false, error: { code: 'invalid' } });
  },
);

const operation = z.looseObject({
  operationId: z.string(),
  parameters: z.array(z.looseObject({ name: z.string(), in: z.string() })),
  responses: z.record(z.string(), z.looseObject({ description: z.string().min(1) })),
  security: z.array(z.unknown()).optional(),
});

test('the API’s description has every verb, with its path’s parameters and its failures', () => {
  const document = describeApi(REGISTRY, PUBLIC_REGISTRY, 'http://localhost:3000');
  const text = JSON.stringify(document);
  const paths = z.record(z.string(), z.record(z.string(), operation)).parse(JSON.parse(text).paths);
  for (const verb of ALL) {
    const described = paths[verb.http.path]?.[verb.http.method.toLowerCase()];
    expect(described?.operationId).toBe(verb.name);
    const named = described?.parameters.filter((one) => one.in === 'path').map((one) => one.name);
    const inPath = [...verb.http.path.matchAll(/\{(\w+)\}/g)].map((match) => match[1]);
    expect(named).toEqual(inPath);
    const statuses = Object.keys(described?.responses ?? {});
    expect(statuses).toEqual(expect.arrayContaining(['200', '401', '403', '404', '422']));
  }
  const open = Object.values(paths).flatMap((one) =>
    Object.values(one).filter((described) => described.security?.length === 0),
  );
  expect(open).toHaveLength(PUBLIC_REGISTRY.length);
  for (const [, ref] of text.matchAll(/"\$ref":"#\/components\/schemas\/(\w+)"/g)) {
    expect(text).toContain(`"${ref}":{`);
  }
});
