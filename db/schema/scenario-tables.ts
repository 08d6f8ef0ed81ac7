import type { Generated, JSONColumnType } from 'kysely';

export interface ScenarioTable {
  workspaceId: string;
  id: string;
  fitId: string;
  version: number;
  createdBy: string;
  createdAt: Generated<Date>;
  deletedAt: Date | null;
  copiedFromId: string | null;
  copiedFromVersion: number | null;
}

/** Null where a version was stored before there was a choice. */
interface PlanReadingColumns {
  outlook: JSONColumnType<object> | null;
  rules: JSONColumnType<object[]> | null;
  uncertainty: JSONColumnType<object> | null;
}

export interface ScenarioVersionTable extends PlanReadingColumns {
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

export interface ScenarioDraftTable extends PlanReadingColumns {
  workspaceId: string;
  fitId: string;
  personId: string;
  scenarioId: string | null;
  name: string;
  note: string;
  plan: JSONColumnType<object[]>;
  updatedAt: Generated<Date>;
}
