import type { DroppedRow, PanelColumns, Specification } from '../fit-result';
import { type RowPlace, StatsError } from '../stats-error';
import { checkColumns } from './check-columns';
import { type ModelColumns, modelColumns, refuseNotPositive } from './model-columns';
import type { PanelSample, SingleRow } from './panel-sample';

/** How a specification changes the columns before anything is estimated. */
export type ColumnForm = Pick<Specification, 'form' | 'lag'>;

/** More different years than this is no panel of fiscal years but a wrong column. */
const mostYears = 1000;

/**
 * Takes the rows of the members that have every value, sorts them by company and year, and sets companies with a
 * single row apart before anything is counted. Regressors are lagged and logarithms taken where the form says so.
 *
 * @param own  is added to the members; null where the fit has no own company.
 * @param members  names; undefined means every company of the data.
 * @throws {StatsError} 'shape', 'non-finite', 'unknown-company', 'duplicate-rows', 'too-few-companies', 'too-many-years',
 *   'not-positive'.
 */
export function selectSample(
  data: PanelColumns,
  own: string | null,
  members: readonly string[] | undefined,
  { form, lag }: ColumnForm = { form: 'levels', lag: 0 },
): PanelSample {
  checkColumns(data);
  const asked = memberNames(data, own, members);
  const rows = sortedRows(data, new Set(asked));
  refuseDuplicates(data, rows);
  const columns = modelColumns(data, rows, lag);
  const values = [columns.outcome, ...columns.regressors];
  const names = [data.outcome, ...data.regressors].map(({ name }) => name);
  const dropped = rows.flatMap((row): DroppedRow[] =>
    names
      .filter((_, index) => Number.isNaN(values[index][row]))
      .map((column) => ({ row: data.fileRow[row], column, reason: 'missing' })),
  );
  const complete = rows.filter((row) => values.every((column) => !Number.isNaN(column[row])));
  if (form === 'log') refuseNotPositive(data, columns, complete);
  const groups = groupByCompany(data, complete);
  const kept = groups.filter((group) => group.length > 1);
  if (kept.length < 2) {
    throw new StatsError(
      'too-few-companies',
      `expected at least 2 companies with 2 complete rows each; found ${kept.length}`,
      { companies: kept.map((group) => data.companies[data.company[group[0]]]) },
    );
  }
  return {
    ...gather(data, columns, { groups: kept, form }),
    singles: groups
      .filter((group) => group.length === 1)
      .map(([row]) => singleRow(data, columns, { row, form })),
    dropped: dropped.sort((left, right) => left.row - right.row),
    members: asked,
  };
}

function memberNames(
  data: PanelColumns,
  own: string | null,
  members: readonly string[] | undefined,
): string[] {
  const present = new Set<string>();
  data.company.forEach((code) => present.add(data.companies[code]));
  const names = new Set(members ?? present);
  if (own !== null) names.add(own);
  const unknown = [...names].filter((name) => !present.has(name));
  if (unknown.length > 0) {
    throw new StatsError(
      'unknown-company',
      `expected rows with a year in the panel for every company; found none for ${unknown.join(', ')}`,
      { companies: unknown },
    );
  }
  return [...names].sort(byCodeUnit);
}

/** The same order on every machine, whatever its language. */
function byCodeUnit(left: string, right: string): number {
  if (left === right) return 0;
  return left < right ? -1 : 1;
}

function sortedRows(data: PanelColumns, members: ReadonlySet<string>): number[] {
  const order = data.companies
    .map((name, code) => ({ name, code }))
    .sort((left, right) => byCodeUnit(left.name, right.name) || left.code - right.code);
  const place = new Int32Array(data.companies.length);
  order.forEach(({ name, code }, index) => {
    const before = order[index - 1];
    place[code] = before?.name === name ? place[before.code] : index;
  });
  const rows: number[] = [];
  data.company.forEach((code, row) => {
    if (members.has(data.companies[code])) rows.push(row);
  });
  return rows.sort(
    (left, right) =>
      place[data.company[left]] - place[data.company[right]] ||
      data.year[left] - data.year[right] ||
      data.fileRow[left] - data.fileRow[right],
  );
}

function refuseDuplicates(data: PanelColumns, rows: readonly number[]): void {
  const isSame = (left: number | undefined, right: number | undefined): boolean =>
    left !== undefined &&
    right !== undefined &&
    data.year[left] === data.year[right] &&
    data.companies[data.company[left]] === data.companies[data.company[right]];
  const places = rows
    .filter((row, index) => isSame(rows[index - 1], row) || isSame(row, rows[index + 1]))
    .map((row): RowPlace => ({
      row: data.fileRow[row],
      company: data.companies[data.company[row]],
      year: data.year[row],
    }));
  if (places.length === 0) return;
  throw new StatsError(
    'duplicate-rows',
    `expected one row a company and year; found ${places.length} rows that share theirs with another`,
    { rows: places, companies: [...new Set(places.flatMap(({ company }) => company ?? []))] },
  );
}

function groupByCompany(data: PanelColumns, rows: readonly number[]): number[][] {
  const groups: number[][] = [];
  let last: string | undefined;
  for (const row of rows) {
    const company = data.companies[data.company[row]];
    if (company !== last) groups.push([]);
    groups[groups.length - 1].push(row);
    last = company;
  }
  return groups;
}

function gather(
  data: PanelColumns,
  columns: ModelColumns,
  { groups, form }: { readonly groups: readonly number[][]; readonly form: ColumnForm['form'] },
): Omit<PanelSample, 'singles' | 'dropped' | 'members'> {
  const rows = groups.flat();
  const starts = new Int32Array(groups.length + 1);
  groups.forEach((group, index) => (starts[index + 1] = starts[index] + group.length));
  const year = Int32Array.from(rows, (row) => data.year[row]);
  const years = [...new Set(year)].sort((left, right) => left - right);
  if (years.length > mostYears) {
    throw new StatsError(
      'too-many-years',
      `expected at most ${mostYears} different fiscal years; found ${years.length}: is this the year's column?`,
    );
  }
  const levels = {
    outcome: Float64Array.from(rows, (row) => columns.outcome[row]),
    regressors: columns.regressors.map((values) => Float64Array.from(rows, (row) => values[row])),
  };
  return {
    companies: groups.map((group) => data.companies[data.company[group[0]]]),
    starts,
    year,
    position: Int32Array.from(year, (value) => years.indexOf(value)),
    years,
    outcome: inForm(levels.outcome, form),
    regressors: levels.regressors.map((values) => inForm(values, form)),
    levels,
    fileRow: Int32Array.from(rows, (row) => data.fileRow[row]),
    outcomeName: data.outcome.name,
    regressorNames: data.regressors.map(({ name }) => name),
  };
}

function inForm(values: Float64Array, form: ColumnForm['form']): Float64Array {
  return form === 'log' ? values.map(Math.log) : values;
}

function singleRow(
  data: PanelColumns,
  columns: ModelColumns,
  { row, form }: { readonly row: number; readonly form: ColumnForm['form'] },
): SingleRow {
  const levels = {
    outcome: columns.outcome[row],
    regressors: columns.regressors.map((values) => values[row]),
  };
  const scaled = (value: number): number => (form === 'log' ? Math.log(value) : value);
  return {
    company: data.companies[data.company[row]],
    year: data.year[row],
    fileRow: data.fileRow[row],
    outcome: scaled(levels.outcome),
    regressors: levels.regressors.map(scaled),
    levels,
  };
}
