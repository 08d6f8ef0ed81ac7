import type { PanelColumn } from '@contract';
import { figureAt } from '../grid-places';
import type { PanelRow } from '../panel-rows';
import { blockText } from '../../ui/block-text';
import type { CellRange } from './cell-block';
import { figureText, shiftOf } from './shown-figure';

/** What the grid shows, as copying, pasting and finding read it. */
export interface ShownGrid {
  /** After filters and sorting. */
  readonly rowCount: number;
  readonly rowAt: (row: number) => PanelRow | undefined;
  readonly columns: readonly PanelColumn[];
  /** What money of the panel is multiplied by to be shown. */
  readonly factor: number;
}

/** The cells for a spreadsheet: in the unit that is shown, with every digit and a decimal point, missing as empty. */
export function copiedText(range: CellRange, grid: ShownGrid): string {
  const shifts = grid.columns.map((column) => shiftOf(column, grid.factor));
  const text = (row: PanelRow, position: number): string => {
    const figure = figureAt(position, grid.columns);
    if (figure !== undefined) return figureText(row.values[figure], shifts[figure]);
    if (position === 0) return row.company;
    if (position === 1) return String(row.year);
    return row.fileRow === 0 ? '' : String(row.fileRow);
  };
  const lines: string[][] = [];
  for (let at = range.firstRow; at <= range.lastRow; at++) {
    const row = grid.rowAt(at);
    if (row === undefined) continue;
    const cells: string[] = [];
    for (let position = range.firstColumn; position <= range.lastColumn; position++)
      cells.push(text(row, position));
    lines.push(cells);
  }
  return blockText(lines);
}
