import type { ColumnRole, PanelColumn, PanelVersionReply } from '@contract';
import type { FigureKind } from '../ui/number-format';

/** One row of the panel as the grid shows it. */
export interface PanelRow {
  /** Line of the imported file; 0 for a row that was added by hand. */
  readonly fileRow: number;
  readonly company: string;
  readonly year: number;
  /** In the order of the panel's columns. */
  readonly values: readonly (number | null)[];
}

const roleNames: Readonly<Record<Exclude<ColumnRole, 'other'>, string>> = {
  marketValue: 'Market value',
  capex: 'Capex',
  bookEquity: 'Book equity',
};

/** What a column is called on screen: what it is to the model, or its header in the file. */
export function columnTitle(column: PanelVersionReply['columns'][number]): string {
  return column.role === 'other' ? column.name : roleNames[column.role];
}

/** Figures of the model are money; a further column may be anything, so no unit is put on it. */
export function kindOf(column: PanelColumn): FigureKind {
  return column.role === 'other' ? 'plain' : 'money';
}

const rowsOf = new WeakMap<PanelVersionReply, readonly PanelRow[]>();

/** The same rows each time for the same version: whoever shows them sees that nothing has changed. */
export function panelRows(panel: PanelVersionReply): readonly PanelRow[] {
  const known = rowsOf.get(panel);
  if (known !== undefined) return known;
  const { fileRow, company, year, values } = panel.rows;
  const rows = fileRow.map((line, row) => ({
    fileRow: line,
    company: company[row],
    year: year[row],
    values: values.map((column) => column[row]),
  }));
  rowsOf.set(panel, rows);
  return rows;
}

/** The titles of the columns in which the row has no value. */
export function missingIn(row: PanelRow, titles: readonly string[]): readonly string[] {
  return titles.filter((_, column) => row.values[column] === null);
}

/** `Market value is the file's column “mv”, capex “capex_eur”`: where the model's columns come from. */
export function columnSources(panel: PanelVersionReply): string {
  const named = [
    { title: 'Company', name: panel.companyHeader },
    { title: 'Year', name: panel.yearHeader },
    ...panel.columns
      .filter((column) => column.role !== 'other')
      .map((column) => ({ title: columnTitle(column), name: column.name })),
  ];
  const words = named.map(({ title, name }, index) =>
    index === 0 ? `${title} is the file’s column “${name}”` : `${title.toLowerCase()} “${name}”`,
  );
  return `${words.join(', ')}.`;
}
