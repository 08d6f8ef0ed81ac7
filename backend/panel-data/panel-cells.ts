import type { ModelRole } from './model-role';

export interface PanelColumn {
  /** The header in the file. */
  readonly name: string;
  readonly role: ModelRole | 'other';
}

/** The cells of a panel by column; rows in any order, one a company and year. */
export interface PanelCells {
  readonly companies: readonly string[];
  /** Position in `companies`, by row. */
  readonly company: ArrayLike<number>;
  readonly year: ArrayLike<number>;
  readonly columns: readonly PanelColumn[];
  /** values[column][row]; NaN where a cell is missing. */
  readonly values: readonly ArrayLike<number>[];
}
