import type { TableFile } from '@contract';
import { exactFigure, exactHeader } from '../../charts/exact-figure';
import type { NumberFormat } from '../../ui/number-format';
import { figureAt, leadingColumns } from '../grid-places';
import { columnTitle, kindOf } from '../panel-rows';
import type { CellRange } from './cell-block';
import type { ShownGrid } from './copy-cells';
import { rowsIn } from './grid-selection';

/** The cells that are selected, in the grid that shows them. */
export interface SelectedBlock {
  readonly range: CellRange;
  readonly grid: ShownGrid;
}

type SelectedTable = Pick<TableFile, 'columns' | 'rows'>;

/** How many cells its file has: company and year stand in each row, selected or not. */
export function fileCells({ range, grid }: SelectedBlock): number {
  const rows = range.lastRow - range.firstRow + 1;
  return rows * (leadingColumns + figuresIn(range, grid).length + (hasLine(range, grid) ? 1 : 0));
}

/**
 * The selected cells as a table: company, year and the selected columns under headers with their units, every digit in
 * the unit that is shown, null where a cell is missing.
 */
export function selectedTable(
  { range, grid }: SelectedBlock,
  numbers: NumberFormat,
): SelectedTable {
  const figures = figuresIn(range, grid);
  const isWithLine = hasLine(range, grid);
  const titles = [
    ...['Company', 'Year'],
    ...figures.map((figure) => {
      const column = grid.columns[figure];
      return exactHeader(columnTitle(column), numbers, kindOf(column));
    }),
    ...(isWithLine ? ['Line of file'] : []),
  ];
  return {
    columns: titles.map((header) => ({ header })),
    rows: rowsIn(range, grid).map(({ company, year, values, fileRow }) => [
      ...[company, year],
      ...figures.map((figure) =>
        exactFigure(values[figure], numbers, kindOf(grid.columns[figure])),
      ),
      ...(isWithLine ? [fileRow === 0 ? null : fileRow] : []),
    ]),
  };
}

function figuresIn({ firstColumn, lastColumn }: CellRange, { columns }: ShownGrid): number[] {
  const figures: number[] = [];
  for (let position = firstColumn; position <= lastColumn; position++) {
    const figure = figureAt(position, columns);
    if (figure !== undefined) figures.push(figure);
  }
  return figures;
}

/** The line of the file stands after the last figure. */
function hasLine({ lastColumn }: CellRange, { columns }: ShownGrid): boolean {
  return lastColumn === columns.length + leadingColumns;
}
