import type { FileMending } from '../../file-recipe';

/**
 * The company that a text names: without the blanks around it, under the name that the renames lead to. A rename of a
 * new name is followed on, so that renaming twice changes nothing more; names that lead back to each other stay as they
 * are. Of two renames of one name the later counts.
 */
export function companyNames(renames: FileMending['renames']): (text: string) => string {
  const next = new Map(renames.map(({ from, to }) => [from.trim(), to.trim()]));
  const known = new Map<string, string>();
  return (text) => {
    const name = text.trim();
    const resolved = known.get(name) ?? endOf(name, next);
    known.set(name, resolved);
    return resolved;
  };
}

function endOf(name: string, next: ReadonlyMap<string, string>): string {
  const seen = new Set<string>();
  let current = name;
  for (let to = next.get(current); to !== undefined && to !== current; to = next.get(current)) {
    if (seen.has(current)) return name;
    seen.add(current);
    current = to;
  }
  return current;
}
