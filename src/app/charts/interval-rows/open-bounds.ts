import { type IntervalRow, fixedText } from '@figures';
import type { FigureKind, NumberFormat } from '../../ui/number-format';

type Figure = NonNullable<IntervalRow['figure']>;

/**
 * What decides the digits of a figure: itself, unless its interval is so wide that its own digits would say nothing.
 * In the scale of the figure; for a column's digits.
 */
export function digitsBy({ estimate, low, high }: Figure): number {
  const half = low === null || high === null ? 0 : (high - low) / 2;
  return Math.max(Math.abs(estimate), half / 10);
}

/** `0.92 to 2.76`; `0.92 and up` where there is no upper end. */
export function openBounds(
  figure: Figure,
  numbers: NumberFormat,
  { kind, digits }: { readonly kind: FigureKind; readonly digits: number },
): string {
  const { low, high, unbounded } = figure;
  const written = (value: number) =>
    fixedText(numbers.shown(value, kind), digits, numbers.locale());
  if (unbounded === 'both') return 'open at both ends';
  if (unbounded === 'low' && high !== null) return `${written(high)} and down`;
  if (unbounded === 'high' && low !== null) return `${written(low)} and up`;
  return numbers.bounds(figure, kind, digits);
}
