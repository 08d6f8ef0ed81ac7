import { type Kysely, sql } from 'kysely';
import type { Database } from '../schema/database';
import { int4Array, textArray } from './array-parameters';
import { batchesOf } from './batches';

export interface CorrectionRow {
  readonly company: string;
  readonly year: number;
  /** Position among the version's columns. */
  readonly columnIndex: number;
  readonly reason: string;
  /** Where the value was found; may be empty. */
  readonly source: string;
}

/** The last correction of a cell. */
export interface StandingRow extends CorrectionRow {
  readonly createdAt: Date;
  readonly createdByName: string;
  /** What it made of the cell, and what the cell was before; null where it was missing. */
  readonly value: number | null;
  readonly before: number | null;
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
    for (const batch of batchesOf(corrections)) await this.#insertBatch(panelVersionId, batch);
  }

  async #insertBatch(panelVersionId: string, corrections: readonly CorrectionRow[]): Promise<void> {
    await sql`insert into panel_correction
        (workspace_id, panel_version_id, company, year, column_index, reason, source)
      select ${this.workspaceId}::uuid, ${panelVersionId}::uuid, company, year, column_index,
        reason, source
      from unnest(
        ${textArray(corrections.map(({ company }) => company))}::text[],
        ${int4Array(Int32Array.from(corrections, ({ year }) => year))}::integer[],
        ${int4Array(Int32Array.from(corrections, ({ columnIndex }) => columnIndex))}::integer[],
        ${textArray(corrections.map(({ reason }) => reason))}::text[],
        ${textArray(corrections.map(({ source }) => source))}::text[]
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

  /**
   * The corrections that still hold in a version, of the named companies: back through corrections to their parents and
   * through restores to what they put back, as far as the import that all of it began with. Of a row that was removed
   * since and added anew, none holds.
   */
  async standing(panelVersionId: string, companies: readonly string[]): Promise<StandingRow[]> {
    const { rows } = await sql<StandingRow>`
      with recursive chain as (
        select id, parent_id, restored_id, origin, created_at, created_by, 0 as depth
        from panel_version
        where workspace_id = ${this.workspaceId} and id = ${panelVersionId}
        union all
        select older.id, older.parent_id, older.restored_id, older.origin, older.created_at,
          older.created_by, depth + 1
        from chain
        join panel_version as older on older.workspace_id = ${this.workspaceId}
          and older.id = case chain.origin
            when 'correction' then chain.parent_id
            when 'restore' then chain.restored_id
          end
      )
      select distinct on (made.company, made.year, made.column_index)
        made.company, made.year, made.column_index, made.reason, made.source,
        chain.created_at, person.name as created_by_name,
        became.cells[made.column_index + 1] as value, was.cells[made.column_index + 1] as before
      from chain
      join panel_correction as made
        on made.workspace_id = ${this.workspaceId} and made.panel_version_id = chain.id
      join person on person.id = chain.created_by
      join panel_row as became on became.workspace_id = made.workspace_id
        and became.panel_version_id = chain.id
        and became.company = made.company and became.year = made.year
      left join panel_row as was on was.workspace_id = made.workspace_id
        and was.panel_version_id = chain.parent_id
        and was.company = made.company and was.year = made.year
      where made.company = any(${[...companies]}::text[])
        and not exists (
          select from chain as later
          where later.depth < chain.depth and not exists (
            select from panel_row as kept
            where kept.workspace_id = ${this.workspaceId} and kept.panel_version_id = later.id
              and kept.company = made.company and kept.year = made.year
          )
        )
      order by made.company, made.year, made.column_index, chain.depth`.execute(this.db);
    return rows;
  }
}
