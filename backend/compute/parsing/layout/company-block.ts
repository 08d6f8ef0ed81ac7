import type { Grid } from '../grid';
import { isMissing } from '../../../panel-data/numbers/missing-cell';
import type { YearColumn } from './wide-header';
import type { WideSheet } from './wide-sheet';

/** Year columns of one variable, by year. */
export type ByYear = ReadonlyMap<string, YearColumn>;

export interface SheetRow {
  readonly sheet: WideSheet;
  readonly row: number;
}

/** Columns of a row with the texts that describe it; undefined for one that its sheet does not have. */
export type DescribingColumns = readonly (number | undefined)[];

/** The rows of one company: of one sheet row, or of all that name a variable of it. */
export interface CompanyBlock extends SheetRow {
  readonly company: string;
  readonly describing: DescribingColumns;
  /** Where the values of each variable stand. */
  readonly parts: Map<number, SheetRow & { readonly columns: ByYear }>;
}

/** A cell of a sheet; `column` is undefined where the sheet has none. */
export interface SheetCell extends SheetRow {
  readonly column: number | undefined;
}

/** The cell with a variable's value in a year; undefined where no row names the variable. */
export function valueCell(
  block: CompanyBlock,
  variable: number,
  year: string,
): SheetCell | undefined {
  const part = block.parts.get(variable);
  return part && { sheet: part.sheet, row: part.row, column: part.columns.get(year)?.column };
}

export function describingCell(block: CompanyBlock, place: number): SheetCell {
  return { sheet: block.sheet, row: block.row, column: block.describing[place] };
}

export function textOf(cell: SheetCell | undefined): string {
  if (cell?.column === undefined) return '';
  return cell.sheet.grid.rows[cell.row][cell.column] ?? '';
}

export function lineOf({ sheet, row }: SheetRow): number {
  return sheet.grid.lines[row];
}

/** What a grid may know of a cell besides its text. */
export type CellQuestion = keyof Pick<Grid, 'isFormula' | 'isNumber'>;

export function isCell(cell: SheetCell | undefined, question: CellQuestion): boolean {
  if (cell?.column === undefined) return false;
  return cell.sheet.grid[question]?.(cell.row, cell.column) ?? false;
}

/**
 * First and last position of a year with a figure: before and after there are no rows, a gap between them stays one.
 * Last is before first where there is no figure at all.
 */
export function filledRange(
  block: CompanyBlock,
  years: readonly string[],
): readonly [number, number] {
  const isFilled = (year: string): boolean => {
    for (const variable of block.parts.keys())
      if (!isMissing(textOf(valueCell(block, variable, year)))) return true;
    return false;
  };
  const first = years.findIndex(isFilled);
  return first === -1 ? [0, -1] : [first, years.findLastIndex(isFilled)];
}
