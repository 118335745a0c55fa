/**
 * A UUID made on the device, under which a record is sent and recognised when it is sent again.
 * `crypto.randomUUID` is missing where the product is served without TLS on a site's own network.
 */
export function newClientId(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(16));
  bytes[6] = ((bytes[6] ?? 0) & 0x0f) | 0x40;
  bytes[8] = ((bytes[8] ?? 0) & 0x3f) | 0x80;
  const hex = [...bytes].map((byte) => byte.toString(16).padStart(2, '0')).join('');
  const parts = [
    [0, 8],
    [8, 12],
    [12, 16],
    [16, 20],
    [20, 32],
  ] as const;
  return parts.map(([from, to]) => hex.slice(from, to)).join('-');
}
