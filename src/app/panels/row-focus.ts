import type { PanelRow } from './panel-rows';

/** Which row is asked for: by the line of the imported file, or by what it is. */
export type RowFocus =
  | { readonly line: number }
  | {
      readonly company: string;
      readonly year: number;
      /** Position among the panel's columns; the row as a whole without it. */
      readonly column?: number;
    };

export function isAsked(row: PanelRow, focus: RowFocus | null): boolean {
  if (focus === null) return false;
  return 'line' in focus
    ? row.fileRow === focus.line
    : row.company === focus.company && row.year === focus.year;
}
