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

export interface FitEvidenceTable {
  workspaceId: string;
  fitId: string;
  evidence: ColumnType<object | null, string | null, never>;
  failure: string | null;
  createdAt: Generated<Date>;
}

export interface FitBootstrapTable {
  workspaceId: string;
  id: string;
  fitId: string;
  seed: number;
  state: 'queued' | 'running' | 'done' | 'failed' | 'cancelled';
  progress: ColumnType<object | null, string | null, string | null>;
  result: ColumnType<object | null, string | null, string | null>;
  failure: string | null;
  createdBy: string;
  createdAt: Generated<Date>;
  finishedAt: Date | null;
}

export interface JobTicketTable {
  id: string;
  workspaceId: string;
  kind: string;
  subjectId: string;
  /** The queue package's own id of the job, once it has been taken up. */
  jobId: string | null;
  /** When the server that works it last said so; null while nobody does. */
  heartbeatAt: Date | null;
  createdAt: Generated<Date>;
}
