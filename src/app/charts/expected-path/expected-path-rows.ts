import type { ExpectedPathData } from '@figures';
import type { FigureKind, NumberFormat } from '../../ui/number-format';
import type { ChartRow } from '../chart-text';

/** What the lines show, as rows of a table: line, year, actual, expected, low, high. */
export function expectedPathRows(
  { ownYears, base, plans }: ExpectedPathData,
  numbers: NumberFormat,
  kind: FigureKind,
): ChartRow[] {
  const seen = [
    ...ownYears.flatMap(({ actual, fitted }) => [actual, fitted]),
    ...base.map(({ estimate }) => estimate),
    ...plans.flatMap(({ years }) =>
      years.flatMap(({ estimate, low, high }) => [estimate, low, high]),
    ),
  ];
  const digits = numbers.columnDigits(seen, kind);
  const figure = (value: number | null) => numbers.figure(value, kind, digits);
  return [
    ...ownYears.map(({ year, actual, fitted }) => ({
      isOwn: true,
      cells: ['own company', String(year), figure(actual), figure(fitted), '', ''],
    })),
    ...base.map(({ year, estimate }) => ({
      cells: ['base', String(year), '', figure(estimate), '', ''],
    })),
    ...plans.flatMap(({ name, years }) =>
      years.map(({ year, estimate, low, high }) => ({
        cells: [name, String(year), '', figure(estimate), figure(low), figure(high)],
      })),
    ),
  ];
}
