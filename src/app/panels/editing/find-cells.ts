import { leadingColumns } from '../grid-places';
import type { GridPlace } from './cell-block';
import type { ShownGrid } from './copy-cells';
import { shiftOf, shifted } from './shown-figure';

/**
 * The cells whose company, year or value holds the text, row by row. A value is looked at in the unit that is shown,
 * with every digit and as its column rounds it; what stands between thousands is passed over.
 *
 * @param digits  digits after the point by column of the panel.
 */
export function findCells(
  text: string,
  grid: ShownGrid,
  digits: readonly number[],
): readonly GridPlace[] {
  const wanted = text.trim().toLowerCase();
  if (wanted === '') return [];
  const number = numberIn(wanted);
  const shifts = grid.columns.map((column) => shiftOf(column, grid.factor));
  const found: GridPlace[] = [];
  for (let at = 0; at < grid.rowCount; at++) {
    const row = grid.rowAt(at);
    if (row === undefined) continue;
    if (row.company.toLowerCase().includes(wanted)) found.push({ row: at, column: 0 });
    if (String(row.year).includes(wanted)) found.push({ row: at, column: 1 });
    if (number === undefined) continue;
    row.values.forEach((value, column) => {
      if (value === null) return;
      const shown = shifted(value, shifts[column]);
      if (String(shown).includes(number) || shown.toFixed(digits[column]).includes(number))
        found.push({ row: at, column: column + leadingColumns });
    });
  }
  return found;
}

/** The text as a part of a number, where it is one. */
function numberIn(text: string): string | undefined {
  const plain = text
    .replace(/[\s,\u00a0\u2009\u202f]/gu, '')
    .replace(/^\((.*)\)$/, '-$1')
    .replaceAll('\u2212', '-');
  return /^-?[\d.]*\d[\d.]*$/.test(plain) ? plain : undefined;
}
