/** One field whose value a change touched. */
export interface FieldDifference {
  /** "tolerances.priceDiffers.absolute" */
  readonly path: string;
  readonly before: string | null;
  readonly after: string | null;
}

/** A plain value as people read it; null where there is none. */
function written(value: unknown): string | null {
  if (value === undefined || value === null || value === '') return null;
  return typeof value === 'string' ? value : JSON.stringify(value);
}

function flatten(value: unknown, path: string, into: Map<string, string | null>): void {
  const isBranch = typeof value === 'object' && value !== null;
  if (!isBranch || Object.keys(value).length === 0) {
    if (path !== '') into.set(path, isBranch ? null : written(value));
    return;
  }
  for (const [key, inner] of Object.entries(value)) {
    flatten(inner, path === '' ? key : `${path}.${key}`, into);
  }
}

/**
 * What differs between two versions of a record, field by field in the order in which the newer
 * one lists them. A field that one version lacks and the other leaves empty does not differ.
 */
export function fieldDifferences(before: unknown, after: unknown): FieldDifference[] {
  const old = new Map<string, string | null>();
  const now = new Map<string, string | null>();
  flatten(before, '', old);
  flatten(after, '', now);
  const paths = [...now.keys(), ...[...old.keys()].filter((path) => !now.has(path))];
  return paths
    .map((path) => ({ path, before: old.get(path) ?? null, after: now.get(path) ?? null }))
    .filter((field) => field.before !== field.after);
}
