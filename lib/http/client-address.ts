/**
 * The network address that a request came from. Behind a proxy that is declared with
 * TRUST_PROXY it is the last entry of X-Forwarded-For, the one that this proxy added. Without
 * one the header is the server's own note of the socket: `forgetForwarded` has dropped whatever
 * the client sent under that name.
 */
export function clientAddress(headers: Headers, trustProxy: boolean): string {
  const entries = (headers.get('x-forwarded-for') ?? '').split(',').map((entry) => entry.trim());
  const address = (trustProxy ? entries.at(-1) : entries[0]) || 'unknown';
  return networkOf(address);
}

/** An IPv6 customer has a whole /64 to choose addresses from, so that is what is counted. */
function networkOf(address: string): string {
  const plain = address.replace(/^::ffff:/i, '');
  if (!plain.includes(':')) return plain;
  const [head = '', tail] = plain.toLowerCase().split('::');
  const left = head.split(':').filter(Boolean);
  const right = (tail ?? '').split(':').filter(Boolean);
  const zeros = tail === undefined ? 0 : Math.max(0, 8 - left.length - right.length);
  const groups = [...left, ...Array<string>(zeros).fill('0'), ...right];
  return groups
    .slice(0, 4)
    .map((group) => group.replace(/^0+(?=.)/, ''))
    .join(':');
}

const FORWARDING_HEADERS = ['x-forwarded-for', 'x-forwarded-host', 'x-forwarded-proto'];

/** Drops what a client claims about its own address from a request that no proxy vouches for. */
export function forgetForwarded(headers: Record<string, unknown>): void {
  for (const header of FORWARDING_HEADERS) delete headers[header];
}
