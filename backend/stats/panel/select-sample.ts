import type { DroppedRow, PanelColumns, Specification } from '../fit-result';
import { StatsError } from '../stats-error';
import { type AskedCompanies, askedCompanies } from './asked-companies';
import { checkColumns } from './check-columns';
import { type ModelColumns, modelColumns, refuseNotPositive } from './model-columns';
import type { PanelSample, SingleRow } from './panel-sample';
import { sortedRows } from './sorted-rows';
import { yearPositions } from './year-positions';

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
  const { hasMissing } = checkColumns(data);
  const asked = askedCompanies(data, own, members);
  const rows = sortedRows(data, asked);
  const columns = modelColumns(data, { rows, place: asked.place }, lag);
  const { complete, dropped } =
    hasMissing || lag > 0 ? splitComplete(data, columns, rows) : { complete: rows, dropped: [] };
  if (form === 'log') refuseNotPositive(data, columns, complete);
  const { kept, starts, singles } = groupByCompany(data, asked, complete);
  if (starts.length < 3) {
    const found = starts.length - 1;
    throw new StatsError(
      'too-few-companies',
      `expected at least 2 companies with 2 complete rows each; found ${found}`,
      { companies: found === 0 ? [] : [nameOf(data, kept[0])] },
    );
  }
  return {
    ...gather(data, columns, { rows: kept, starts, form }),
    singles: singles.map((row) => singleRow(data, columns, { row, form })),
    dropped,
    members: asked.names,
  };
}

function nameOf(data: PanelColumns, row: number): string {
  return data.companies[data.company[row]];
}

/** Rows with every value, and what the others lack. */
function splitComplete(
  data: PanelColumns,
  { outcome, regressors }: ModelColumns,
  rows: Int32Array,
): { readonly complete: Int32Array; readonly dropped: DroppedRow[] } {
  const values = [outcome, ...regressors];
  const names = [data.outcome, ...data.regressors].map(({ name }) => name);
  const dropped: DroppedRow[] = [];
  const isMissing = new Uint8Array(data.company.length);
  values.forEach((column, index) => {
    for (let place = 0; place < rows.length; place += 1) {
      const row = rows[place];
      if (!Number.isNaN(column[row])) continue;
      isMissing[row] = 1;
      dropped.push({
        company: nameOf(data, row),
        year: data.year[row],
        row: data.fileRow[row],
        column: names[index],
        reason: 'missing',
      });
    }
  });
  if (dropped.length === 0) return { complete: rows, dropped };
  return {
    complete: rows.filter((row) => isMissing[row] === 0),
    dropped: dropped.sort((left, right) => left.row - right.row),
  };
}

interface Groups {
  /** Rows of the companies with two or more. */
  readonly kept: Int32Array;
  /** Company i holds kept[starts[i]] … kept[starts[i + 1] − 1]. */
  readonly starts: Int32Array;
  readonly singles: readonly number[];
}

function groupByCompany(
  { company }: PanelColumns,
  { place }: AskedCompanies,
  rows: Int32Array,
): Groups {
  const starts = [0];
  const singles: number[] = [];
  let kept = rows;
  let count = 0;
  for (let from = 0; from < rows.length;) {
    const own = place[company[rows[from]]];
    let to = from + 1;
    while (to < rows.length && place[company[rows[to]]] === own) to += 1;
    if (to - from === 1) {
      if (singles.length === 0) kept = rows.slice();
      singles.push(rows[from]);
    } else {
      if (singles.length > 0) kept.copyWithin(count, from, to);
      count += to - from;
      starts.push(count);
    }
    from = to;
  }
  return { kept: kept.subarray(0, count), starts: Int32Array.from(starts), singles };
}

function gather(
  data: PanelColumns,
  columns: ModelColumns,
  { rows, starts, form }: SampleRows,
): Omit<PanelSample, 'singles' | 'dropped' | 'members'> {
  const areAllRows = areAll(rows, data.company.length);
  const year = areAllRows ? data.year : pickWhole(data.year, rows);
  const { years, position } = yearPositions(year, starts);
  if (years.length > mostYears) {
    throw new StatsError(
      'too-many-years',
      `expected at most ${mostYears} different fiscal years; found ${years.length}: is this the year's column?`,
    );
  }
  const taken = areAllRows
    ? (values: Float64Array): Float64Array => values
    : (values: Float64Array): Float64Array => pick(values, rows);
  const levels = {
    outcome: taken(columns.outcome),
    regressors: columns.regressors.map(taken),
  };
  return {
    companies: companiesOf(data, rows, starts),
    starts,
    year,
    position,
    years,
    outcome: inForm(levels.outcome, form),
    regressors: levels.regressors.map((values) => inForm(values, form)),
    levels,
    fileRow: areAllRows ? data.fileRow : pickWhole(data.fileRow, rows),
    outcomeName: data.outcome.name,
    regressorNames: data.regressors.map(({ name }) => name),
  };
}

function companiesOf(data: PanelColumns, rows: Int32Array, starts: Int32Array): string[] {
  const names: string[] = [];
  for (let index = 0; index < starts.length - 1; index += 1) {
    names.push(nameOf(data, rows[starts[index]]));
  }
  return names;
}

interface SampleRows {
  readonly rows: Int32Array;
  readonly starts: Int32Array;
  readonly form: ColumnForm['form'];
}

/** Whether the rows are all rows in their order: then a column is taken as it is, for nobody writes to one. */
function areAll(rows: Int32Array, count: number): boolean {
  if (rows.length !== count) return false;
  for (let index = 0; index < count; index += 1) if (rows[index] !== index) return false;
  return true;
}

function pickWhole(values: Int32Array, rows: Int32Array): Int32Array {
  const picked = new Int32Array(rows.length);
  for (let index = 0; index < rows.length; index += 1) picked[index] = values[rows[index]];
  return picked;
}

function pick(values: Float64Array, rows: Int32Array): Float64Array {
  const picked = new Float64Array(rows.length);
  for (let index = 0; index < rows.length; index += 1) picked[index] = values[rows[index]];
  return picked;
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
    company: nameOf(data, row),
    year: data.year[row],
    fileRow: data.fileRow[row],
    outcome: scaled(levels.outcome),
    regressors: levels.regressors.map(scaled),
    levels,
  };
}
