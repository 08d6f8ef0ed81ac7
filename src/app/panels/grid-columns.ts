import type { PanelColumn } from '@contract';
import type {
  CellClassParams,
  CellClassRules,
  ColDef,
  ValueFormatterParams,
} from 'ag-grid-community';
import type { NumberFormat } from '../ui/number-format';
import type { CellRange } from './editing/cell-block';
import { FigureEditor, type FigureEditorParams } from './editing/figure-editor';
import { figureId, leadingColumns } from './grid-places';
import { type PanelRow, columnTitle, kindOf } from './panel-rows';

/** What is marked in the cells, asked each time that a cell is drawn. */
export interface CellMarks {
  readonly block: () => CellRange | null;
  readonly isEdited: (row: PanelRow, column: number) => boolean;
  readonly isFlagged: (row: PanelRow, column: number) => boolean;
}

export interface GridColumnsGround {
  readonly columns: readonly PanelColumn[];
  /** Digits after the point, by column of the panel. */
  readonly digits: readonly number[];
  readonly numbers: NumberFormat;
  readonly marks: CellMarks;
  readonly mayEdit: () => boolean;
  /** A figure as it is typed over. */
  readonly textOf: (row: PanelRow, column: number) => string;
}

/** The grid's columns: company, year, every figure, and the line of the file. */
export function gridColumns(ground: GridColumnsGround): ColDef<PanelRow>[] {
  const { columns, marks } = ground;
  return [
    {
      colId: 'company',
      headerName: 'Company',
      field: 'company',
      filter: 'agTextColumnFilter',
      filterParams: { maxNumConditions: 1 },
      flex: 1.4,
      cellClassRules: blockRules(marks, 0),
    },
    {
      colId: 'year',
      headerName: 'Year',
      field: 'year',
      ...wholeNumber,
      cellClassRules: blockRules(marks, 1),
    },
    ...columns.map((_, index) => figureColumn(ground, index)),
    {
      colId: 'fileRow',
      headerName: 'Line of file',
      field: 'fileRow',
      ...wholeNumber,
      valueFormatter: ({ value }: ValueFormatterParams<PanelRow, number>) =>
        value === 0 ? 'added' : String(value),
      cellClassRules: blockRules(marks, columns.length + leadingColumns),
    },
  ];
}

/** One condition: who needs more sorts or exports. A figure is asked for as at least so much. */
const numberFilter: Pick<ColDef<PanelRow>, 'filter' | 'filterParams'> = {
  filter: 'agNumberColumnFilter',
  filterParams: { maxNumConditions: 1, defaultOption: 'greaterThanOrEqual' },
};

const wholeNumber: ColDef<PanelRow> = {
  ...numberFilter,
  headerClass: 'kv-number-header',
  cellClass: 'kv-number-cell',
};

function figureColumn(ground: GridColumnsGround, index: number): ColDef<PanelRow> {
  const { columns, digits, numbers, marks, textOf } = ground;
  const column = columns[index];
  const kind = kindOf(column);
  const editing: FigureEditorParams = {
    textOf: (row) => textOf(row, index),
    label: (row) => `${columnTitle(column)} of ${row.company} in ${row.year}`,
  };
  return {
    colId: figureId(index),
    headerName: columnTitle(column),
    valueGetter: ({ data }) => data?.values[index] ?? null,
    valueFormatter: ({ value }: ValueFormatterParams<PanelRow, number | null>) =>
      numbers.figure(value, kind, digits[index]),
    ...numberFilter,
    // What a person types is in the unit that is shown.
    filterValueGetter: ({ data }) => {
      const value = data?.values[index] ?? null;
      return value === null ? null : numbers.shown(value, kind);
    },
    headerClass: 'kv-number-header',
    cellClass: 'kv-number-cell',
    cellClassRules: {
      ...blockRules(marks, index + leadingColumns),
      'kv-missing-cell': ({ value }) => value === null,
      'kv-edited-cell': ({ data }) => data !== undefined && marks.isEdited(data, index),
      'kv-flagged-cell': ({ data }) => data !== undefined && marks.isFlagged(data, index),
    },
    editable: ground.mayEdit,
    cellEditor: FigureEditor,
    cellEditorParams: editing,
    cellDataType: false,
  };
}

/** The block's ground and its edges. */
function blockRules(marks: CellMarks, column: number): CellClassRules<PanelRow> {
  const within =
    (isSo: (range: CellRange, row: number) => boolean) =>
    ({ node: { rowIndex: row } }: CellClassParams<PanelRow>): boolean => {
      const range = marks.block();
      return (
        range !== null &&
        row !== null &&
        row >= range.firstRow &&
        row <= range.lastRow &&
        column >= range.firstColumn &&
        column <= range.lastColumn &&
        isSo(range, row)
      );
    };
  return {
    'kv-block-cell': within(() => true),
    'kv-block-top': within((range, row) => row === range.firstRow),
    'kv-block-bottom': within((range, row) => row === range.lastRow),
    'kv-block-start': within((range) => column === range.firstColumn),
    'kv-block-end': within((range) => column === range.lastColumn),
  };
}
