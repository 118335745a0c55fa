import { createHash, randomBytes } from 'node:crypto';

/** A secret of 256 random bits for a cookie, a link or an access key. */
export function newToken(): string {
  return randomBytes(32).toString('base64url');
}

/** What is stored of a secret. The secret is random, so a plain hash can't be searched. */
export function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}
