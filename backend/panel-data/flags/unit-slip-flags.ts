import type { ModelRole } from '../model-role';
import { median } from '../robust';
import type { FlaggedCell } from './flag';
import type { FlagGround } from './flag-ground';
import { modelColumns } from './flag-ground';

const factors = [1000, 1_000_000] as const;
/** How far from the factor still counts as near it: a third to three times. Common practice, no source. */
const nearness = Math.log10(3);
/** Companies that a column is held against. Common practice, no source. */
const fewestPeers = 5;

/**
 * Values near 1,000 or 1,000,000 times, or one such part of, what they usually are: against the company's own other
 * years; and a whole column of a company against its other columns, as its peers have them.
 */
export function unitSlipFlags(ground: FlagGround): FlaggedCell[] {
  const own = ground.rowsOf.flatMap((rows) =>
    modelColumns(ground).flatMap((column) => slipsAgainstOwnYears(ground, column, rows)),
  );
  return [...own, ...slipsOfWholeColumns(ground)];
}

interface Slip {
  readonly factor: (typeof factors)[number];
  readonly isTooLarge: boolean;
}

function slipOf(value: number, usual: number): Slip | undefined {
  const distance = Math.log10(Math.abs(value / usual));
  const factor = factors.find(
    (candidate) => Math.abs(Math.abs(distance) - Math.log10(candidate)) <= nearness,
  );
  return factor === undefined ? undefined : { factor, isTooLarge: distance > 0 };
}

function slipsAgainstOwnYears(
  { panel }: FlagGround,
  column: number,
  rows: Int32Array,
): FlaggedCell[] {
  const cells = panel.values[column];
  const shown = [...rows].filter((row) => Number.isFinite(cells[row]) && cells[row] !== 0);
  if (shown.length < 3) return [];
  const usual = median(shown.map((row) => Math.abs(cells[row])));
  const found = shown.flatMap((row): FlaggedCell[] => {
    const slip = slipOf(cells[row], usual);
    if (slip === undefined) return [];
    return [{ row, column, facts: { code: 'unit-slip', ...slip, usual, against: 'own-years' } }];
  });
  // Half the years a thousand times the other half: which half is wrong cannot be told, and the median is neither.
  return found.length * 2 > shown.length ? [] : found;
}

const pairs: readonly (readonly [ModelRole, ModelRole])[] = [
  ['marketValue', 'bookEquity'],
  ['capex', 'bookEquity'],
  ['bookEquity', 'marketValue'],
];

/** A column that is off against both others, or against book equity while the third fits, is off itself. */
function slipsOfWholeColumns(ground: FlagGround): FlaggedCell[] {
  const suspects = new Map<number, Map<number, { readonly slip: Slip; readonly usual: number }>>();
  for (const [role, other] of pairs) {
    const [column, base] = [ground.model[role], ground.model[other]];
    if (column === undefined || base === undefined) continue;
    for (const { code, slip, usual } of slippedRatios(ground, column, base)) {
      const known = suspects.get(code) ?? new Map<number, { slip: Slip; usual: number }>();
      known.set(column, { slip, usual });
      suspects.set(code, known);
    }
  }
  return [...suspects].flatMap(([code, found]) => {
    const { bookEquity } = ground.model;
    const isBase = found.size === 3 && bookEquity !== undefined;
    const wrong = isBase
      ? [bookEquity]
      : [...found.keys()].filter((column) => column !== bookEquity);
    return wrong.flatMap((column) => {
      const suspect = found.get(column);
      if (suspect === undefined) return [];
      const cells = ground.panel.values[column];
      return [...ground.rowsOf[code]]
        .filter((row) => Number.isFinite(cells[row]))
        .map((row): FlaggedCell => {
          const { slip, usual } = suspect;
          const facts = { code: 'unit-slip', ...slip, usual, against: 'other-columns' } as const;
          return { row, column, facts };
        });
    });
  });
}

function slippedRatios(
  { panel, rowsOf }: FlagGround,
  column: number,
  base: number,
): { readonly code: number; readonly slip: Slip; readonly usual: number }[] {
  const [cells, bases] = [panel.values[column], panel.values[base]];
  const ratios = rowsOf.map((rows) =>
    median(
      [...rows]
        .filter((row) => cells[row] !== 0 && bases[row] !== 0)
        .map((row) => Math.abs(cells[row] / bases[row]))
        .filter(Number.isFinite),
    ),
  );
  const known = ratios.filter((ratio) => !Number.isNaN(ratio));
  if (known.length < fewestPeers) return [];
  const usual = median(known);
  return ratios.flatMap((ratio, code) => {
    const slip = Number.isNaN(ratio) ? undefined : slipOf(ratio, usual);
    return slip === undefined ? [] : [{ code, slip, usual }];
  });
}
