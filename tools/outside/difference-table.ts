/** A line of the table. */
export interface DifferenceRow {
  readonly figure: string;
  /** How many cases it was compared in. */
  readonly cases: number;
  /** The case with the largest difference. */
  readonly dataSet: string;
  readonly difference: number;
  readonly tolerance: number;
}

/** Figures, the data set where each is furthest from R, and by how much. */
export function differenceTable(rows: readonly DifferenceRow[]): string {
  const lines = rows.map(({ figure, cases, dataSet, difference, tolerance }) => [
    figure,
    String(cases),
    dataSet,
    difference.toExponential(1),
    tolerance.toExponential(0),
    difference <= tolerance ? '' : 'beyond',
  ]);
  const header = ['figure', 'cases', 'data set', 'largest', 'tolerance', ''];
  const widths = header.map((_, column) =>
    Math.max(...[header, ...lines].map((line) => line[column].length)),
  );
  return [header, ...lines]
    .map((line) =>
      line
        .map((cell, column) => cell.padEnd(widths[column]))
        .join('  ')
        .trimEnd(),
    )
    .join('\n');
}
