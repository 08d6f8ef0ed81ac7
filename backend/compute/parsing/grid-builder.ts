import type { Grid } from './grid';
import type { TableLimits } from './table';
import { TableError } from './table-error';

/** Collects the records of a text file into a grid and refuses what passes a limit. */
export class GridBuilder {
  readonly #limits: TableLimits;
  readonly #rows: string[][] = [];
  readonly #lines: number[] = [];
  #width = 1;
  #lineCount = 0;

  constructor(limits: TableLimits) {
    this.#limits = limits;
  }

  /** Lines of the file that the records so far take up. */
  get lineCount(): number {
    return this.#lineCount;
  }

  /**
   * @param record  the next one of the file, blank ones too: lines are counted by them, each one long and longer by the
   * line ends inside its cells.
   */
  add(record: string[]): void {
    const line = this.#lineCount + 1;
    this.#lineCount = line;
    for (const cell of record) this.#lineCount += lineEndsIn(cell);
    const filled = record.findLastIndex((cell) => cell.trim() !== '') + 1;
    if (filled === 0) return;
    this.#refuseLongField(record, line);
    this.#width = Math.max(this.#width, this.#checkedWidth(filled, line));
    const width = this.#width;
    const mostRows = Math.min(this.#limits.rows, Math.floor(this.#limits.cells / width));
    // One line more than rows: the header.
    if (this.#rows.length > mostRows) {
      throw new TableError(
        'table-too-large',
        `expected at most ${mostRows} rows of ${width} columns; line ${line} is one more`,
        { row: line },
      );
    }
    this.#rows.push(record);
    this.#lines.push(line);
  }

  /** @throws {TableError} 'csv-invalid' where nothing was added. */
  finish(): Grid {
    if (this.#rows.length === 0) {
      throw new TableError('csv-invalid', 'expected a header and rows; found an empty file');
    }
    return { rows: this.#rows, lines: this.#lines };
  }

  /** @param width  columns of the record up to its last filled cell. */
  #checkedWidth(width: number, line: number): number {
    if (width <= this.#limits.columns) return width;
    throw new TableError(
      'table-too-large',
      `expected at most ${this.#limits.columns} columns; found ${width} on line ${line}`,
      { row: line, column: this.#limits.columns + 1 },
    );
  }

  #refuseLongField(record: readonly string[], line: number): void {
    const index = record.findIndex((cell) => cell.length > this.#limits.fieldLength);
    if (index === -1) return;
    const message = `expected fields of at most ${this.#limits.fieldLength} characters; the one in column ${index + 1} on line ${line} is longer`;
    throw new TableError('csv-invalid', message, { row: line, column: index + 1 });
  }
}

function lineEndsIn(cell: string): number {
  let count = 0;
  for (let at = cell.indexOf('\n'); at !== -1; at = cell.indexOf('\n', at + 1)) count += 1;
  return count;
}
