/** What JSON can say. */
export type Json =
  string | number | boolean | null | readonly Json[] | { readonly [key: string]: Json };

/**
 * Gives every null its own `…Reason`, taken from the reason that its object states. The one exception of a reply is
 * `specification.seed`, printed as it was asked for: null where the specification draws nothing.
 */
export function withReasons(value: Json): Json {
  if (Array.isArray(value)) return value.map(withReasons);
  if (value === null || typeof value !== 'object') return value;
  const object = value as Readonly<Record<string, Json>>;
  const stated = object['intervalReason'] ?? object['pValueReason'] ?? object['reason'];
  const result: Record<string, Json> = {};
  for (const [key, entry] of Object.entries(object)) {
    if (entry === undefined || key === 'intervalReason') continue;
    result[key] = withReasons(entry);
    const own = `${key}Reason`;
    if (entry === null && !(own in object) && stated !== undefined) result[own] = stated;
  }
  return result;
}

/** The reasons of those figures of an object that are null, under their `…Reason`. */
export function reasonsOf<Figures extends object>(
  figures: Figures,
  reasons: { readonly [Key in keyof Figures]?: string | undefined },
): Readonly<Record<string, string>> {
  const found = Object.entries<string | undefined>(
    reasons as Readonly<Record<string, string | undefined>>,
  ).flatMap(([key, reason]): [string, string][] =>
    figures[key as keyof Figures] === null && reason !== undefined
      ? [[`${key}Reason`, reason]]
      : [],
  );
  return Object.fromEntries(found);
}
