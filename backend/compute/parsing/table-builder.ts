import type { Delimiter, Table, TableLimits } from './table';
import { TableError } from './table-error';
import { uniqueHeader } from './unique-header';

/** Collects records into a table and refuses what passes a limit. */
export class TableBuilder {
  readonly #limits: TableLimits;
  #header: readonly string[] | undefined;
  readonly #rows: string[][] = [];
  readonly #lines: number[] = [];

  constructor(limits: TableLimits) {
    this.#limits = limits;
  }

  /** @param lastLine  the line of the file that the record ends on. */
  add(record: string[], lastLine: number): void {
    if (record.every((cell) => cell.trim() === '')) return;
    const row = lastLine - record.reduce((sum, cell) => sum + lineEndsIn(cell), 0);
    this.#refuseLongField(record, row);
    if (this.#header === undefined) {
      this.#header = this.#checkedHeader(record, row);
      return;
    }
    const width = this.#header.length;
    if (record.length > width && record.slice(width).some((cell) => cell.trim() !== '')) {
      const message = `expected at most ${width} cells on line ${row}, as many as the header has; found ${record.length}`;
      throw new TableError('csv-invalid', message, { row, column: width + 1 });
    }
    const mostRows = Math.min(this.#limits.rows, Math.floor(this.#limits.cells / width));
    if (this.#rows.length === mostRows) {
      throw new TableError(
        'table-too-large',
        `expected at most ${mostRows} rows of ${width} columns; line ${row} is one more`,
        { row },
      );
    }
    this.#rows.push(record.length === width ? record : ofWidth(record, width));
    this.#lines.push(row);
  }

  finish(delimiter: Delimiter): Table {
    if (this.#header === undefined) {
      throw new TableError('csv-invalid', 'expected a header and rows; found an empty file');
    }
    return {
      ...uniqueHeader(this.#header),
      rows: this.#rows,
      lines: this.#lines,
      delimiter,
    };
  }

  #checkedHeader(record: readonly string[], row: number): readonly string[] {
    if (record.length > this.#limits.columns) {
      throw new TableError(
        'table-too-large',
        `expected at most ${this.#limits.columns} columns; found ${record.length}`,
        { row, column: this.#limits.columns + 1 },
      );
    }
    return record;
  }

  #refuseLongField(record: readonly string[], row: number): void {
    const index = record.findIndex((cell) => cell.length > this.#limits.fieldLength);
    if (index === -1) return;
    const message = `expected fields of at most ${this.#limits.fieldLength} characters; the one in column ${index + 1} on line ${row} is longer`;
    throw new TableError('csv-invalid', message, { row, column: index + 1 });
  }
}

function ofWidth(record: readonly string[], width: number): string[] {
  return Array.from({ length: width }, (_, index) => record[index] ?? '');
}

function lineEndsIn(cell: string): number {
  return cell.includes('\n') ? cell.split('\n').length - 1 : 0;
}
