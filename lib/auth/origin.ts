/**
 * Whether a request that changes something comes from the product's own pages. The framework
 * checks nothing for route handlers. Browsers send Sec-Fetch-Site; where it is missing the
 * Origin must be ours; where both are missing only an access key will do.
 */
export function isOwnOrigin(headers: Headers, appOrigin: string, host: string | null): boolean {
  const site = headers.get('sec-fetch-site');
  if (site) return site === 'same-origin';
  const origin = headers.get('origin');
  // A sandboxed page sends the word "null", which is no address.
  if (!origin || !URL.canParse(origin)) return false;
  return origin === new URL(appOrigin).origin || (host !== null && new URL(origin).host === host);
}
