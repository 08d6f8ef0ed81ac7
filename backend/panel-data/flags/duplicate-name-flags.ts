import { nameKey } from '../names/name-key';
import { nearNames } from '../names/near-names';
import type { Flag } from './flag';
import type { FlagGround } from './flag-ground';

/**
 * Companies that may be one under two names: the names are equal but for case, blanks, punctuation, accents, the order
 * of words or a legal form, or near each other in spelling; and the years of the two overlap or adjoin. Each is flagged
 * at its first year, beside the other one with the most rows.
 */
export function duplicateNameFlags({ panel, rowsOf }: FlagGround): Flag[] {
  const codesOfKey = new Map<string, number[]>();
  panel.companies.forEach((name, code) => {
    if (rowsOf[code].length === 0) return;
    const key = nameKey(name);
    const codes = codesOfKey.get(key);
    if (codes === undefined) codesOfKey.set(key, [code]);
    else codes.push(code);
  });
  const groups = [...codesOfKey.values()];
  const near = nearNames([...codesOfKey.keys()]);
  const pairs = [
    ...groups.flatMap((codes) => pairsOf(codes, codes)),
    ...near.flatMap(([one, other]) => pairsOf(groups[one], groups[other])),
  ];
  const yearsOf = (code: number): readonly [first: number, last: number] => {
    const rows = rowsOf[code];
    return [panel.year[rows[0]], panel.year[rows[rows.length - 1]]];
  };
  const others = new Map<number, number[]>();
  for (const [one, other] of pairs) {
    if (!areNear(yearsOf(one), yearsOf(other))) continue;
    others.set(one, [...(others.get(one) ?? []), other]);
    others.set(other, [...(others.get(other) ?? []), one]);
  }
  return [...others].map(([code, alike]): Flag => {
    const [likeliest] = alike.sort(
      (left, right) =>
        rowsOf[right].length - rowsOf[left].length ||
        (panel.companies[left] < panel.companies[right] ? -1 : 1),
    );
    const more = alike.length - 1;
    return {
      company: panel.companies[code],
      year: yearsOf(code)[0],
      column: null,
      value: null,
      facts: { code: 'duplicate', of: 'name', company: panel.companies[likeliest], more },
    };
  });
}

/** Each of the one with each of the other, every two once. */
function pairsOf(
  codes: readonly number[],
  others: readonly number[],
): readonly (readonly [number, number])[] {
  return codes.flatMap((one, place) =>
    (codes === others ? others.slice(place + 1) : others).map((other) => [one, other] as const),
  );
}

/** Whether the years overlap, or those of the one follow on the other's. */
function areNear(
  [first, last]: readonly [number, number],
  [otherFirst, otherLast]: readonly [number, number],
): boolean {
  return first <= otherLast + 1 && otherFirst <= last + 1;
}
