/** The longest that a session may last; a browser keeps the cookie as long, the server decides. */
export const SESSION_LIFE_MS = 90 * 24 * 60 * 60 * 1000;

/**
 * The name of the session cookie. Over https the prefix makes browsers refuse a cookie of this
 * name that another host or a plain connection tries to set.
 */
export function sessionCookieName(appOrigin: string): string {
  return isSecure(appOrigin) ? '__Host-strikeoff' : 'strikeoff_session';
}

function isSecure(appOrigin: string): boolean {
  return appOrigin.startsWith('https://');
}

/**
 * The Set-Cookie header that starts a session. Its life is the absolute limit: the sliding limit
 * is kept in the database, so the cookie never has to be renewed.
 */
export function sessionCookie(token: string, appOrigin: string): string {
  return cookieHeader(token, SESSION_LIFE_MS / 1000, appOrigin);
}

/** The Set-Cookie header that ends one. */
export function clearedSessionCookie(appOrigin: string): string {
  return cookieHeader('', 0, appOrigin);
}

function cookieHeader(value: string, maxAgeSeconds: number, appOrigin: string): string {
  const attributes = ['Path=/', 'HttpOnly', 'SameSite=Lax', `Max-Age=${maxAgeSeconds}`];
  if (isSecure(appOrigin)) attributes.push('Secure');
  return `${sessionCookieName(appOrigin)}=${value}; ${attributes.join('; ')}`;
}
