import { bareNumber } from './bare-number';
import type { Grid } from './grid';
import type { DecimalSign } from './parse-number';

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

/** Most cells. */
const plainDecimal = /^\d+\.\d+$/u;

/** The decimal sign that one cell proves; undefined where it has neither sign or is no number. */
function decimalSignIn(cell: string): DecimalSign | 'either' | undefined {
  if (!cell.includes('.') && !cell.includes(',')) return undefined;
  if (plainDecimal.test(cell)) {
    const whole = cell.indexOf('.');
    const isGroup = whole <= 3 && cell.length - whole === 4 && !cell.startsWith('0');
    return isGroup ? 'either' : '.';
  }
  const digits = bareNumber(cell.trim()).digits.replace(/[eE][+-]?\d+$/u, '');
  if (!/^[\d.,’' \u00a0\u2007\u2009\u202f]+$/u.test(digits)) return undefined;
  const lastDot = digits.lastIndexOf('.');
  const lastComma = digits.lastIndexOf(',');
  if (lastDot === -1 && lastComma === -1) return undefined;
  if (lastDot !== -1 && lastComma !== -1) return lastDot > lastComma ? '.' : ',';
  const sign = lastDot === -1 ? ',' : '.';
  const other = sign === '.' ? ',' : '.';
  if (digits.indexOf(sign) !== digits.lastIndexOf(sign)) return other;
  return /^[1-9]\d{0,2}[.,]\d{3}$/u.test(digits) ? 'either' : sign;
}
