/** The address's query as the list verbs take it; a name given twice counts once. */
export function listQuery(
  params: Record<string, string | string[] | undefined>,
): Record<string, string> {
  const query: Record<string, string> = {};
  for (const [name, value] of Object.entries(params)) {
    const one = Array.isArray(value) ? value[0] : value;
    if (one) query[name] = one;
  }
  return query;
}

/** Whether two queries ask for the same rows. */
export function sameQuery(one: Record<string, string>, other: Record<string, string>): boolean {
  const names = new Set([...Object.keys(one), ...Object.keys(other)]);
  return [...names].every((name) => (one[name] ?? '') === (other[name] ?? ''));
}
