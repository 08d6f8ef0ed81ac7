import type { FitWarning } from '../fit-result';

/** Warns of names that are the same but for case or blanks. */
export function spellingWarning(names: readonly string[]): FitWarning[] {
  const groups = new Map<string, Set<string>>();
  for (const name of names) {
    const key = name.toLowerCase().replace(/\s+/gu, '');
    const group = groups.get(key) ?? new Set<string>();
    groups.set(key, group.add(name));
  }
  return [...groups.values()]
    .filter((group) => group.size > 1)
    .map((group): FitWarning => {
      const subjects = [...group].sort();
      const list = subjects.map((name) => `“${name}”`).join(' and ');
      const detail = `${list} differ only by case or blanks and count as different companies.`;
      return { code: 'spelling', detail, subjects };
    });
}
