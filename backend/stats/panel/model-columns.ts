import type { PanelColumns, Specification } from '../fit-result';
import { type RowPlace, StatsError } from '../stats-error';

/** The columns of the model: lagged where the specification asks, still in the panel's measure. */
export interface ModelColumns {
  readonly outcome: Float64Array;
  readonly regressors: readonly Float64Array[];
  /** Row of the panel that each row's regressors come from, −1 where there is none; null where it is the row itself. */
  readonly source: Int32Array | null;
}

/**
 * Replaces every regressor by its value one calendar year earlier of the same company; a gap gives missing.
 *
 * @param rows  rows of the members, sorted by company and year.
 * @param place  of each company code, the same for codes of one company.
 */
export function modelColumns(
  data: PanelColumns,
  { rows, place }: { readonly rows: Int32Array; readonly place: Int32Array },
  lag: Specification['lag'],
): ModelColumns {
  const outcome = data.outcome.values;
  if (lag === 0) {
    return { outcome, regressors: data.regressors.map(({ values }) => values), source: null };
  }
  const { company, year } = data;
  const source = new Int32Array(outcome.length).fill(-1);
  for (let index = 1; index < rows.length; index += 1) {
    const before = rows[index - 1];
    const row = rows[index];
    const isSame = place[company[before]] === place[company[row]];
    if (isSame && year[row] - year[before] === 1) source[row] = before;
  }
  const regressors = data.regressors.map(({ values }) =>
    Float64Array.from(source, (from) => (from === -1 ? NaN : values[from])),
  );
  return { outcome, regressors, source };
}

/** @throws {StatsError} 'not-positive' with every row of the sample whose logarithm does not exist. */
export function refuseNotPositive(
  data: PanelColumns,
  columns: ModelColumns,
  rows: Int32Array,
): void {
  const places = new Map<string, RowPlace>();
  const note = (row: number, name: string): void => {
    places.set(`${row} ${name}`, {
      row: data.fileRow[row],
      company: data.companies[data.company[row]],
      year: data.year[row],
      column: name,
    });
  };
  for (const row of rows) {
    if (!(columns.outcome[row] > 0)) note(row, data.outcome.name);
    columns.regressors.forEach((values, k) => {
      if (!(values[row] > 0)) note(columns.source?.[row] ?? row, data.regressors[k].name);
    });
  }
  if (places.size === 0) return;
  const list = [...places.values()].sort((left, right) => left.row - right.row);
  const names = [...new Set(list.map(({ column }) => column ?? ''))];
  throw new StatsError(
    'not-positive',
    `the log form needs numbers above zero; found ${list.length} of zero or less in ${names.join(', ')}`,
    { rows: list, columns: names },
  );
}
