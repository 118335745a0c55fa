import { randomBytes } from 'node:crypto';
import { type NextRequest, NextResponse } from 'next/server';
import { readEnv } from './lib/env';
import { contentSecurityPolicy } from './lib/http/content-security-policy';

/**
 * Gives every page its content security policy, with a nonce of its own that the framework puts
 * on its scripts. Routes of the API stay out: their headers are in next.config.mjs, and passing
 * through here would cut uploads off at 10 MB.
 */
export function proxy(request: NextRequest): NextResponse {
  const isHttps = readEnv().appOrigin.startsWith('https://');
  const policy = contentSecurityPolicy({
    nonce: randomBytes(16).toString('base64'),
    isHttps,
    isDevelopment: process.env.NODE_ENV === 'development',
  });
  const headers = new Headers(request.headers);
  headers.set('content-security-policy', policy);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set('content-security-policy', policy);
  if (isHttps) {
    response.headers.set('strict-transport-security', 'max-age=31536000; includeSubDomains');
  }
  return response;
}

export const config = {
  matcher: ['/((?!api/|_next/static|_next/image|favicon.ico).*)'],
};
