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
}

/** A row of the table that says what the chart shows; the first cell names the row. */
export interface ChartRow {
  readonly cells: readonly string[];
  readonly isOwn?: boolean;
  readonly isTotal?: boolean;
}
