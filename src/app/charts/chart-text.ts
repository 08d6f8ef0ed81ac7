/** The words that go with a chart, on screen and into its export. */
export interface ChartText {
  /** The finding in words, with its interval. */
  readonly title: string;
  /** Unit, years and fit: `EUR m · 95 % intervals · FY2008–FY2025`. */
  readonly caption: string;
  /** Where the figures come from, as a line under the export. */
  readonly source: string;
}

export interface ChartColumn {
  readonly label: string;
  readonly isNumber: boolean;
  /** The columns of a file that it becomes, each with its unit; one under its label where they are not given. */
  readonly headers?: readonly string[];
}

/** A row of the table that says what the chart shows; the first cell names the row. */
export interface ChartRow {
  readonly cells: readonly string[];
  /** For a file, by the columns' headers: figures with every digit in the unit shown, null for none. */
  readonly values?: readonly (string | number | null)[];
  readonly isOwn?: boolean;
  readonly isTotal?: boolean;
}
