/** What the reader refuses: a file that is no table, or one too large. */
export type TableErrorCode =
  'csv-invalid' | 'table-too-large' | 'missing-column' | 'ambiguous-column';

export interface TableErrorData {
  /** Line of the file, the header being line 1. */
  readonly row?: number;
  /** Column of the table, the first being 1. */
  readonly column?: number;
  readonly columns?: readonly string[];
}

/** The reader's refusal: a code, a sentence for a person, and the place. Plain data, to cross a process border. */
export class TableError extends Error {
  override readonly name = 'TableError';

  constructor(
    readonly code: TableErrorCode,
    message: string,
    readonly data: TableErrorData = {},
  ) {
    super(message);
  }
}
