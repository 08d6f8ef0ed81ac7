import type { Table } from './table';
import { TableError } from './table-error';

/** Which column of the file is what, by header. */
export interface TableMapping {
  readonly company: string;
  readonly year: string;
  /** Numeric columns, in the order they are wanted. */
  readonly numbers: readonly string[];
}

export interface ColumnIndices {
  readonly companyIndex: number;
  readonly yearIndex: number;
  readonly numberIndices: readonly number[];
}

/** @throws {TableError} 'missing-column' or 'ambiguous-column' with the headers concerned. */
export function columnIndices(table: Table, mapping: TableMapping): ColumnIndices {
  const wanted = [mapping.company, mapping.year, ...mapping.numbers];
  refuseMissing(table, wanted);
  const twice = wanted.filter((name, index) => wanted.indexOf(name) !== index);
  if (twice.length > 0) {
    const columns = [...new Set([...twice, ...repeatedAmong(table, wanted)])];
    const message = `expected each column for one purpose; ${columns.join(', ')} is used twice`;
    throw new TableError('ambiguous-column', message, { columns });
  }
  refuseRepeated(table, wanted);
  const [companyIndex, yearIndex, ...numberIndices] = wanted.map((name) =>
    table.header.indexOf(name),
  );
  return { companyIndex, yearIndex, numberIndices };
}

/**
 * Columns that are read as text; one may serve two purposes.
 * @throws {TableError} 'missing-column' or 'ambiguous-column' with the headers concerned.
 */
export function textIndices(table: Table, names: readonly string[]): readonly number[] {
  refuseMissing(table, names);
  refuseRepeated(table, names);
  return names.map((name) => table.header.indexOf(name));
}

function refuseMissing(table: Table, wanted: readonly string[]): void {
  const missing = [...new Set(wanted)].filter((name) => !table.header.includes(name));
  if (missing.length === 0) return;
  throw new TableError(
    'missing-column',
    `expected columns ${wanted.join(', ')}; the file has no ${missing.join(', ')} (it has ${table.header.join(', ')})`,
    { columns: missing },
  );
}

function refuseRepeated(table: Table, wanted: readonly string[]): void {
  const columns = repeatedAmong(table, wanted);
  if (columns.length === 0) return;
  const message = `expected one column of each name; the file has ${columns.join(', ')} more than once`;
  throw new TableError('ambiguous-column', message, { columns });
}

function repeatedAmong(table: Table, wanted: readonly string[]): readonly string[] {
  return [...new Set(wanted)].filter((name) => table.repeatedHeaders.includes(name));
}
