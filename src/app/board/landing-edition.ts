import type { EditionSummary, Role } from '@contract';

/**
 * The edition that somebody who comes to read lands on: for the CFO the newest that waits for a signature, else the
 * newest signed one. Undefined for those who work on editions, and where there is none: they see the list.
 */
export function landingEdition(
  editions: readonly EditionSummary[],
  roles: readonly Role[],
): EditionSummary | undefined {
  const signs = roles.includes('cfo');
  if (!signs && roles.includes('analyst')) return undefined;
  const newest = (state: EditionSummary['state']) =>
    editions
      .filter((edition) => edition.state === state)
      .reduce<EditionSummary | undefined>(
        (best, edition) => (best === undefined || edition.number > best.number ? edition : best),
        undefined,
      );
  const signed = newest('signed');
  const waiting = signs ? newest('waiting') : undefined;
  // One that a later signed edition has overtaken waits for nothing.
  return waiting !== undefined && waiting.number > (signed?.number ?? 0) ? waiting : signed;
}
