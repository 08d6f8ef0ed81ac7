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
}

export interface PanelRowTable {
  workspaceId: string;
  panelVersionId: string;
  company: string;
  year: number;
  fileRow: number;
  cells: (number | null)[];
}

export interface ImportDraftTable {
  workspaceId: string;
  id: string;
  fileId: string;
  state: 'mapped' | 'checked' | 'committed';
  preview: JSONColumnType<object>;
  mapping: JSONColumnType<object>;
  findings: JSONColumnType<object> | null;
  panelVersionId: string | null;
  createdBy: string;
  createdAt: Generated<Date>;
}
