import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { z } from 'zod';
import type { Store } from '../../db/client';
import { REGISTRY } from '../../lib/services/registry';
import { callVerb, type Verb } from '../../lib/services/verb';
import { type FullCompany, fullCompany } from '../support/full-company';
import { temporaryFolder, testStore } from '../support/store';
import { VERB_SAMPLES } from '../support/verb-samples';

/**
 * Nothing crosses from one company to another. Two companies have a record of every kind; for
 * every verb that is listed, the owner of the one sends the ids of the other, all at once and
 * each by itself: beside ids of his own to what looks a record up, alone to a list.
 */
const folder = temporaryFolder();
let store: Store;
let ours: FullCompany;
let theirs: FullCompany;

beforeAll(async () => {
  process.env.DATA_DIR = folder.path;
  store = await testStore();
  ours = await fullCompany(store);
  theirs = await fullCompany(store);
}, 300_000);
afterAll(async () => {
  await store.close();
  folder.remove();
});

type Json = { readonly [key: string]: Json | readonly Json[] | string | boolean | undefined };

/** Where ids stand in what a verb takes: "jobId", "deliveries.*.id". */
function idPaths(schema: Json, at: readonly string[] = []): string[] {
  if (schema.format === 'uuid') return [at.join('.')];
  const inside = (part: unknown, name: readonly string[] = []) =>
    part && typeof part === 'object' ? idPaths(part as Json, [...at, ...name]) : [];
  return [
    ...Object.entries((schema.properties ?? {}) as Json).flatMap(([name, part]) =>
      inside(part, [name]),
    ),
    ...inside(schema.items, ['*']),
    ...['anyOf', 'oneOf', 'allOf'].flatMap((of) =>
      ((schema[of] ?? []) as readonly Json[]).flatMap((part) => inside(part)),
    ),
  ];
}

/** The ids that a verb takes, but for the one that a device makes up for what is new. */
function idsIn(verb: Verb): string[] {
  const schema = z.toJSONSchema(verb.input, { io: 'input', unrepresentable: 'any' });
  return [...new Set(idPaths(schema as Json))].filter((path) => path !== 'clientId');
}

function at(value: unknown, path: string): unknown {
  return path.split('.').reduce<unknown>((inner, name) => {
    const key = name === '*' ? '0' : name;
    return (inner as Record<string, unknown> | undefined)?.[key];
  }, value);
}

/** A copy in which the id at `path` is another. */
function replaced(value: unknown, [name, ...rest]: readonly string[], id: unknown): unknown {
  if (name === undefined) return id;
  if (Array.isArray(value)) return [replaced(value[0], rest, id), ...value.slice(1)];
  const record = value as Record<string, unknown>;
  return { ...record, [name]: replaced(record[name], rest, id) };
}

/** An answer as text, the bytes of a file as what they say. */
function saidBy(value: unknown): string {
  return JSON.stringify(value, (_, part: unknown) =>
    part instanceof Uint8Array ? new TextDecoder().decode(part) : part,
  );
}

function everyText(value: unknown): string[] {
  if (typeof value === 'string') return [value];
  if (typeof value !== 'object' || value === null) return [];
  return Object.values(value).flatMap(everyText);
}

/** Whatever names a record of the company: its ids and the tag in its names. */
function marksOf(company: FullCompany): string[] {
  const uuid = /^[0-9a-f]{8}-([0-9a-f]{4}-){3}[0-9a-f]{12}$/;
  return [company.tag, ...everyText(company).filter((text) => uuid.test(text))];
}
const marksIn = (company: FullCompany, value: unknown) =>
  marksOf(company).filter((mark) => saidBy(value).includes(mark));

const takesIds = REGISTRY.filter((verb) => idsIn(verb).length > 0);
const takesNone = REGISTRY.filter((verb) => verb.kind === 'read' && idsIn(verb).length === 0);
/** Lists narrow themselves by ids of anything; all others look up what they are told. */
const isList = (verb: Verb) => {
  const schema = z.toJSONSchema(verb.input, { io: 'input', unrepresentable: 'any' });
  return verb.kind === 'read' && !idsIn(verb).some((path) => schema.required?.includes(path));
};
const named = (verbs: readonly Verb[]) => verbs.map((verb) => [verb.name, verb] as const);
const sampleOf = async (verb: Verb, company: FullCompany) => VERB_SAMPLES[verb.name]?.(company);

it('has a sample of every verb that takes ids, and of no other', () => {
  expect(takesIds.length).toBeGreaterThan(50);
  expect(Object.keys(VERB_SAMPLES).sort()).toEqual(takesIds.map(({ name }) => name).sort());
});

it('has two companies that share no mark', () => {
  expect(marksOf(ours).length).toBeGreaterThan(20);
  expect(marksIn(ours, theirs)).toEqual([]);
});

describe.each(named(takesIds))('%s', (_name, verb) => {
  it('has every id of its input in its sample', async () => {
    const sample = await sampleOf(verb, theirs);
    const filled = idsIn(verb).filter((path) => typeof at(sample, path) === 'string');
    expect(filled).toEqual(idsIn(verb));
  });
});

describe.each(named(takesIds.filter((verb) => !isList(verb))))('%s', (_name, verb) => {
  it('does not find what is another company’s', async () => {
    const foreign = await callVerb(verb, ours.owner, await sampleOf(verb, theirs));
    expect(foreign).toMatchObject({ ok: false, error: { code: 'notFound' } });
    expect(marksIn(theirs, foreign)).toEqual([]);
  });

  it.each(idsIn(verb))('does not find another company’s %s beside its own', async (path) => {
    const own = await sampleOf(verb, ours);
    const foreign = at(await sampleOf(verb, theirs), path);
    const mixed = replaced(own, path.split('.'), foreign);
    expect(at(mixed, path)).toBe(foreign);
    const answer = await callVerb(verb, ours.owner, mixed);
    expect(answer).toMatchObject({ ok: false, error: { code: 'notFound' } });
  });

  it('does for its own company what it refused to another', async () => {
    // A change gets a company of its own: it may take away what the next one needs.
    const company = verb.kind === 'read' ? theirs : await fullCompany(store);
    const answer = await callVerb(verb, company.owner, await sampleOf(verb, company));
    expect(answer).toMatchObject({ ok: true });
  });
});

describe.each(named(takesIds.filter(isList)))('%s', (_name, verb) => {
  it('lists nothing of another company’s, whichever of its ids it is asked for', async () => {
    const foreign = await sampleOf(verb, theirs);
    // Each alone too: beside another filter a row of theirs would drop out without being kept out.
    const alone = idsIn(verb).map((path) => ({ [path]: at(foreign, path) }));
    for (const asked of [{}, foreign, ...alone]) {
      const answer = await callVerb(verb, ours.owner, asked);
      expect(answer.ok || answer.error.code === 'notFound', JSON.stringify(asked)).toBe(true);
      if (answer.ok) expect(marksIn(theirs, answer.value), JSON.stringify(asked)).toEqual([]);
    }
    const own = await sampleOf(verb, ours);
    const mine = await callVerb(verb, ours.owner, own);
    expect(mine).toMatchObject({ ok: true });
    expect(marksIn(ours, mine)).not.toEqual([]);
  });
});

describe.each(named(takesNone))('%s', (_name, verb) => {
  it('answers with nothing of another company’s', async () => {
    const answer = await callVerb(verb, ours.owner, verb.name === 'demo.file' ? { name: 'x' } : {});
    expect(marksIn(theirs, answer)).toEqual([]);
  });
});
