import { type TableFile, cautions } from '@contract';
import type { ChartColumn, ChartRow, ChartText } from '../chart-text';

/** What a chart shows as a table for a file, at full precision where its rows have that, with what it is. */
export function chartTable(
  { title, caption, source }: ChartText,
  columns: readonly ChartColumn[],
  rows: readonly ChartRow[],
  note = '',
): TableFile {
  const exact = rows.flatMap(({ values }) => (values === undefined ? [] : [values]));
  const isExact = exact.length === rows.length;
  const headers = columns.flatMap(({ label, headers }) =>
    isExact && headers !== undefined ? headers : [label],
  );
  const said = [
    { label: 'Shown', text: caption },
    { label: 'Note', text: note },
    { label: 'Source', text: source },
  ];
  return {
    name: title,
    notes: [
      ...said.filter(({ text }) => text !== ''),
      ...cautions.map((text) => ({ label: 'Caution', text })),
    ],
    columns: headers.map((header) => ({ header })),
    rows: (isExact ? exact : rows.map(({ cells }) => cells)).map((row) => [...row]),
  };
}
