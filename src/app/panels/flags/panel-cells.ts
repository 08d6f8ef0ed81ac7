import type { PanelColumn } from '@contract';
import type { PanelCells } from '@panel-data';
import type { PanelRow } from '../panel-rows';

/** The rows by column, as the rules of flags and windows read them. */
export function panelCells(rows: readonly PanelRow[], columns: readonly PanelColumn[]): PanelCells {
  const codes = new Map<string, number>();
  const company = new Int32Array(rows.length);
  const year = new Int32Array(rows.length);
  const values = columns.map(() => new Float64Array(rows.length));
  rows.forEach((row, place) => {
    const code = codes.get(row.company) ?? codes.size;
    codes.set(row.company, code);
    company[place] = code;
    year[place] = row.year;
    values.forEach((cells, column) => {
      cells[place] = row.values[column] ?? NaN;
    });
  });
  return {
    companies: [...codes.keys()],
    company,
    year,
    columns: columns.map(({ name, role }) => ({ name, role })),
    values,
  };
}

/** Positions of the columns that the model uses. */
export function modelColumns(columns: readonly PanelColumn[]): readonly number[] {
  return columns.flatMap(({ role }, column) => (role === 'other' ? [] : [column]));
}
