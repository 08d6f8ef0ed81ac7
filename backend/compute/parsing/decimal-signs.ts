import { decimalSignIn } from '../../panel-data/numbers/decimal-sign-in';
import type { Grid } from './grid';
import type { DecimalSign } from '../../panel-data/numbers/parse-number';

/** How a column writes decimals, and whether its own numbers say so. */
export interface ColumnDecimals {
  readonly decimalSign: DecimalSign;
  /**
   * Row of the first cell that could be read both ways, where no number of the column tells and the other columns
   * decided; null where the column itself tells.
   */
  readonly ambiguousAt: number | null;
}

/** Rows of cells, and which of them hold no text but a number that is stored as one. */
type Cells = Pick<Grid, 'rows' | 'isNumber'>;

/**
 * Decides the decimal sign of each column by its own numbers: `1.5` and `1,234.5` speak for the dot, `1,5` and
 * `1.234,5` for the comma; `1,234` and `1.234` for neither. A column that says nothing follows the others, and the
 * dot where they say nothing either.
 *
 * @param columns  of the cells, in the order of the answer.
 */
export function decimalSigns(cells: Cells, columns: readonly number[]): ColumnDecimals[] {
  const evidence = evidenceIn(cells, columns);
  const dots = evidence.filter((column) => column.dots > column.commas).length;
  const commas = evidence.filter((column) => column.commas > column.dots).length;
  const common: DecimalSign = commas > dots ? ',' : '.';
  return evidence.map((column): ColumnDecimals => {
    if (column.commas > column.dots) return { decimalSign: ',', ambiguousAt: null };
    if (column.dots > 0) return { decimalSign: '.', ambiguousAt: null };
    return { decimalSign: common, ambiguousAt: column.ambiguousAt };
  });
}

interface Evidence {
  dots: number;
  commas: number;
  ambiguousAt: number | null;
}

/** Row by row, as the cells lie in memory. */
function evidenceIn({ rows, isNumber }: Cells, columns: readonly number[]): Evidence[] {
  const evidence = columns.map((): Evidence => ({ dots: 0, commas: 0, ambiguousAt: null }));
  for (let row = 0; row < rows.length; row++) {
    for (let k = 0; k < columns.length; k++) {
      if (isNumber?.(row, columns[k]) === true) continue;
      const sign = decimalSignIn(rows[row][columns[k]] ?? '');
      if (sign === '.') evidence[k].dots += 1;
      else if (sign === ',') evidence[k].commas += 1;
      else if (sign === 'either') evidence[k].ambiguousAt ??= row;
    }
  }
  return evidence;
}
