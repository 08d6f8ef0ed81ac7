import type { ColumnType, Generated, JSONColumnType } from 'kysely';

export interface PeerTrialTable {
  workspaceId: string;
  id: string;
  panelVersionId: string;
  request: JSONColumnType<object>;
  requestKey: string;
  state: 'queued' | 'running' | 'done' | 'failed' | 'cancelled';
  outcomes: ColumnType<object, string | undefined, string>;
  failure: string | null;
  createdBy: string;
  createdAt: Generated<Date>;
  finishedAt: Date | null;
}

export interface TrialFitTable {
  workspaceId: string;
  hash: string;
  outcome: JSONColumnType<object>;
  createdAt: Generated<Date>;
}
