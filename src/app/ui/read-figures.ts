import { type DecimalSign, decimalSignIn, parseNumber } from '@panel-data';

/**
 * Reads a block of figures as people write them. Which of point and comma is the decimal sign, the block decides as a
 * whole by what only one reading explains; where nothing tells, it is the point.
 *
 * @returns null for a cell that says there is no value, undefined for any other text.
 */
export function readFigures(
  block: readonly (readonly string[])[],
): (number | null | undefined)[][] {
  const decimal = decimalSignOf(block.flat());
  return block.map((cells) =>
    cells.map((text) => {
      const value = parseNumber(text, decimal);
      if (value === undefined) return undefined;
      // A pasted −0 is 0.
      return Number.isNaN(value) ? null : value + 0;
    }),
  );
}

function decimalSignOf(cells: readonly string[]): DecimalSign {
  const signs = cells.map(decimalSignIn);
  const count = (wanted: DecimalSign): number => signs.filter((sign) => sign === wanted).length;
  return count(',') > count('.') ? ',' : '.';
}
