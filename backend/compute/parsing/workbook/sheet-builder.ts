import { FileRefusal } from '../file-refusal';
import type { Grid } from '../grid';
import type { TableLimits } from '../table';

/** The grids of a workbook's sheets, the limit of cells counted over all of them. */
export class CellBudget {
  #cells = 0;

  constructor(readonly limits: TableLimits) {}

  /** @throws {FileRefusal} 'sheet_limit' */
  spend(cells: number): void {
    this.#cells += cells;
    if (this.#cells > this.limits.cells)
      throw new FileRefusal(
        'sheet_limit',
        `expected a workbook of at most ${this.limits.cells} filled cells; this one has more`,
      );
  }
}

/** Collects the filled cells of one sheet, row by row. */
export class SheetBuilder {
  readonly #rows: string[][] = [];
  readonly #lines: number[] = [];
  /** Columns with a formula, by row that has one. */
  readonly #formulas = new Map<number, readonly number[]>();

  constructor(
    private readonly name: string,
    private readonly budget: CellBudget,
  ) {}

  /**
   * @param line  of the sheet, the first being 1; later than that of the row before.
   * @param cells  up to the last filled one.
   * @param formulas  columns, counted from 0, that a formula wrote.
   * @throws {FileRefusal} 'sheet_limit'
   */
  add(line: number, cells: string[], formulas: readonly number[]): void {
    const filled = cells.reduce((count, cell) => count + (cell.trim() === '' ? 0 : 1), 0);
    if (filled === 0) return;
    const { limits } = this.budget;
    if (this.#rows.length > limits.rows)
      throw this.#refuse(`at most ${limits.rows} rows; line ${line} is one more`);
    if (cells.some((cell) => cell.length > limits.fieldLength))
      throw this.#refuse(
        `cells of at most ${limits.fieldLength} characters; found a longer one on line ${line}`,
      );
    this.budget.spend(filled);
    if (formulas.length > 0) this.#formulas.set(this.#rows.length, formulas);
    this.#rows.push(cells);
    this.#lines.push(line);
  }

  /** @throws {FileRefusal} 'sheet_limit' for a filled cell beyond the last column allowed. */
  checkColumn(column: number, line: number): void {
    const { columns } = this.budget.limits;
    if (column >= columns)
      throw this.#refuse(
        `at most ${columns} columns; found a cell in column ${column + 1} on line ${line}`,
      );
  }

  finish(): Grid {
    const formulas = this.#formulas;
    return {
      rows: this.#rows,
      lines: this.#lines,
      ...(formulas.size > 0 && {
        isFormula: (row: number, column: number) => formulas.get(row)?.includes(column) ?? false,
      }),
    };
  }

  #refuse(expected: string): FileRefusal {
    return new FileRefusal('sheet_limit', `expected sheets of ${expected} of “${this.name}”`);
  }
}
