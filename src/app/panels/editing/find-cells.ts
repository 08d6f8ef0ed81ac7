import { shifted } from '../../ui/shifted';
import { leadingColumns } from '../grid-places';
import type { GridPlace } from './cell-block';
import type { ShownGrid } from './copy-cells';
import { shiftOf } from './shown-figure';

/**
 * The cells whose company, year or value holds the text, row by row; where it holds a company and a year, as
 * `arvo 2021` does, the companies of the rows with both. A value is looked at in the unit that is shown, with every
 * digit and as its column rounds it; what stands between thousands is passed over.
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
  const pair = companyAndYear(wanted);
  const shifts = grid.columns.map((column) => shiftOf(column, grid.factor));
  const found: GridPlace[] = [];
  for (let at = 0; at < grid.rowCount; at++) {
    const row = grid.rowAt(at);
    if (row === undefined) continue;
    const company = row.company.toLowerCase();
    const hasBoth =
      pair !== undefined && company.includes(pair.company) && String(row.year).includes(pair.year);
    if (hasBoth || company.includes(wanted)) found.push({ row: at, column: 0 });
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

/** `arvo 2021`, `2021 arvo` or `arvo FY2021`: a part of a company's name and one of a year. */
function companyAndYear(
  text: string,
): { readonly company: string; readonly year: string } | undefined {
  const words = text.split(/\s+/);
  for (const [word, others] of [
    [words[words.length - 1], words.slice(0, -1)],
    [words[0], words.slice(1)],
  ] as const) {
    const year = /^(?:fy)?(\d{1,4})$/.exec(word)?.[1];
    if (year !== undefined && others.length > 0) return { company: others.join(' '), year };
  }
  return undefined;
}

/** The text as a part of a number, where it is one. */
function numberIn(text: string): string | undefined {
  const plain = text
    .replace(/[\s,\u00a0\u2009\u202f]/gu, '')
    .replace(/^\((.*)\)$/, '-$1')
    .replaceAll('\u2212', '-');
  return /^-?[\d.]*\d[\d.]*$/.test(plain) ? plain : undefined;
}
