import { nameKey, nearNames } from '../../../panel-data';

interface NamedRows {
  readonly companies: readonly string[];
  /** Position in `companies`, by row. */
  readonly company: Int32Array;
  readonly year: Int32Array;
}

/** Names that may be one company's: first those that the panel has already, then most rows first. */
export interface SimilarCompanies {
  readonly names: readonly SimilarName[];
  /** Whether two of them have a row of the same year, which one company has not. */
  readonly isSeenTogether: boolean;
}

export interface SimilarName {
  readonly company: string;
  /** Position among the rows' companies; null for a name that only the panel has. */
  readonly code: number | null;
  /** Rows that have it; 0 for a name that only the panel has. */
  readonly rows: number;
}

/**
 * Groups names that are equal but for case, blanks, punctuation, accents, the order of words or a legal form, or that
 * are near each other. They are offered, never merged. Groups whose names never share a year come first, then those of
 * more rows.
 *
 * @param known  companies of the panel that the rows go into. One that no row names stands in a group only beside a
 * name that is new to the panel.
 */
export function similarCompanies(
  panel: NamedRows,
  known: readonly string[] = [],
): readonly SimilarCompanies[] {
  const isOfRows = new Set(panel.companies);
  const isKnown = new Set(known);
  const names = [...panel.companies, ...known.filter((name) => !isOfRows.has(name))];
  const codesOfKey = new Map<string, number[]>();
  names.forEach((name, code) => {
    const key = nameKey(name);
    const codes = codesOfKey.get(key);
    if (codes === undefined) codesOfKey.set(key, [code]);
    else codes.push(code);
  });
  const keys = [...codesOfKey.keys()];
  const rows = new Int32Array(panel.companies.length);
  for (const code of panel.company) rows[code] += 1;
  const isNamed = (code: number): boolean => code < panel.companies.length;
  const groups = joined(keys.length, nearNames(keys))
    .map((members) => members.flatMap((member) => codesOfKey.get(keys[member]) ?? []))
    .map((codes) => {
      const named = codes.filter(isNamed);
      return named.every((code) => isKnown.has(names[code])) ? named : codes;
    })
    .filter((codes) => codes.length > 1)
    .map((codes) =>
      codes.sort(
        (left, right) =>
          Number(isKnown.has(names[right])) - Number(isKnown.has(names[left])) ||
          (rows[right] ?? 0) - (rows[left] ?? 0) ||
          left - right,
      ),
    );
  const together = seenTogether(panel, groups);
  const rowsOf = (codes: readonly number[]): number =>
    Math.max(...codes.map((code) => rows[code] ?? 0));
  return groups
    .map((codes, index) => ({ codes, most: rowsOf(codes), isSeenTogether: together.has(index) }))
    .sort(
      (left, right) =>
        Number(left.isSeenTogether) - Number(right.isSeenTogether) ||
        right.most - left.most ||
        left.codes[0] - right.codes[0],
    )
    .map(({ codes, isSeenTogether }) => ({
      names: codes.map((code) => ({
        company: names[code],
        code: isNamed(code) ? code : null,
        rows: rows[code] ?? 0,
      })),
      isSeenTogether,
    }));
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
  groups: readonly (readonly number[])[],
): ReadonlySet<number> {
  const groupOf = new Int32Array(panel.companies.length).fill(-1);
  groups.forEach((codes, index) => {
    for (const code of codes) if (code < groupOf.length) groupOf[code] = index;
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
