import type { Generated, JSONColumnType } from 'kysely';

export interface ScenarioTable {
  workspaceId: string;
  id: string;
  fitId: string;
  version: number;
  createdBy: string;
  createdAt: Generated<Date>;
  deletedAt: Date | null;
}

export interface ScenarioVersionTable {
  workspaceId: string;
  scenarioId: string;
  version: number;
  name: string;
  note: string;
  plan: JSONColumnType<object[]>;
  years: JSONColumnType<object[]>;
  createdBy: string;
  createdAt: Generated<Date>;
}

export interface ScenarioDraftTable {
  workspaceId: string;
  fitId: string;
  personId: string;
  scenarioId: string | null;
  name: string;
  note: string;
  plan: JSONColumnType<object[]>;
  updatedAt: Generated<Date>;
}
