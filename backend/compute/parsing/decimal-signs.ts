import { bareNumber } from './bare-number';
import type { DecimalSign } from './parse-number';

/** How a column writes decimals, and whether its own numbers say so. */
export interface ColumnDecimals {
  readonly decimalSign: DecimalSign;
  /**
   * Position of the first cell that could be read both ways, where no number of the column tells and the other columns
   * decided; null where the column itself tells.
   */
  readonly ambiguousAt: number | null;
}

interface Evidence {
  readonly dots: number;
  readonly commas: number;
  readonly ambiguousAt: number | null;
}

/** The texts of a column by position; undefined where the cell is no text but a number that is stored as one. */
export interface ColumnTexts {
  readonly length: number;
  readonly textAt: (position: number) => string | undefined;
}

/**
 * Decides the decimal sign of each column by its own numbers: `1.5` and `1,234.5` speak for the dot, `1,5` and
 * `1.234,5` for the comma; `1,234` and `1.234` for neither. A column that says nothing follows the others, and the
 * dot where they say nothing either.
 */
export function decimalSigns(columns: readonly ColumnTexts[]): ColumnDecimals[] {
  const evidence = columns.map(evidenceOf);
  const dots = evidence.filter((column) => column.dots > column.commas).length;
  const commas = evidence.filter((column) => column.commas > column.dots).length;
  const common: DecimalSign = commas > dots ? ',' : '.';
  return evidence.map((column): ColumnDecimals => {
    if (column.commas > column.dots) return { decimalSign: ',', ambiguousAt: null };
    if (column.dots > 0) return { decimalSign: '.', ambiguousAt: null };
    return { decimalSign: common, ambiguousAt: column.ambiguousAt };
  });
}

function evidenceOf({ length, textAt }: ColumnTexts): Evidence {
  let dots = 0;
  let commas = 0;
  let ambiguousAt: number | null = null;
  for (let position = 0; position < length; position++) {
    const text = textAt(position);
    const sign = text === undefined ? undefined : decimalSignIn(text);
    if (sign === '.') dots += 1;
    else if (sign === ',') commas += 1;
    else if (sign === 'either') ambiguousAt ??= position;
  }
  return { dots, commas, ambiguousAt };
}

/** The decimal sign that one cell proves; undefined where it has neither sign or is no number. */
function decimalSignIn(cell: string): DecimalSign | 'either' | undefined {
  if (!cell.includes('.') && !cell.includes(',')) return undefined;
  if (/^\d+\.\d+$/u.test(cell) && !/^[1-9]\d{0,2}\.\d{3}$/u.test(cell)) return '.';
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
