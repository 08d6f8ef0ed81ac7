import { type Kysely, sql } from 'kysely';
import type { Database } from '../schema/database';
import type { PanelOrigin } from '../schema/panel-tables';
import { int4Array, textArray } from './array-parameters';
import { batchesOf } from './batches';

export interface RowKey {
  readonly company: string;
  readonly year: number;
}

export interface PanelRow extends RowKey {
  /** One a column of the version; null where a cell is missing. */
  readonly cells: readonly (number | null)[];
}

/** How much a panel version holds. */
export interface PanelExtent {
  readonly companies: number;
  readonly rowCount: number;
  readonly firstYear: number;
  readonly lastYear: number;
}

export interface CopiedVersion extends PanelExtent {
  readonly id: string;
  /** The version whose file, recipe, columns, currency and unit this one has. */
  readonly sourceId: string;
  readonly number: number;
  readonly parentId: string;
  readonly origin: Exclude<PanelOrigin, 'import'>;
  readonly note: string;
  readonly createdBy: string;
}

/**
 * Panel versions made of other versions. Rows go from table to table within PostgreSQL: 200,000 rows through this process
 * take several times as long.
 */
export class PanelCopiesRepository {
  constructor(
    private readonly db: Kysely<Database>,
    private readonly workspaceId: string,
  ) {}

  /** Those of the named rows that the version has, in no order. */
  async rowsAt(panelVersionId: string, keys: readonly RowKey[]): Promise<PanelRow[]> {
    const { rows } = await sql<PanelRow>`
      select company, year, held.cells
      from ${keyTable(keys)} as key(company, year)
      join panel_row as held using (company, year)
      where held.workspace_id = ${this.workspaceId} and held.panel_version_id = ${panelVersionId}`.execute(
      this.db,
    );
    return rows;
  }

  /** What a version would hold without some of its rows and with others; undefined where nothing would be left. */
  async extentAfter(
    panelVersionId: string,
    { removed, added }: { readonly removed: readonly RowKey[]; readonly added: readonly RowKey[] },
  ): Promise<PanelExtent | undefined> {
    const { rows } = await sql<PanelExtent>`
      select count(*) as companies, sum(rows)::integer as row_count,
        min(first_year) as first_year, max(last_year) as last_year
      from (
        select company, count(*) as rows, min(year) as first_year, max(year) as last_year
        from (
          select company, year from panel_row
          where workspace_id = ${this.workspaceId} and panel_version_id = ${panelVersionId}
            and not ${isAmong(removed)}
          union all
          select company, year from ${keyTable(added)} as key(company, year)
        ) as line
        group by company
      ) as held
      having count(*) > 0`.execute(this.db);
    return rows[0];
  }

  async insertVersion(version: CopiedVersion): Promise<void> {
    const { id, sourceId, origin } = version;
    const restoredId = origin === 'restore' ? sourceId : null;
    await sql`insert into panel_version (workspace_id, id, panel_id, number, parent_id, restored_id,
        file_id, origin, recipe, currency, unit, company_header, year_header, columns, note,
        companies, row_count, first_year, last_year, created_by)
      select workspace_id, ${id}::uuid, panel_id, ${version.number}::integer,
        ${version.parentId}::uuid, ${restoredId}::uuid, file_id, ${origin}::text, recipe, currency,
        unit, company_header, year_header, columns, ${version.note}::text,
        ${version.companies}::integer, ${version.rowCount}::integer, ${version.firstYear}::integer,
        ${version.lastYear}::integer, ${version.createdBy}::uuid
      from panel_version
      where workspace_id = ${this.workspaceId} and id = ${sourceId}`.execute(this.db);
  }

  /** Copies all rows but the named ones. */
  async copyRows(sourceId: string, id: string, except: readonly RowKey[] = []): Promise<void> {
    await sql`insert into panel_row
        (workspace_id, panel_version_id, company, year, file_row, cells, currency)
      select workspace_id, ${id}::uuid, company, year, file_row, cells, currency
      from panel_row
      where workspace_id = ${this.workspaceId} and panel_version_id = ${sourceId}
        and not ${isAmong(except)}`.execute(this.db);
  }

  /** Copies the named rows with other cells; the line of the file and its currency stay theirs. */
  async copyChanged(sourceId: string, id: string, rows: readonly PanelRow[]): Promise<void> {
    for (const batch of batchesOf(rows)) await this.#copyBatch(sourceId, id, batch);
  }

  async #copyBatch(sourceId: string, id: string, rows: readonly PanelRow[]): Promise<void> {
    await sql`insert into panel_row
        (workspace_id, panel_version_id, company, year, file_row, cells, currency)
      select held.workspace_id, ${id}::uuid, company, year, held.file_row,
        changed.cells::double precision[], held.currency
      from ${rowTable(rows)} as changed(company, year, cells)
      join panel_row as held using (company, year)
      where held.workspace_id = ${this.workspaceId} and held.panel_version_id = ${sourceId}`.execute(
      this.db,
    );
  }

  /** Rows of no file: their line is 0. */
  async insertTyped(id: string, rows: readonly PanelRow[]): Promise<void> {
    await sql`insert into panel_row (workspace_id, panel_version_id, company, year, file_row, cells)
      select ${this.workspaceId}::uuid, ${id}::uuid, company, year, 0,
        typed.cells::double precision[]
      from ${rowTable(rows)} as typed(company, year, cells)`.execute(this.db);
  }

  /** Copies what describes the companies, of those that have rows in the copy. */
  async copyCompanies(sourceId: string, id: string): Promise<void> {
    await sql`insert into panel_company (workspace_id, panel_version_id, company, attributes)
      select workspace_id, ${id}::uuid, company, attributes
      from panel_company as described
      where workspace_id = ${this.workspaceId} and panel_version_id = ${sourceId}
        and exists (
          select from panel_row as held
          where held.workspace_id = described.workspace_id and held.panel_version_id = ${id}
            and held.company = described.company
        )`.execute(this.db);
  }
}

function keyTable(keys: readonly RowKey[]) {
  return sql`unnest(
    ${textArray(keys.map(({ company }) => company))}::text[],
    ${int4Array(Int32Array.from(keys, ({ year }) => year))}::integer[]
  )`;
}

function rowTable(rows: readonly PanelRow[]) {
  return sql`unnest(
    ${textArray(rows.map(({ company }) => company))}::text[],
    ${int4Array(Int32Array.from(rows, ({ year }) => year))}::integer[],
    ${textArray(rows.map(({ cells }) => `{${cells.map((cell) => cell ?? 'NULL').join(',')}}`))}::text[]
  )`;
}

/** Of a row of `panel_row`, which the statement around it reads. */
function isAmong(keys: readonly RowKey[]) {
  return sql`exists (
    select from ${keyTable(keys)} as named(company, year)
    where named.company = panel_row.company and named.year = panel_row.year
  )`;
}
