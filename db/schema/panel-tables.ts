import type { Generated, JSONColumnType } from 'kysely';

export interface StoredFileTable {
  workspaceId: string;
  id: string;
  name: string;
  byteSize: number;
  sha256: string;
  content: Buffer;
  createdBy: string;
  createdAt: Generated<Date>;
}

export interface PanelTable {
  workspaceId: string;
  id: string;
  name: string;
  createdAt: Generated<Date>;
}

export interface StoredColumn {
  readonly name: string;
  readonly role: 'marketValue' | 'capex' | 'bookEquity' | 'other';
}

export interface PanelVersionTable {
  workspaceId: string;
  id: string;
  panelId: string;
  number: number;
  parentId: string | null;
  fileId: string;
  currency: string;
  unit: 'units' | 'thousands' | 'millions' | 'billions';
  companyHeader: string;
  yearHeader: string;
  columns: JSONColumnType<StoredColumn[]>;
  note: string;
  companies: number;
  rowCount: number;
  firstYear: number;
  lastYear: number;
  createdBy: string;
  createdAt: Generated<Date>;
  origin: Generated<PanelOrigin>;
  /** How the file became the panel; null of a version that no file was read for, and of early ones. */
  recipe: JSONColumnType<object> | null;
  /** The older version that this one put back; null unless it is a restore. */
  restoredId: string | null;
}

/** What made a version: a file, a set of corrections, or an older version put back. */
export type PanelOrigin = 'import' | 'correction' | 'restore';

export interface PanelRowTable {
  workspaceId: string;
  panelVersionId: string;
  company: string;
  year: number;
  fileRow: number;
  cells: (number | null)[];
  /** Currency of the row in the file; null where the file names none by row. */
  currency: string | null;
}

/** The texts that describe a company, by header of the file. */
export interface PanelCompanyTable {
  workspaceId: string;
  panelVersionId: string;
  company: string;
  attributes: JSONColumnType<Record<string, string>>;
}

/** Why a cell differs from the version before, and where its value was found. */
export interface PanelCorrectionTable {
  workspaceId: string;
  panelVersionId: string;
  company: string;
  year: number;
  columnIndex: number;
  reason: string;
  source: string;
}

export interface FlagDismissalTable {
  workspaceId: string;
  id: string;
  panelId: string;
  company: string;
  year: number;
  /** Header, since versions have their columns in other places; null where the whole row is meant. */
  columnName: string | null;
  code: string;
  value: number | null;
  reason: string;
  createdBy: string;
  createdAt: Generated<Date>;
}

export type ImportState = 'mapped' | 'checked' | 'committing' | 'failed' | 'committed';

export interface ImportDraftTable {
  workspaceId: string;
  id: string;
  fileId: string;
  state: ImportState;
  preview: JSONColumnType<object>;
  mapping: JSONColumnType<object>;
  findings: JSONColumnType<object> | null;
  panelVersionId: string | null;
  createdBy: string;
  createdAt: Generated<Date>;
  note: string | null;
  progress: JSONColumnType<ImportProgress> | null;
  failure: string | null;
  /** Of the commit under way, or of the last one. */
  commitId: string | null;
  committedBy: string | null;
}

/** Rows written, of all. */
export interface ImportProgress {
  readonly done: number;
  readonly of: number;
}
