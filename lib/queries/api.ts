import type { z } from 'zod';
import { failureBody } from '../contracts/common';

/** An answer that says no: the same code, sentence and fields that the server gave. */
export class ApiFailure extends Error {
  override readonly name = 'ApiFailure';
  constructor(
    readonly code: string,
    message: string,
    readonly issues: readonly { path: string; message: string }[],
    /** 0 where no answer came at all. */
    readonly status: number,
  ) {
    super(message);
  }
}

async function answer<Output extends z.ZodType>(
  asked: Promise<Response>,
  output: Output,
): Promise<z.output<Output>> {
  let response: Response;
  try {
    response = await asked;
  } catch {
    throw new ApiFailure('noSignal', 'No connection. Nothing was lost; try again.', [], 0);
  }
  const body: unknown = await response.json().catch(() => null);
  if (response.ok) return output.parse(body);
  const failed = failureBody.safeParse(body);
  if (!failed.success) {
    throw new ApiFailure(
      'unexpected',
      `The server answered ${response.status}.`,
      [],
      response.status,
    );
  }
  const { code, message, issues } = failed.data.error;
  throw new ApiFailure(code, message, issues, response.status);
}

function withQuery(path: string, query: Record<string, unknown>): string {
  const search = new URLSearchParams();
  for (const [key, value] of Object.entries(query)) {
    if (value === undefined || value === null || value === '') continue;
    for (const one of Array.isArray(value) ? value : [value]) search.append(key, String(one));
  }
  const text = search.toString();
  return text ? `${path}?${text}` : path;
}

/** Reads from the API; the answer is checked against the verb's own output schema. */
export function apiGet<Output extends z.ZodType>(
  path: string,
  output: Output,
  query: Record<string, unknown> = {},
): Promise<z.output<Output>> {
  return answer(fetch(withQuery(path, query)), output);
}

/** Changes something through the API. */
export function apiSend<Output extends z.ZodType>(
  method: 'POST' | 'PUT' | 'PATCH' | 'DELETE',
  path: string,
  body: unknown,
  output: Output,
): Promise<z.output<Output>> {
  const headers = { 'content-type': 'application/json' };
  return answer(fetch(path, { method, headers, body: JSON.stringify(body ?? {}) }), output);
}

/** Uploads one file as the request's body. */
export function apiUpload<Output extends z.ZodType>(
  path: string,
  file: { readonly body: Blob; readonly name: string },
  output: Output,
  query: Record<string, unknown> = {},
): Promise<z.output<Output>> {
  const headers = {
    'content-type': file.body.type || 'application/octet-stream',
    'x-file-name': encodeURIComponent(file.name),
  };
  return answer(
    fetch(withQuery(path, query), { method: 'POST', headers, body: file.body }),
    output,
  );
}
