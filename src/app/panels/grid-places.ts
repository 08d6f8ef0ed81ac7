import type { PanelColumn } from '@contract';

/** Columns before the first figure: company and year. */
export const leadingColumns = 2;

/** The grid's columns from left to right: company, year, every figure, the line of the file. */
export function gridColumnIds(columns: readonly PanelColumn[]): readonly string[] {
  return ['company', 'year', ...columns.map((_, figure) => figureId(figure)), 'fileRow'];
}

export function figureId(figure: number): string {
  return `figure-${figure}`;
}

/** Which of the panel's columns stands at a position of the grid; undefined for company, year and line. */
export function figureAt(position: number, columns: readonly PanelColumn[]): number | undefined {
  const figure = position - leadingColumns;
  return figure >= 0 && figure < columns.length ? figure : undefined;
}

/** Of the same names and roles in the same order. */
export function areSameColumns(
  left: readonly PanelColumn[],
  right: readonly PanelColumn[],
): boolean {
  return (
    left.length === right.length &&
    left.every(({ name, role }, at) => name === right[at].name && role === right[at].role)
  );
}
