import type { Generated, JSONColumnType } from 'kysely';

export interface PersonTable {
  id: string;
  email: string;
  name: string;
  passwordHash: string;
  preferences: JSONColumnType<object>;
  createdAt: Generated<Date>;
}

export interface SignInThrottleTable {
  key: string;
  failures: number;
  lastFailureAt: Date;
}

export interface WorkspaceTable {
  workspaceId: string;
  name: string;
  createdAt: Generated<Date>;
}

export interface MembershipTable {
  workspaceId: string;
  personId: string;
  roles: string[];
  joinedAt: Generated<Date>;
}

export interface InvitationTable {
  workspaceId: string;
  id: string;
  tokenHash: Buffer;
  email: string;
  roles: string[];
  createdBy: string;
  createdAt: Generated<Date>;
  expiresAt: Date;
  acceptedAt: Date | null;
  withdrawnAt: Date | null;
}

export interface ActivityTable {
  workspaceId: string;
  id: string;
  at: Generated<Date>;
  personId: string | null;
  action: string;
  subjectId: string | null;
  detail: JSONColumnType<object>;
}

export interface BillingAccountTable {
  workspaceId: string;
  customerId: string;
  subscriptionId: string;
  createdAt: Generated<Date>;
}
