import type { Generated } from 'kysely';

export interface PeerGroupVersionTable {
  workspaceId: string;
  id: string;
  number: number;
  parentId: string | null;
  panelVersionId: string;
  ownCompany: string;
  note: string;
  peerCount: number;
  createdBy: string;
  createdAt: Generated<Date>;
}

export interface PeerChoiceTable {
  workspaceId: string;
  peerGroupVersionId: string;
  company: string;
  isIncluded: boolean;
  reason: string;
}
