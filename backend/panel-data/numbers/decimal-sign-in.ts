import { bareNumber } from './bare-number';
import type { DecimalSign } from './parse-number';

/** Most cells. */
const plainDecimal = /^\d+\.\d+$/u;

/** The decimal sign that one cell proves; undefined where it has neither sign or is no number. */
export function decimalSignIn(cell: string): DecimalSign | 'either' | undefined {
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
