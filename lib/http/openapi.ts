import { z } from 'zod';
import { sessionCookieName } from '../auth/cookie';
import { failureBody } from '../contracts/common';
import { FAILURE_STATUS, type FailureCode } from '../services/failure';
import type { PublicVerb } from '../services/public-verb';
import type { Verb } from '../services/verb';

type Json = Record<string, unknown>;

/** What a verb of either registry has to be described by. */
interface Described {
  readonly name: string;
  readonly says: string;
  readonly http: { readonly method: string; readonly path: string };
  readonly input: z.ZodType;
  readonly output: z.ZodType;
}

const REASONS: Record<FailureCode, string> = {
  notSignedIn: 'nobody is signed in',
  notAllowed: 'your role may not do this',
  foreignOrigin: 'the change does not come from our own pages',
  notFound: 'there is no such record, or it is not yours',
  conflict: 'it contradicts what is there',
  invalid: 'something in the request is not right; `issues` names the fields',
  tooLarge: 'the request is too large',
  wrongType: 'the request or the file is of another type',
  tooMany: 'too many attempts; wait',
  closed: 'the record is closed',
};

function jsonSchema(schema: z.ZodType, io: 'input' | 'output'): Json {
  const { $schema: _dialect, ...rest } = z.toJSONSchema(schema, { io, unrepresentable: 'any' });
  return rest;
}

/** The failures of the API as responses: one for each status, with its codes in words. */
function failures(): Json {
  const byStatus = new Map<number, string[]>();
  for (const [code, status] of Object.entries(FAILURE_STATUS)) {
    const says = `${code}: ${REASONS[code as FailureCode]}`;
    byStatus.set(status, [...(byStatus.get(status) ?? []), says]);
  }
  const schema = { $ref: '#/components/schemas/Failure' };
  return Object.fromEntries(
    [...byStatus].map(([status, codes]) => [
      String(status),
      { description: codes.join('; '), content: { 'application/json': { schema } } },
    ]),
  );
}

function operation(verb: Described, isPublic: boolean): Json {
  const input = jsonSchema(verb.input, 'input') as { properties?: Json; required?: string[] };
  const properties = { ...input.properties };
  const required = new Set(input.required);
  const inPath = [...verb.http.path.matchAll(/\{(\w+)\}/g)].map((match) => match[1] ?? '');
  const parameters: Json[] = inPath.map((name) => {
    const schema = properties[name] ?? { type: 'string' };
    delete properties[name];
    return { name, in: 'path', required: true, schema };
  });
  const isUpload = 'bytes' in properties;
  const isChange = verb.http.method !== 'GET';
  let requestBody: Json | undefined;
  if (isUpload) {
    delete properties.bytes;
    delete properties.fileName;
    const says = 'The file’s name, percent-encoded';
    parameters.push({
      name: 'x-file-name',
      in: 'header',
      schema: { type: 'string' },
      description: says,
    });
    requestBody = { required: true, content: { 'application/octet-stream': {} } };
  }
  if (isUpload || !isChange) {
    for (const [name, schema] of Object.entries(properties)) {
      parameters.push({ name, in: 'query', required: required.has(name), schema });
    }
  } else {
    const names = Object.keys(properties);
    const body = { type: 'object', properties, required: names.filter((n) => required.has(n)) };
    const schema = { ...body, additionalProperties: false };
    requestBody = { required: names.length > 0, content: { 'application/json': { schema } } };
  }
  return {
    operationId: verb.name,
    summary: verb.says,
    tags: [verb.name.split('.')[0]],
    ...(isPublic ? { security: [] } : {}),
    parameters,
    ...(requestBody ? { requestBody } : {}),
    responses: { '200': answer(verb), ...failures() },
  };
}

function answer(verb: Described): Json {
  const schema = jsonSchema(verb.output, 'output') as { properties?: Json };
  // A verb whose answer has bytes answers with the file itself.
  if (schema.properties && 'bytes' in schema.properties) {
    return { description: 'The file', content: { 'application/octet-stream': {} } };
  }
  return { description: verb.says, content: { 'application/json': { schema } } };
}

/** The API's description, made from the same schemas that check its requests. */
export function describeApi(
  verbs: readonly Verb[],
  publicVerbs: readonly PublicVerb[],
  appOrigin: string,
): Json {
  const paths: Record<string, Json> = {};
  const add = (verb: Described, isPublic: boolean) => {
    const { method, path } = verb.http;
    paths[path] = { ...paths[path], [method.toLowerCase()]: operation(verb, isPublic) };
  };
  for (const verb of verbs) add(verb, false);
  for (const verb of publicVerbs) add(verb, true);
  const sorted = Object.entries(paths).sort(([a], [b]) => (a < b ? -1 : 1));
  return {
    openapi: '3.1.0',
    info: {
      title: 'Strikeoff',
      version: '1',
      description:
        'What the pages use, for scripts too. An owner issues access keys under Company; a ' +
        'script sends one as `Authorization: Bearer KEY` and acts as a bookkeeper. Amounts and ' +
        'quantities are text, never binary fractions.',
    },
    servers: [{ url: appOrigin }],
    security: [{ accessKey: [] }, { session: [] }],
    paths: Object.fromEntries(sorted),
    components: {
      securitySchemes: {
        accessKey: { type: 'http', scheme: 'bearer' },
        session: { type: 'apiKey', in: 'cookie', name: sessionCookieName(appOrigin) },
      },
      schemas: { Failure: jsonSchema(failureBody, 'output') },
    },
  };
}
