import { leastSquares } from '../linear-algebra/least-squares';
import { solveUpperTransposed } from '../linear-algebra/triangular';
import type { PanelRow } from './golden-panels';

/** Weights of a contrast: by company name, and by regressor. */
export interface DenseContrast {
  readonly intercepts: Readonly<Record<string, number>>;
  readonly slopes: readonly number[];
}

/** What makes the error of a contrast, beside its weights. */
export interface DenseChoice {
  /** ρ by company. */
  readonly persistence: (company: string) => number;
  readonly cosines: number;
  /** Whether the rows of the companies that the contrast weighs drive its cosines, rather than the calendar. */
  readonly hasOwnClock: boolean;
}

/**
 * The calibrated standard error of a contrast, row by row from the full dummy regression and matrices written out:
 * the definition itself, slow and without any of the engine's shortcuts.
 *
 * @param rows  sorted by company and year, every company with two rows or more.
 */
export function denseError(
  rows: readonly PanelRow[],
  contrast: DenseContrast,
  { persistence, cosines, hasOwnClock }: DenseChoice,
): number {
  const companies = [...new Set(rows.map(({ company }) => company))];
  const columns = [
    ...companies.map((name) => Float64Array.from(rows, (row) => (row.company === name ? 1 : 0))),
    ...contrast.slopes.map((_, k) => Float64Array.from(rows, (row) => row.regressors[k])),
  ];
  const outcome = Float64Array.from(rows, (row) => row.outcome);
  const { basis, r, residuals } = leastSquares(columns, outcome);
  const weights = [...companies.map((name) => contrast.intercepts[name] ?? 0), ...contrast.slopes];
  const inner = solveUpperTransposed(r, weights);
  const direct = rows.map((_, row) =>
    basis.reduce((sum, column, k) => sum + column[row] * inner[k], 0),
  );
  const years = [...new Set(rows.map(({ year }) => year))].sort((left, right) => left - right);
  const count = years.length;
  const places = hasOwnClock
    ? ownPlaces(rows, contrast.intercepts, years)
    : years.map((_, place) => (place + 0.5) / count);
  const weighted = Array.from({ length: cosines }, (_, index) =>
    direct.map((value, row) => {
      const place = places[years.indexOf(rows[row].year)];
      return Math.sqrt(2 / count) * Math.cos(Math.PI * (index + 1) * place) * value;
    }),
  );
  const left = weighted.map((values) => {
    const fitted = basis.map((column) =>
      column.reduce((sum, value, row) => sum + value * values[row], 0),
    );
    return values.map((value, row) =>
      basis.reduce((rest, column, k) => rest - column[row] * fitted[k], value),
    );
  });
  const form = (values: readonly number[]): number => correlated(rows, values, persistence);
  const mean = (values: readonly number[]): number =>
    values.reduce((sum, value) => sum + value, 0) / values.length;
  const calibration = Math.max(1, form(direct) / (count * mean(left.map(form))));
  const squares = weighted.map(
    (values) => values.reduce((sum, value, row) => sum + value * residuals[row], 0) ** 2,
  );
  return Math.sqrt(count * mean(squares) * calibration);
}

/** The share of Σ_i (w_i/T_i)² over rows that lies before the middle of each year. */
function ownPlaces(
  rows: readonly PanelRow[],
  intercepts: DenseContrast['intercepts'],
  years: readonly number[],
): number[] {
  const rowsOf = (company: string): number => rows.filter((row) => row.company === company).length;
  const within = (isIncluded: (year: number) => boolean): number =>
    rows
      .filter(({ year }) => isIncluded(year))
      .reduce((sum, { company }) => sum + ((intercepts[company] ?? 0) / rowsOf(company)) ** 2, 0);
  const all = within(() => true);
  return years.map(
    (middle) => (within((year) => year < middle) + within((year) => year === middle) / 2) / all,
  );
}

/** Σ_i v_i'R_iv_i. */
function correlated(
  rows: readonly PanelRow[],
  values: readonly number[],
  persistence: (company: string) => number,
): number {
  let sum = 0;
  rows.forEach((one, first) => {
    rows.forEach((other, second) => {
      if (one.company !== other.company) return;
      const correlation = persistence(one.company) ** Math.abs(one.year - other.year);
      sum += values[first] * correlation * values[second];
    });
  });
  return sum;
}
