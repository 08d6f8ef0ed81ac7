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
}
