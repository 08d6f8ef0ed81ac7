import type { PanelColumn } from '../panel-data';
import type { FileRecipe, TableReading } from './file-recipe';

export type ParseRequest =
  | {
      readonly kind: 'preview';
      readonly bytes: Uint8Array;
      readonly name: string;
      /** Null to have it recognised. */
      readonly reading: TableReading | null;
    }
  | {
      readonly kind: 'check';
      readonly bytes: Uint8Array;
      readonly name: string;
      readonly recipe: FileRecipe;
      /** The newest version of the panel that this would become the next of. */
      readonly current: PanelBlock | null;
    }
  | {
      readonly kind: 'read';
      readonly bytes: Uint8Array;
      readonly name: string;
      readonly recipe: FileRecipe;
    };

/** Rows of a panel by column; company codes point into `companies`, NaN stands for a missing cell. */
export interface PanelBlock {
  readonly companies: readonly string[];
  readonly company: Int32Array;
  readonly year: Int32Array;
  /** In the order of `values`. */
  readonly columns: readonly PanelColumn[];
  /** values[column][row] */
  readonly values: readonly Float64Array[];
}

/** A panel as read from a file. */
export interface FilePanel extends PanelBlock {
  /** Line of the file that each row begins on. */
  readonly fileRow: Int32Array;
  /** Currency of each row in the file; null where the file has none by row. */
  readonly currency: readonly string[] | null;
  /** The describing texts of each company, by header, in the order of `companies`. */
  readonly attributes: readonly Readonly<Record<string, string>>[];
}

export interface NumberedLine {
  readonly row: number;
  readonly cells: readonly string[];
}

export interface FilePreview {
  readonly sheets: readonly {
    readonly name: string;
    readonly rows: number;
    readonly columns: number;
  }[];
  /** As asked for, or as recognised. */
  readonly reading: TableReading;
  readonly headers: readonly string[];
  readonly firstRows: readonly NumberedLine[];
  readonly rowCount: number;
  readonly topLines: readonly NumberedLine[];
  readonly guess: Partial<Omit<FileRecipe, 'reading' | 'mending'>>;
}

export type FindingCode =
  | 'missing'
  | 'duplicate'
  | 'not-a-number'
  | 'ambiguous-number'
  | 'year'
  | 'no-company'
  | 'spelling'
  | 'no-rate'
  | 'currency'
  /** A figure with the sign or code of another currency. */
  | 'other-currency'
  /** A company’s name that says it is a sum or a mean of others. */
  | 'sum'
  | 'no-price-index'
  | 'formula'
  /** A mended cell or a left-out line that the file, as it is read, does not have. */
  | 'mending';

export interface FileFinding {
  readonly row: number;
  readonly column: string;
  readonly found: string;
  readonly code: FindingCode;
  readonly detail: string;
  readonly isBlocking: boolean;
  /** Of a duplicate: line of the first row with the same company and year; absent on that row itself. */
  readonly sameAs?: number;
}

export interface CellDifference {
  readonly company: string;
  readonly year: number;
  readonly kind: 'added-row' | 'removed-row' | 'changed-cell';
  readonly column: string | null;
  readonly before: number | null;
  readonly after: number | null;
}

export interface FileCheck {
  readonly companies: number;
  readonly years: number;
  readonly firstYear: number | null;
  readonly lastYear: number | null;
  readonly rows: number;
  readonly completeRows: number;
  readonly leftOutRows: number;
  /** The first 500, blocking ones first. */
  readonly findings: readonly FileFinding[];
  readonly findingCount: number;
  readonly blockingCount: number;
  readonly reviewRows: readonly (NumberedLine & {
    readonly isTaken: boolean;
    readonly isExcluded: boolean;
  })[];
  /** The first 500 groups. */
  readonly spellings: readonly (readonly { readonly company: string; readonly rows: number }[])[];
  readonly missingRates: readonly {
    readonly currency: string;
    readonly years: readonly number[];
  }[];
  readonly formulaCells: number;
  readonly firstRows: readonly {
    readonly row: number;
    readonly company: string;
    readonly year: number;
    readonly values: readonly (number | null)[];
  }[];
  readonly changes: {
    readonly addedRows: number;
    readonly removedRows: number;
    readonly changedCells: number;
    /** The first 500. */
    readonly listed: readonly CellDifference[];
  } | null;
}

export type ParseAnswer =
  | { readonly kind: 'preview'; readonly preview: FilePreview }
  | { readonly kind: 'check'; readonly check: FileCheck }
  | { readonly kind: 'read'; readonly panel: FilePanel }
  | { readonly kind: 'refused'; readonly code: string; readonly detail: string };
