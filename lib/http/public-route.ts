import type { NextRequest } from 'next/server';
import type { z } from 'zod';
import { clearedSessionCookie, sessionCookie } from '../auth/cookie';
import { readEnv } from '../env';
import { failure } from '../services/failure';
import type { PublicVerb, SessionChange } from '../services/public-verb';
import { callPublicVerb } from '../services/public-verb';
import { clientAddress } from './client-address';
import { sessionToken } from './request-actor';
import type { RouteContext } from './route';
import { addressInput, comesFromUs, isChange, jsonBody } from './route';
import { bugResponse, failureResponse, valueResponse } from './to-response';

/** Answers a request with a verb that needs no sign-in: the same checks, but for who asks. */
export function publicRoute<Input extends z.ZodType, Output extends z.ZodType>(
  verb: PublicVerb<Input, Output>,
) {
  return async (request: NextRequest, context: RouteContext): Promise<Response> => {
    try {
      if (isChange(request.method) && !comesFromUs(request)) {
        return failureResponse(
          failure('foreignOrigin', 'Changes are taken from our own pages only.'),
        );
      }
      const address = await addressInput(request, context);
      const read = isChange(request.method) ? await jsonBody(request) : { body: {} };
      if ('refusal' in read) return read.refusal;
      const { demo, trustProxy } = readEnv();
      const { result, session } = await callPublicVerb(
        verb,
        { ...read.body, ...address },
        {
          address: clientAddress(request.headers, trustProxy),
          sessionToken: await sessionToken(),
          showsDemo: demo,
        },
      );
      const response = result.ok ? valueResponse(result.value) : failureResponse(result.error);
      return withSession(response, session);
    } catch (error) {
      return bugResponse(error, verb.name);
    }
  };
}

function withSession(response: Response, session: SessionChange): Response {
  const { appOrigin } = readEnv();
  if (session.kind === 'set') {
    response.headers.append('set-cookie', sessionCookie(session.token, appOrigin));
  }
  if (session.kind === 'clear') {
    response.headers.append('set-cookie', clearedSessionCookie(appOrigin));
  }
  return response;
}
