import type { NamedColumn, PanelColumns } from '../fit-result';
import { type RowPlace, StatsError } from '../stats-error';

/** Fourth powers of larger numbers leave the range of a double. */
const largestMagnitude = 1e60;

/** Fourth powers of a column that holds nothing but smaller numbers vanish, and with them its slope's error. */
const smallestMagnitude = 1e-60;

/**
 * Refuses columns that do not fit together, numbers that are infinite or too large, and columns of numbers that are all
 * too small. A column of zeros is not refused here: it never varies, which the design says.
 *
 * @returns whether a cell of outcome or regressors is missing.
 * @throws {StatsError} 'shape', or 'non-finite' with every place or column.
 */
export function checkColumns(data: PanelColumns): { readonly hasMissing: boolean } {
  const rows = data.company.length;
  const columns = [data.outcome, ...data.regressors];
  if (data.regressors.length === 0) {
    throw new StatsError('shape', 'expected at least one regressor; found none');
  }
  for (const { name, values } of columns) refuseLength(name, values.length, rows);
  refuseLength('year', data.year.length, rows);
  refuseLength('fileRow', data.fileRow.length, rows);
  const names = columns.map(({ name }) => name);
  const twice = names.filter((name, index) => names.indexOf(name) !== index);
  if (twice.length > 0) {
    throw new StatsError('shape', `expected each column once; found ${twice.join(', ')} twice`, {
      columns: twice,
    });
  }
  if (!areCodes(data.company, data.companies.length)) {
    throw new StatsError('shape', 'expected company codes to point into the list of companies');
  }
  const extents = columns.map(({ values }) => extentOf(values));
  if (extents.some(({ largest }) => largest > largestMagnitude)) refuseTooLarge(data);
  const isTooSmall = ({ largest }: Extent): boolean => largest > 0 && largest < smallestMagnitude;
  refuseTooSmall(columns.filter((_, k) => isTooSmall(extents[k])));
  return { hasMissing: extents.some(({ hasMissing }) => hasMissing) };
}

function areCodes(codes: Int32Array, count: number): boolean {
  for (let row = 0; row < codes.length; row += 1) {
    if (codes[row] < 0 || codes[row] >= count) return false;
  }
  return true;
}

function refuseLength(name: string, found: number, expected: number): void {
  if (found === expected) return;
  throw new StatsError(
    'shape',
    `expected ${expected} values of ${name}, one a row; found ${found}`,
    {
      columns: [name],
    },
  );
}

function refuseTooLarge(data: PanelColumns): never {
  const rows: RowPlace[] = [];
  for (const { name, values } of [data.outcome, ...data.regressors]) {
    for (let index = 0; index < values.length; index += 1) {
      if (Math.abs(values[index]) > largestMagnitude) {
        rows.push({ row: data.fileRow[index], column: name });
      }
    }
  }
  throw new StatsError(
    'non-finite',
    `expected numbers up to ${largestMagnitude}; found larger ones`,
    {
      rows,
    },
  );
}

function refuseTooSmall(columns: readonly NamedColumn[]): void {
  if (columns.length === 0) return;
  const names = columns.map(({ name }) => name);
  throw new StatsError(
    'non-finite',
    `expected a number of ${smallestMagnitude} or more in each column; found only smaller ones in ${names.join(', ')}`,
    { columns: names },
  );
}

interface Extent {
  /** The largest magnitude; missing cells are none. */
  readonly largest: number;
  readonly hasMissing: boolean;
}

function extentOf(values: Float64Array): Extent {
  let largest = 0;
  let hasMissing = false;
  for (let row = 0; row < values.length; row += 1) {
    const size = Math.abs(values[row]);
    if (size > largest) largest = size;
    else if (Number.isNaN(size)) hasMissing = true;
  }
  return { largest, hasMissing };
}
