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
  const missing = [...new Set(wanted)].filter((name) => !table.header.includes(name));
  if (missing.length > 0) {
    throw new TableError(
      'missing-column',
      `expected columns ${wanted.join(', ')}; the file has no ${missing.join(', ')} (it has ${table.header.join(', ')})`,
      { columns: missing },
    );
  }
  const twice = wanted.filter((name, index) => wanted.indexOf(name) !== index);
  const repeated = wanted.filter((name) => table.repeatedHeaders.includes(name));
  const ambiguous = [...new Set([...twice, ...repeated])];
  if (ambiguous.length > 0) {
    const message =
      twice.length > 0
        ? `expected each column for one purpose; ${ambiguous.join(', ')} is used twice`
        : `expected one column of each name; the file has ${ambiguous.join(', ')} more than once`;
    throw new TableError('ambiguous-column', message, { columns: ambiguous });
  }
  const [companyIndex, yearIndex, ...numberIndices] = wanted.map((name) =>
    table.header.indexOf(name),
  );
  return { companyIndex, yearIndex, numberIndices };
}
