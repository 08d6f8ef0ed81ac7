import type { ColumnType, Generated, JSONColumnType } from 'kysely';

export interface FitTable {
  workspaceId: string;
  id: string;
  panelVersionId: string;
  peerGroupId: string;
  specification: JSONColumnType<object>;
  specificationKey: string;
  state: 'queued' | 'running' | 'done' | 'failed' | 'cancelled';
  progress: ColumnType<object | null, string | null, string | null>;
  hash: string | null;
  result: ColumnType<object | null, string | null, string | null>;
  failure: ColumnType<object | null, string | null, string | null>;
  createdBy: string;
  createdAt: Generated<Date>;
  finishedAt: Date | null;
}

export interface JobTicketTable {
  id: string;
  workspaceId: string;
  kind: string;
  subjectId: string;
  createdAt: Generated<Date>;
}
