import type { PanelColumn } from '@contract';
import { type DecimalSign, decimalSignIn, isPercent, parseNumber } from '@panel-data';
import { kindOf } from '../panel-rows';

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

/** Why a text that reads as a number is none of the column: `12%` is no amount of money. Undefined where it is one. */
export function misfitOf(text: string, column: PanelColumn): string | undefined {
  if (kindOf(column) !== 'money' || !isPercent(text)) return undefined;
  return 'a share in per cent is no amount of money';
}

function decimalSignOf(cells: readonly string[]): DecimalSign {
  const signs = cells.map(decimalSignIn);
  const count = (wanted: DecimalSign): number => signs.filter((sign) => sign === wanted).length;
  return count(',') > count('.') ? ',' : '.';
}
