/** Paths of all numbers of a value that JSON would print as null. */
export function unspeakable(value: unknown, path = ''): string[] {
  if (typeof value === 'number') return Number.isFinite(value) ? [] : [path];
  if (value === null || typeof value !== 'object') return [];
  return Object.entries(value).flatMap(([key, entry]) => unspeakable(entry, `${path}.${key}`));
}
