/** Which column of the file is what, by header text. */
export interface ColumnChoice {
  readonly company: string;
  readonly year: string;
  readonly marketValue: string;
  readonly capex: string;
  readonly bookEquity: string;
  readonly others: readonly string[];
}

export type ParseRequest =
  | { readonly kind: 'preview'; readonly bytes: Uint8Array }
  | { readonly kind: 'check'; readonly bytes: Uint8Array; readonly choice: ColumnChoice }
  | { readonly kind: 'read'; readonly bytes: Uint8Array; readonly choice: ColumnChoice };

export interface FilePreview {
  readonly headers: readonly string[];
  readonly firstRows: readonly { readonly row: number; readonly cells: readonly string[] }[];
  readonly rowCount: number;
  readonly guess: Partial<ColumnChoice>;
}

export interface FileFinding {
  readonly row: number;
  readonly column: string;
  readonly found: string;
  readonly code: 'missing' | 'duplicate' | 'not-a-number' | 'year' | 'no-company' | 'spelling';
  readonly detail: string;
  readonly isBlocking: boolean;
}

export interface FileCheck {
  readonly companies: number;
  readonly years: number;
  readonly firstYear: number | null;
  readonly lastYear: number | null;
  readonly rows: number;
  readonly completeRows: number;
  /** The first 500. */
  readonly findings: readonly FileFinding[];
  readonly findingCount: number;
  readonly blockingCount: number;
}

/** The file's rows by column; `cells[row]` in the order market value, capex, book equity, others. */
export interface FileRows {
  readonly company: readonly string[];
  readonly year: readonly number[];
  readonly fileRow: readonly number[];
  readonly cells: readonly (readonly (number | null)[])[];
}

export type ParseAnswer =
  | { readonly kind: 'preview'; readonly preview: FilePreview }
  | { readonly kind: 'check'; readonly check: FileCheck }
  | { readonly kind: 'read'; readonly rows: FileRows }
  | { readonly kind: 'refused'; readonly code: string; readonly detail: string };
