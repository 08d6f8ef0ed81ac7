import type { ExpectedPathData } from '@figures';
import type { FigureKind, NumberFormat } from '../../ui/number-format';
import type { ChartRow } from '../chart-text';
import { exactFigure } from '../exact-figure';

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
  const row = (
    [line, year]: readonly [string, number],
    figures: readonly (number | null | undefined)[],
    isOwn = false,
  ): ChartRow => {
    const shown = isBanded ? figures : figures.slice(0, 4);
    return {
      isOwn,
      // Undefined is what a line does not have, null what is missing of it.
      cells: [
        ...[line, String(year)],
        ...shown.map((value) => (value === undefined ? '' : numbers.figure(value, kind, digits))),
      ],
      values: [line, year, ...shown.map((value) => exactFigure(value, numbers, kind))],
    };
  };
  const none = undefined;
  return [
    ...ownYears.map(({ year, actual, fitted }) =>
      row(['own company', year], [actual, fitted, none, none, none, none], true),
    ),
    ...base.map(({ year, estimate }) =>
      row(['base', year], [none, estimate, none, none, none, none]),
    ),
    ...plans.flatMap(({ name, years }) =>
      years.map(({ year, estimate, low, high, bandLow, bandHigh }) =>
        row([name, year], [none, estimate, low, high, bandLow ?? null, bandHigh ?? null]),
      ),
    ),
  ];
}
