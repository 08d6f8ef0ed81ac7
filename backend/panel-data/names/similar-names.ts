import { nameKey } from './name-key';
import { nearNames } from './near-names';

/**
 * The names that may mean the same company as this one, as an import looks for them: equal but for case, blanks,
 * punctuation, accents, the order of words or a legal form, or near it.
 *
 * @param names  this very name is passed over where it is among them.
 */
export function similarNames(name: string, names: readonly string[]): readonly string[] {
  const key = nameKey(name);
  return names.filter((other) => {
    if (other === name) return false;
    const otherKey = nameKey(other);
    return otherKey === key || nearNames([key, otherKey]).length > 0;
  });
}
