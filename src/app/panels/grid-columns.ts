import type { PanelColumn } from '@contract';
import type { ColDef, ValueFormatterParams } from 'ag-grid-community';
import type { FigureKind, NumberFormat } from '../ui/number-format';
import { type PanelRow, columnTitle } from './panel-rows';

/** Figures of the model are money; a further column may be anything, so no unit is put on it. */
export function kindOf(column: PanelColumn): FigureKind {
  return column.role === 'other' ? 'plain' : 'money';
}

/** The grid's columns: company, year, every figure, and the line of the file. */
export function gridColumns(
  columns: readonly PanelColumn[],
  rows: readonly PanelRow[],
  numbers: NumberFormat,
): ColDef<PanelRow>[] {
  return [
    {
      colId: 'company',
      headerName: 'Company',
      field: 'company',
      filter: 'agTextColumnFilter',
      filterParams: { maxNumConditions: 1 },
      flex: 1.4,
    },
    { colId: 'year', headerName: 'Year', field: 'year', ...wholeNumber },
    ...columns.map((column, index) => figureColumn({ column, index, rows, numbers })),
    { colId: 'fileRow', headerName: 'Line of file', field: 'fileRow', ...wholeNumber },
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

function figureColumn(from: {
  readonly column: PanelColumn;
  readonly index: number;
  readonly rows: readonly PanelRow[];
  readonly numbers: NumberFormat;
}): ColDef<PanelRow> {
  const { column, index, rows, numbers } = from;
  const kind = kindOf(column);
  const digits = numbers.columnDigits(
    rows.map((row) => row.values[index]),
    kind,
  );
  return {
    colId: `figure-${index}`,
    headerName: columnTitle(column),
    valueGetter: ({ data }) => data?.values[index] ?? null,
    valueFormatter: ({ value }: ValueFormatterParams<PanelRow, number | null>) =>
      numbers.figure(value, kind, digits),
    ...numberFilter,
    // What a person types is in the unit that is shown.
    filterValueGetter: ({ data }) => {
      const value = data?.values[index] ?? null;
      return value === null ? null : numbers.shown(value, kind);
    },
    headerClass: 'kv-number-header',
    cellClass: 'kv-number-cell',
    cellClassRules: { 'kv-missing-cell': ({ value }) => value === null },
  };
}
