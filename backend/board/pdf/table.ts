import type { PageFlow } from './page-flow';
import { edge, hairline, softInk } from './print-colours';

export interface TableColumn {
  readonly label: string;
  readonly align: 'left' | 'right';
  /** Takes the room that the others leave. */
  readonly isWide?: boolean;
}

const size = 8.5;
const leading = 11.5;
const gap = 10;
const widest = 130;

/** A table whose header stands again on every page; cells break into lines, a row stays together. */
export function drawTable(
  flow: PageFlow,
  columns: readonly TableColumn[],
  rows: readonly (readonly string[])[],
): void {
  const widths = columnWidths(flow, columns, rows);
  const header = () => {
    drawRow(
      flow,
      columns,
      widths,
      columns.map(({ label }) => label),
      true,
    );
    flow.rule(edge, 0.75);
    flow.space(2);
  };
  flow.need(leading * 4);
  header();
  for (const row of rows) {
    const height = rowHeight(flow, widths, row, columns);
    if (flow.y + height > flow.bottom) {
      flow.newPage();
      header();
    }
    drawRow(flow, columns, widths, row, false);
    flow.rule(hairline, 0.35);
  }
}

function columnWidths(
  flow: PageFlow,
  columns: readonly TableColumn[],
  rows: readonly (readonly string[])[],
): readonly number[] {
  const wanted = columns.map(({ label, isWide, align }, index) => {
    const cells = Math.max(
      0,
      ...rows.map((row) =>
        flow.measure(row[index], { size, face: align === 'right' ? 'figures' : 'words' }),
      ),
    );
    const head = Math.max(
      ...label.split(' ').map((word) => flow.measure(word, { size, face: 'strong' })),
    );
    return isWide === true ? 0 : Math.max(head, Math.min(cells, widest));
  });
  const gaps = gap * (columns.length - 1);
  const taken = wanted.reduce((sum, width) => sum + width, 0) + gaps;
  const wide = columns.filter(({ isWide }) => isWide === true).length;
  if (wide > 0)
    return wanted.map((width, index) =>
      columns[index].isWide === true ? Math.max(120, (flow.width - taken) / wide) : width,
    );
  // What is over goes to all; what is missing is taken from all.
  return wanted.map((width) => (width * (flow.width - gaps)) / (taken - gaps));
}

function rowHeight(
  flow: PageFlow,
  widths: readonly number[],
  row: readonly string[],
  columns: readonly TableColumn[],
): number {
  const lines = row.map(
    (cell, index) => flow.wrap(cell, widths[index], styleOf(columns[index], false)).length,
  );
  return Math.max(1, ...lines) * leading + 4;
}

function styleOf({ align }: TableColumn, isHeader: boolean) {
  if (isHeader) return { size, face: 'strong', colour: softInk } as const;
  return { size, face: align === 'right' ? 'figures' : 'words' } as const;
}

function drawRow(
  flow: PageFlow,
  columns: readonly TableColumn[],
  widths: readonly number[],
  row: readonly string[],
  isHeader: boolean,
): void {
  const cells = row.map((cell, index) =>
    flow.wrap(cell, widths[index], styleOf(columns[index], isHeader)),
  );
  const height = Math.max(1, ...cells.map((lines) => lines.length)) * leading + 4;
  let x = flow.left;
  cells.forEach((lines, index) => {
    const column = columns[index];
    const anchor = column.align === 'right' ? 'end' : 'start';
    const at = column.align === 'right' ? x + widths[index] : x;
    lines.forEach((line, place) => {
      flow.line(line, at, flow.y + 2 + leading * (place + 0.75), {
        ...styleOf(column, isHeader),
        anchor,
      });
    });
    x += widths[index] + gap;
  });
  flow.y += height;
}
