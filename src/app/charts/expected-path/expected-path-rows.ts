import type { ExpectedPathData } from '@figures';
import type { FigureKind, NumberFormat } from '../../ui/number-format';
import type { ChartRow } from '../chart-text';

/** Whether the band of the market value itself is known of any plan year. */
export function hasBand(plans: ExpectedPathData['plans']): boolean {
  return plans.some(({ years }) => years.some(({ bandLow }) => bandLow != null));
}

/** What the lines show, as rows of a table: line, year, actual, expected, low, high, and the band if one has it. */
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
  const isBanded = hasBand(plans);
  const noBand = isBanded ? ['', ''] : [];
  const figure = (value: number | null | undefined) => numbers.figure(value, kind, digits);
  return [
    ...ownYears.map(({ year, actual, fitted }) => ({
      isOwn: true,
      cells: ['own company', String(year), figure(actual), figure(fitted), '', '', ...noBand],
    })),
    ...base.map(({ year, estimate }) => ({
      cells: ['base', String(year), '', figure(estimate), '', '', ...noBand],
    })),
    ...plans.flatMap(({ name, years }) =>
      years.map(({ year, estimate, low, high, bandLow, bandHigh }) => ({
        cells: [
          name,
          String(year),
          '',
          figure(estimate),
          figure(low),
          figure(high),
          ...(isBanded ? [figure(bandLow), figure(bandHigh)] : []),
        ],
      })),
    ),
  ];
}
