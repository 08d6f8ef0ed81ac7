import { type Kysely, sql } from 'kysely';
import type { Database } from '../schema/database';

export interface CorrectionRow {
  readonly company: string;
  readonly year: number;
  /** Position among the version's columns. */
  readonly columnIndex: number;
  readonly reason: string;
  /** Where the value was found; may be empty. */
  readonly source: string;
}

/** Why the cells of a corrected panel version differ from the version before. */
export class PanelCorrectionsRepository {
  constructor(
    private readonly db: Kysely<Database>,
    private readonly workspaceId: string,
  ) {}

  async insert(panelVersionId: string, corrections: readonly CorrectionRow[]): Promise<void> {
    await sql`insert into panel_correction
        (workspace_id, panel_version_id, company, year, column_index, reason, source)
      select ${this.workspaceId}::uuid, ${panelVersionId}::uuid, company, year, column_index,
        reason, source
      from unnest(
        ${corrections.map(({ company }) => company)}::text[],
        ${corrections.map(({ year }) => year)}::integer[],
        ${corrections.map(({ columnIndex }) => columnIndex)}::integer[],
        ${corrections.map(({ reason }) => reason)}::text[],
        ${corrections.map(({ source }) => source)}::text[]
      ) as line(company, year, column_index, reason, source)`.execute(this.db);
  }

  /** In order of company, year and column. */
  ofVersion(panelVersionId: string): Promise<CorrectionRow[]> {
    return this.db
      .selectFrom('panelCorrection')
      .select(['company', 'year', 'columnIndex', 'reason', 'source'])
      .where('workspaceId', '=', this.workspaceId)
      .where('panelVersionId', '=', panelVersionId)
      .orderBy('company')
      .orderBy('year')
      .orderBy('columnIndex')
      .execute();
  }
}
