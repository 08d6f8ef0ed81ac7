import type { Generated } from 'kysely';

export interface EditionTable {
  workspaceId: string;
  id: string;
  number: number;
  fitId: string;
  /** Canonical JSON, exactly as hashed. */
  content: string;
  sha256: string;
  confidentiality: 'confidential' | 'inside-information';
  state: 'waiting' | 'signed' | 'returned' | 'superseded';
  publishedBy: string;
  publishedAt: Generated<Date>;
  decidedBy: string | null;
  decidedAt: Date | null;
  decisionComment: string | null;
  supersededBy: string | null;
  /** The returned edition that this one answers. */
  answers: string | null;
}

export interface EditionWarningOpenedTable {
  workspaceId: string;
  editionId: string;
  warningId: string;
  personId: string;
  openedAt: Generated<Date>;
}

export interface EditionCommentTable {
  workspaceId: string;
  id: string;
  editionId: string;
  block: string;
  body: string;
  writtenBy: string;
  writtenAt: Generated<Date>;
}

export interface EditionAccessTable {
  workspaceId: string;
  id: string;
  editionId: string;
  personId: string;
  kind: 'viewed' | 'exported';
  format: string | null;
  at: Generated<Date>;
}
