import { randomUUID } from 'node:crypto';
import type { FailureBody } from '../contracts/common';
import { log } from '../log';
import type { Failure } from '../services/failure';
import { FAILURE_STATUS } from '../services/failure';

const NO_STORE = { 'cache-control': 'no-store' };

export function failureResponse(failure: Failure): Response {
  const body: FailureBody = {
    error: { code: failure.code, message: failure.message, issues: [...failure.issues] },
  };
  return Response.json(body, { status: FAILURE_STATUS[failure.code], headers: NO_STORE });
}

export function valueResponse(value: unknown): Response {
  return Response.json(value, { headers: NO_STORE });
}

/** A bug: details go to the log under a reference, the answer carries only the reference. */
export function bugResponse(error: unknown, where: string): Response {
  const reference = randomUUID().slice(0, 8);
  log.error({ err: error, where, reference }, 'request failed');
  const body: FailureBody = {
    error: {
      code: 'unexpected',
      message: `Something went wrong on our side; nothing was saved. Reference ${reference}.`,
      issues: [],
    },
  };
  return Response.json(body, { status: 500, headers: NO_STORE });
}
