import { type FigureFormats, type IntervalFigure, figureFormats as formatsOf } from '@figures';
import type { FigureKind, NumberFormat } from '../ui/number-format';

/**
 * How a chart writes its numbers: as the person wants them, aligned on the digits that `values` need together.
 * Reads signals of `numbers`, so a `computed` around it follows the unit switch.
 */
export function figureFormats(
  numbers: NumberFormat,
  kind: FigureKind,
  values: readonly (number | null)[],
): FigureFormats {
  return formatsOf(numbers.writer(), kind, values);
}

/** `2,970 (1,570 to 4,270)`, and why there is no interval where there is none. */
export function inWords(interval: IntervalFigure, formats: FigureFormats): string {
  const reason = interval.intervalReason === undefined ? '' : `: ${interval.intervalReason}`;
  return `${formats.value(interval.estimate)} (${formats.bounds(interval)}${reason})`;
}

/** A column's header with the unit that its figures are in: `value, EUR m`. */
export function withUnit(label: string, numbers: NumberFormat, kind: FigureKind): string {
  return kind === 'money' && numbers.unitLabel() !== ''
    ? `${label}, ${numbers.unitLabel()}`
    : label;
}
