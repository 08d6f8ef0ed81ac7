import { nameKey, nearNames } from '../../../panel-data';

interface NamedRows {
  readonly companies: readonly string[];
  /** Position in `companies`, by row. */
  readonly company: Int32Array;
  readonly year: Int32Array;
}

/** Names that may be one company's, most rows first. */
export interface SimilarCompanies {
  readonly names: readonly { readonly code: number; readonly rows: number }[];
  /** Whether two of them have a row of the same year, which one company has not. */
  readonly isSeenTogether: boolean;
}

/**
 * Groups names that are equal but for case, blanks, punctuation, accents, the order of words or a legal form, or that
 * are near each other. They are offered, never merged. Groups whose names never share a year come first, then those of
 * more rows.
 */
export function similarCompanies(panel: NamedRows): readonly SimilarCompanies[] {
  const codesOfKey = new Map<string, number[]>();
  panel.companies.forEach((name, code) => {
    const key = nameKey(name);
    const codes = codesOfKey.get(key);
    if (codes === undefined) codesOfKey.set(key, [code]);
    else codes.push(code);
  });
  const keys = [...codesOfKey.keys()];
  const rows = new Int32Array(panel.companies.length);
  for (const code of panel.company) rows[code] += 1;
  const groups = joined(keys.length, nearNames(keys))
    .map((members) => members.flatMap((member) => codesOfKey.get(keys[member]) ?? []))
    .filter((codes) => codes.length > 1)
    .map((codes) =>
      codes
        .map((code) => ({ code, rows: rows[code] }))
        .sort((left, right) => right.rows - left.rows || left.code - right.code),
    );
  const together = seenTogether(panel, groups);
  return groups
    .map((names, index) => ({ names, isSeenTogether: together.has(index) }))
    .sort(
      (left, right) =>
        Number(left.isSeenTogether) - Number(right.isSeenTogether) ||
        right.names[0].rows - left.names[0].rows ||
        left.names[0].code - right.names[0].code,
    );
}

/** Members 0 … count − 1 in groups that the pairs connect, each group in ascending order. */
function joined(count: number, pairs: readonly (readonly [number, number])[]): number[][] {
  const parent = Int32Array.from({ length: count }, (_, index) => index);
  const root = (member: number): number => {
    let top = member;
    while (parent[top] !== top) top = parent[top] = parent[parent[top]];
    return top;
  };
  for (const [left, right] of pairs) {
    const [first, second] = [root(left), root(right)];
    parent[Math.max(first, second)] = Math.min(first, second);
  }
  const groups = new Map<number, number[]>();
  for (let member = 0; member < count; member++) {
    const group = groups.get(root(member));
    if (group === undefined) groups.set(root(member), [member]);
    else group.push(member);
  }
  return [...groups.values()];
}

/** Positions of the groups of which two names have a row in the same year. */
function seenTogether(
  panel: NamedRows,
  groups: readonly (readonly { readonly code: number }[])[],
): ReadonlySet<number> {
  const groupOf = new Int32Array(panel.companies.length).fill(-1);
  groups.forEach((names, index) => {
    for (const { code } of names) groupOf[code] = index;
  });
  const together = new Set<number>();
  const seen = new Map<string, number>();
  panel.company.forEach((code, row) => {
    if (groupOf[code] === -1) return;
    const key = `${groupOf[code]} ${panel.year[row]}`;
    const other = seen.get(key);
    if (other === undefined) seen.set(key, code);
    else if (other !== code) together.add(groupOf[code]);
  });
  return together;
}
