import type { NamedColumn } from '../../stats';
import { columnIndices, type TableMapping } from './column-indices';
import { decimalSigns } from './decimal-signs';
import { duplicateFindings, spellingFindings } from './key-findings';
import { isMissing } from './missing-cell';
import { parseNumber } from './parse-number';
import { parseYear } from './parse-year';
import type { Table } from './table';
import type { TableFinding } from './table-finding';

/** The rows of a table that name a company and a year, read as numbers; NaN stands for a missing cell or a text. */
export interface PanelReading {
  readonly companies: readonly string[];
  readonly company: Int32Array;
  readonly year: Int32Array;
  readonly fileRow: Int32Array;
  readonly numbers: readonly NamedColumn[];
  /** All there is to say about the cells, by line. */
  readonly findings: readonly TableFinding[];
}

/**
 * Reads the mapped columns of a table and lists every cell that is missing or cannot be read.
 * @throws {TableError} 'missing-column' or 'ambiguous-column' with the headers concerned.
 */
export function readPanel(table: Table, mapping: TableMapping): PanelReading {
  const indices = columnIndices(table, mapping);
  const findings: TableFinding[] = [];
  const rows: number[] = [];
  const years: number[] = [];
  const keys = { ...mapping, ...indices };
  table.rows.forEach((_, row) => {
    const year = readKey(table, row, keys, findings);
    if (year === undefined) return;
    rows.push(row);
    years.push(year);
  });
  const codes = new Map<string, number>();
  const company = Int32Array.from(rows, (row) => {
    const name = table.rows[row][indices.companyIndex];
    const code = codes.get(name) ?? codes.size;
    codes.set(name, code);
    return code;
  });
  const numbers = readNumbers(table, rows, mapping.numbers, indices.numberIndices, findings);
  const reading = {
    companies: [...codes.keys()],
    company,
    year: Int32Array.from(years),
    fileRow: Int32Array.from(rows, (row) => table.lines[row]),
    numbers,
  };
  findings.push(...duplicateFindings(reading, mapping), ...spellingFindings(reading, mapping));
  return { ...reading, findings: findings.sort((left, right) => left.row - right.row) };
}

interface KeyColumns {
  readonly company: string;
  readonly year: string;
  readonly companyIndex: number;
  readonly yearIndex: number;
}

/** The row's year; undefined, with findings, where the row cannot be placed in the panel. */
function readKey(
  table: Table,
  row: number,
  columns: KeyColumns,
  findings: TableFinding[],
): number | undefined {
  const company = table.rows[row][columns.companyIndex];
  const yearText = table.rows[row][columns.yearIndex];
  const year = parseYear(yearText);
  const place = { row: table.lines[row] };
  if (isMissing(company)) {
    findings.push({
      ...place,
      column: columns.company,
      found: company,
      code: 'no-company',
      detail: 'No company is named: the row is left out.',
      isBlocking: false,
    });
  }
  if (year === undefined) {
    findings.push({
      ...place,
      column: columns.year,
      found: yearText,
      code: 'year',
      detail: 'Expected a fiscal year as a whole number, as 2023 or FY2023.',
      isBlocking: true,
    });
  } else if (Number.isNaN(year)) {
    findings.push({
      ...place,
      column: columns.year,
      found: yearText,
      code: 'missing',
      detail: 'No year is given: the row is left out.',
      isBlocking: false,
    });
  }
  return isMissing(company) || year === undefined || Number.isNaN(year) ? undefined : year;
}

/**
 * The numbers of the placed rows. A text where a number belongs is found in every row, also in one that names no
 * company or year: it may be the sign of a shifted line. A gap is found in placed rows only.
 *
 * @param placed  indices of the rows that stand in the panel, ascending.
 */
function readNumbers(
  table: Table,
  placed: readonly number[],
  names: readonly string[],
  indices: readonly number[],
  findings: TableFinding[],
): NamedColumn[] {
  const isPlaced = new Set(placed);
  const columns = indices.map((index) => table.rows.map((cells) => cells[index]));
  const signs = decimalSigns(columns);
  return columns.map((cells, k): NamedColumn => {
    const column = names[k];
    const { decimalSign } = signs[k];
    const place = (row: number) => ({ row: table.lines[row], column });
    const values = cells.map((found, row) => {
      const value = parseNumber(found, decimalSign);
      if (value === undefined) {
        const wording = decimalSign === ',' ? 'decimal comma' : 'decimal point';
        const detail = `Expected a number with a ${wording}, as the rest of the column has.`;
        findings.push({ ...place(row), found, code: 'not-a-number', detail, isBlocking: true });
        return NaN;
      }
      if (Number.isNaN(value) && isPlaced.has(row)) {
        const detail = 'No value: the row counts in no fit that uses this column.';
        findings.push({ ...place(row), found, code: 'missing', detail, isBlocking: false });
      }
      return value;
    });
    return { name: column, values: Float64Array.from(placed, (row) => values[row]) };
  });
}
