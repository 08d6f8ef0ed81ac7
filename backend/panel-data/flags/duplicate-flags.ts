import type { FlaggedCell } from './flag';
import { type FlagGround, modelColumns } from './flag-ground';

/** One figure may well be the same by chance; so many are a copy. Common practice, no source. */
const fewestSame = 2;

/**
 * Rows whose figures of the model are those of another company in the same year: every figure that both have, two of
 * them at least that are not 0. The row of the other company is flagged as well: which of the two is the copy cannot be
 * told.
 */
export function duplicateFlags(ground: FlagGround): FlaggedCell[] {
  const { panel } = ground;
  const columns = modelColumns(ground);
  const candidates = rowsBySharedFigures(ground, columns);
  const found: FlaggedCell[] = [];
  for (let row = 0; row < panel.year.length; row++) {
    const others = new Set<number>();
    let same: readonly number[] = [];
    for (const key of sharedKeys(ground, columns, row))
      for (const other of candidates.get(key) ?? []) {
        if (panel.company[other] === panel.company[row] || others.has(other)) continue;
        const common = commonFigures(ground, columns, [row, other]);
        if (common === null) continue;
        others.add(other);
        if (common.length > same.length) same = common;
      }
    const [company] = [...others].map((other) => panel.companies[panel.company[other]]).sort();
    for (const column of same) {
      const facts = { code: 'duplicate', of: 'figures', company, columns: same.length } as const;
      found.push({ row, column, facts: { ...facts, more: others.size - 1 } });
    }
  }
  return found;
}

/**
 * Rows that may hold the same two figures in the same year, by key; keys of one row alone are left out. Different
 * figures may share a key, if rarely.
 */
function rowsBySharedFigures(
  ground: FlagGround,
  columns: readonly number[],
): ReadonlyMap<number, readonly number[]> {
  const first = new Map<number, number>();
  const shared = new Map<number, number[]>();
  for (let row = 0; row < ground.panel.year.length; row++)
    for (const key of sharedKeys(ground, columns, row)) {
      const seen = first.get(key);
      const list = shared.get(key);
      if (seen === undefined) first.set(key, row);
      else if (list === undefined) shared.set(key, [seen, row]);
      else list.push(row);
    }
  return shared;
}

/** A key for each two figures of a row that are not 0: of 200,000 rows, numbers take a tenth of the time of texts. */
function sharedKeys(
  { panel }: FlagGround,
  columns: readonly number[],
  row: number,
): readonly number[] {
  const keys: number[] = [];
  columns.forEach((first, place) => {
    for (const second of columns.slice(place + 1)) {
      const [one, other] = [panel.values[first][row], panel.values[second][row]];
      if (isTelling(one) && isTelling(other))
        keys.push(mixed(mixed(mixed(panel.year[row], first * 64 + second), one), other));
    }
  });
  return keys;
}

const double = new Float64Array(1);
const halves = new Uint32Array(double.buffer);

/** Both halves of the value's bits stirred into the key (the finalizer of MurmurHash3, Appleby 2011). */
function mixed(key: number, value: number): number {
  double[0] = value;
  return stirred(stirred(key ^ halves[0]) ^ halves[1]);
}

function stirred(bits: number): number {
  let rest = bits;
  rest = Math.imul(rest ^ (rest >>> 16), 0x85ebca6b);
  rest = Math.imul(rest ^ (rest >>> 13), 0xc2b2ae35);
  return rest ^ (rest >>> 16);
}

function isTelling(value: number): boolean {
  return Number.isFinite(value) && value !== 0;
}

/** The columns in which two rows have the same figure; null where they differ in one, or share too few. */
function commonFigures(
  { panel }: FlagGround,
  columns: readonly number[],
  [row, other]: readonly [number, number],
): readonly number[] | null {
  const both = columns.filter(
    (column) =>
      !Number.isNaN(panel.values[column][row]) && !Number.isNaN(panel.values[column][other]),
  );
  const differs = both.some((column) => panel.values[column][row] !== panel.values[column][other]);
  const telling = both.filter((column) => isTelling(panel.values[column][row]));
  return differs || telling.length < fewestSame ? null : both;
}
