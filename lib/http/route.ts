import type { NextRequest } from 'next/server';
import type { z } from 'zod';
import type { Actor } from '../auth/actor';
import { isOwnOrigin } from '../auth/origin';
import { readEnv } from '../env';
import { failure } from '../services/failure';
import type { Verb } from '../services/verb';
import { callVerb } from '../services/verb';
import { accessKeyActor, sessionActor } from './request-actor';
import { bugResponse, failureResponse, valueResponse } from './to-response';

export interface RouteContext {
  readonly params: Promise<Record<string, string>>;
}

const MAX_JSON_BYTES = 1_000_000;

/** Why a request is turned away before its verb is asked, or who sent it. */
async function admit(request: NextRequest): Promise<{ actor: Actor } | { refusal: Response }> {
  const authorization = request.headers.get('authorization');
  if (authorization) {
    const actor = await accessKeyActor(authorization);
    if (actor) return { actor };
    return { refusal: failureResponse(failure('notSignedIn', 'This access key is not valid.')) };
  }
  if (isChange(request.method) && !comesFromUs(request)) {
    return {
      refusal: failureResponse(
        failure('foreignOrigin', 'Changes are taken from our own pages only.'),
      ),
    };
  }
  const actor = await sessionActor();
  if (actor) return { actor };
  return { refusal: failureResponse(failure('notSignedIn', 'Please sign in first.')) };
}

export function isChange(method: string): boolean {
  return method !== 'GET' && method !== 'HEAD';
}

export function comesFromUs(request: NextRequest): boolean {
  return isOwnOrigin(request.headers, readEnv().appOrigin, request.headers.get('host'));
}

/** Query and path of a request as one flat object; a repeated query name becomes an array. */
export async function addressInput(
  request: NextRequest,
  context: RouteContext,
): Promise<Record<string, unknown>> {
  const input: Record<string, unknown> = {};
  for (const key of new Set(request.nextUrl.searchParams.keys())) {
    const values = request.nextUrl.searchParams.getAll(key);
    input[key] = values.length > 1 ? values : values[0];
  }
  return { ...input, ...(await context.params) };
}

/** The request's JSON body, an object or nothing; a refusal when it is neither. */
export async function jsonBody(
  request: NextRequest,
): Promise<{ body: Record<string, unknown> } | { refusal: Response }> {
  const bytes = await readBounded(request, MAX_JSON_BYTES);
  if (!bytes) {
    return { refusal: failureResponse(failure('tooLarge', 'The request is larger than 1 MB.')) };
  }
  if (bytes.length === 0) return { body: {} };
  if (!request.headers.get('content-type')?.startsWith('application/json')) {
    return { refusal: failureResponse(failure('wrongType', 'Send the request as JSON.')) };
  }
  try {
    const body: unknown = JSON.parse(new TextDecoder().decode(bytes));
    if (typeof body === 'object' && body !== null && !Array.isArray(body)) {
      return { body: body as Record<string, unknown> };
    }
  } catch {
    // Said below, together with JSON that is not an object.
  }
  return { refusal: failureResponse(failure('invalid', 'The request is not a JSON object.')) };
}

/** The whole body, or null as soon as it is longer than `limit`, whatever the headers claim. */
async function readBounded(request: NextRequest, limit: number): Promise<Uint8Array | null> {
  if (Number(request.headers.get('content-length') ?? 0) > limit) return null;
  if (!request.body) return new Uint8Array();
  const chunks: Uint8Array[] = [];
  let size = 0;
  const reader = request.body.getReader();
  for (;;) {
    const { done, value } = await reader.read();
    if (done) break;
    size += value.length;
    if (size > limit) {
      await reader.cancel();
      return null;
    }
    chunks.push(value);
  }
  return new Uint8Array(Buffer.concat(chunks, size));
}

/** Answers a request with a verb: JSON in (path, query, body), JSON out. */
export function route<Input extends z.ZodType, Output extends z.ZodType>(
  verb: Verb<Input, Output>,
) {
  return async (request: NextRequest, context: RouteContext): Promise<Response> => {
    try {
      const admitted = await admit(request);
      if ('refusal' in admitted) return admitted.refusal;
      const address = await addressInput(request, context);
      const read = isChange(request.method) ? await jsonBody(request) : { body: {} };
      if ('refusal' in read) return read.refusal;
      const result = await callVerb(verb, admitted.actor, { ...read.body, ...address });
      return result.ok ? valueResponse(result.value) : failureResponse(result.error);
    } catch (error) {
      return bugResponse(error, verb.name);
    }
  };
}

/**
 * Answers an upload: the request's body is the file itself, its name in `x-file-name`
 * (percent-encoded), everything else in path and query. The verb's input gets `fileName` and
 * `bytes`.
 */
export function uploadRoute<Input extends z.ZodType, Output extends z.ZodType>(
  verb: Verb<Input, Output>,
  limits: { readonly maxBytes: number; readonly tooLarge: string },
) {
  return async (request: NextRequest, context: RouteContext): Promise<Response> => {
    try {
      const admitted = await admit(request);
      if ('refusal' in admitted) return admitted.refusal;
      const bytes = await readBounded(request, limits.maxBytes);
      if (!bytes) return failureResponse(failure('tooLarge', limits.tooLarge));
      const fileName = decodedFileName(request.headers.get('x-file-name'));
      const address = await addressInput(request, context);
      const result = await callVerb(verb, admitted.actor, { ...address, fileName, bytes });
      return result.ok ? valueResponse(result.value) : failureResponse(result.error);
    } catch (error) {
      return bugResponse(error, verb.name);
    }
  };
}

function decodedFileName(header: string | null): string {
  try {
    return decodeURIComponent(header ?? '').slice(0, 200) || 'file';
  } catch {
    return 'file';
  }
}

/** What a verb returns when its answer is a file. */
export interface FileAnswer {
  readonly bytes: Uint8Array;
  readonly mediaType: string;
  readonly fileName: string;
  /** Photos are shown in pages; everything else is only ever downloaded. */
  readonly inline: boolean;
}

/** Answers a request with a file that can't act in the product's name. */
export function fileRoute<Input extends z.ZodType, Output extends z.ZodType<FileAnswer>>(
  verb: Verb<Input, Output>,
) {
  return async (request: NextRequest, context: RouteContext): Promise<Response> => {
    try {
      const admitted = await admit(request);
      if ('refusal' in admitted) return admitted.refusal;
      const result = await callVerb(verb, admitted.actor, await addressInput(request, context));
      if (!result.ok) return failureResponse(result.error);
      const file = result.value as FileAnswer;
      const plainName = file.fileName.replace(/[^\w.-]+/g, '_');
      return new Response(Buffer.from(file.bytes), {
        headers: {
          'content-type': file.mediaType,
          'content-disposition': `${file.inline ? 'inline' : 'attachment'}; filename="${plainName}"`,
          'content-security-policy': "default-src 'none'; sandbox",
          'x-content-type-options': 'nosniff',
          'cache-control': 'private, no-store',
        },
      });
    } catch (error) {
      return bugResponse(error, verb.name);
    }
  };
}
