import {
  type CoverageWindow,
  type Flag,
  type PanelCells,
  flagsOf,
  largestWindow,
} from '@panel-data';

/** What the rules say of a panel's cells. */
export interface FoundInPanel {
  readonly flags: readonly Flag[];
  /** The largest one in which the model's columns are fully there; null where there is none. */
  readonly window: CoverageWindow | null;
}

export interface PanelQuestion {
  readonly cells: PanelCells;
  /** Positions of the columns that a window has to cover. */
  readonly columns: readonly number[];
  readonly ownCompany: string | null;
}

export function foundInPanel({ cells, columns, ownCompany }: PanelQuestion): FoundInPanel {
  return { flags: flagsOf(cells), window: largestWindow(cells, columns, ownCompany) };
}
