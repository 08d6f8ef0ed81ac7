import type { NumberFormat } from '../../ui/number-format';

/** Whole degrees of freedom as they are, Satterthwaite's at two places. */
export function degreesText(value: number | null, numbers: NumberFormat): string {
  if (value === null) return 'n/a';
  return Number.isInteger(value) ? numbers.headline(value, 'count') : value.toFixed(2);
}

/** A p value in a column: `< 0.001`, `0.034`. */
export function pCell(pValue: number | null): string {
  if (pValue === null) return 'n/a';
  return pValue < 0.001 ? '< 0.001' : pValue.toFixed(3);
}
