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

/** A row as one version holds it. */
export interface RowInVersion {
  readonly panelVersionId: string;
  readonly cells: readonly (number | null)[];
  readonly corrections: readonly Omit<CorrectionRow, 'company' | 'year'>[];
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

  /** A row in every version of the panel that has it, with the corrections that each of them made in it. */
  async rowInVersions(
    panelId: string,
    { company, year }: { readonly company: string; readonly year: number },
  ): Promise<RowInVersion[]> {
    const { rows } = await sql<RowInVersion>`
      select version.id as panel_version_id, held.cells,
        coalesce((
          select jsonb_agg(jsonb_build_object(
            'columnIndex', made.column_index, 'reason', made.reason, 'source', made.source))
          from panel_correction as made
          where made.workspace_id = version.workspace_id and made.panel_version_id = version.id
            and made.company = held.company and made.year = held.year
        ), '[]') as corrections
      from panel_version as version
      join panel_row as held
        on held.workspace_id = version.workspace_id and held.panel_version_id = version.id
      where version.workspace_id = ${this.workspaceId} and version.panel_id = ${panelId}
        and held.company = ${company} and held.year = ${year}
      order by version.number`.execute(this.db);
    return rows;
  }
}
