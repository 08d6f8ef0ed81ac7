import { FileRefusal } from '../file-refusal';
import { CellMarks } from '../cell-marks';
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
  readonly #formulas: CellMarks;
  readonly #numbers: CellMarks;

  constructor(
    private readonly name: string,
    private readonly budget: CellBudget,
  ) {
    this.#formulas = new CellMarks(budget.limits.columns);
    this.#numbers = new CellMarks(budget.limits.columns);
  }

  /**
   * @param line  of the sheet, the first being 1; later than that of the row before.
   * @param cells  up to the last filled one.
   * @param columns  counted from 0: those that a formula wrote, and those with a number that is stored as one.
   * @throws {FileRefusal} 'sheet_limit'
   */
  add(
    line: number,
    cells: string[],
    columns: { readonly formulas: readonly number[]; readonly numbers: readonly number[] },
  ): void {
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
    const row = this.#rows.length;
    for (const column of columns.formulas) this.#formulas.add(row, column);
    for (const column of columns.numbers) this.#numbers.add(row, column);
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
    return {
      rows: this.#rows,
      lines: this.#lines,
      ...(!this.#formulas.isEmpty && { isFormula: this.#formulas.has }),
      ...(!this.#numbers.isEmpty && { isNumber: this.#numbers.has }),
    };
  }

  #refuse(expected: string): FileRefusal {
    return new FileRefusal('sheet_limit', `expected sheets of ${expected} of “${this.name}”`);
  }
}
