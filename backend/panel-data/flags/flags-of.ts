import type { PanelCells } from '../panel-cells';
import { duplicateFlags } from './duplicate-flags';
import { duplicateNameFlags } from './duplicate-name-flags';
import type { Flag, FlagCode, FlaggedCell } from './flag';
import { type FlagGround, flagGround } from './flag-ground';
import { jumpFlags } from './jump-flags';
import { missingFlags } from './missing-flags';
import { peerOutlierFlags } from './peer-outlier-flags';
import { signFlags } from './sign-flags';
import { staleCopyFlags } from './stale-copy-flags';
import { unitSlipFlags } from './unit-slip-flags';
import { yearGaps } from './year-gaps';

/** The rules of single cells, in the order in which a cell's flags are told. */
const cellRules: readonly ((ground: FlagGround) => FlaggedCell[])[] = [
  missingFlags,
  duplicateFlags,
  signFlags,
  unitSlipFlags,
  staleCopyFlags,
  jumpFlags,
  peerOutlierFlags,
];

export const flagCodes: readonly FlagCode[] = [
  'missing',
  'duplicate',
  'sign',
  'unit-slip',
  'stale-copy',
  'jump',
  'peer-outlier',
  'year-gap',
];

/**
 * Everything about a panel's cells that somebody should look at, by company, year and column. A unit slip explains its
 * cell's jump, and that of the year after it: those are not told a second time.
 */
export function flagsOf(panel: PanelCells): readonly Flag[] {
  const ground = flagGround(panel);
  const found = cellRules.flatMap((rule) => rule(ground));
  const slips = new Set(
    found
      .filter(({ facts }) => facts.code === 'unit-slip')
      .map(({ row, column }) => key(row, column)),
  );
  const before = rowBefore(ground);
  const isExplained = ({ row, column, facts }: FlaggedCell): boolean =>
    (facts.code === 'jump' &&
      (slips.has(key(row, column)) || slips.has(key(before[row], column)))) ||
    (facts.code === 'peer-outlier' && slips.has(key(row, column)));
  const flags = found.filter((cell) => !isExplained(cell)).map((cell) => toFlag(panel, cell));
  return [...flags, ...duplicateNameFlags(ground), ...yearGaps(ground)].sort(byPlace);
}

function key(row: number, column: number): string {
  return `${row}:${column}`;
}

/** The row of the same company before each row; −1 for a company's first. */
function rowBefore({ panel, rowsOf }: FlagGround): Int32Array {
  const before = new Int32Array(panel.year.length).fill(-1);
  for (const rows of rowsOf)
    for (let place = 1; place < rows.length; place++) before[rows[place]] = rows[place - 1];
  return before;
}

function toFlag(panel: PanelCells, { row, column, facts }: FlaggedCell): Flag {
  const value = panel.values[column][row];
  return {
    company: panel.companies[panel.company[row]],
    year: panel.year[row],
    column,
    value: Number.isNaN(value) ? null : value,
    facts,
  };
}

function byPlace(left: Flag, right: Flag): number {
  if (left.company !== right.company) return left.company < right.company ? -1 : 1;
  if (left.year !== right.year) return left.year - right.year;
  return (left.column ?? -1) - (right.column ?? -1);
}
