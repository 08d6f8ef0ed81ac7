import { type Kysely, sql } from 'kysely';
import type { Database } from '../schema/database';
import type { PanelOrigin, StoredColumn } from '../schema/panel-tables';
import { panelVersionQuery } from './panel-version-query';

export interface PanelVersionRow {
  readonly id: string;
  readonly panelId: string;
  readonly panelName: string;
  readonly number: number;
  readonly parentId: string | null;
  readonly origin: PanelOrigin;
  /** Of the version that was put back; null of another origin. */
  readonly restoredNumber: number | null;
  readonly currency: string;
  readonly unit: 'units' | 'thousands' | 'millions' | 'billions';
  readonly companyHeader: string;
  readonly yearHeader: string;
  readonly columns: readonly StoredColumn[];
  readonly note: string;
  readonly companies: number;
  readonly rowCount: number;
  readonly firstYear: number;
  readonly lastYear: number;
  readonly createdAt: Date;
  readonly createdByName: string;
  readonly fileId: string;
  readonly fileName: string;
  readonly fileByteSize: number;
  readonly fileSha256: string;
}

/** Rows of a panel version by column; `cells[row][column]`, null where a cell is missing. */
export interface PanelRows {
  readonly company: readonly string[];
  readonly year: readonly number[];
  readonly fileRow: readonly number[];
  readonly cells: readonly (readonly (number | null)[])[];
}

/** One row; `cells` hold a value a column, null where it is missing. */
export interface PanelLine {
  readonly company: string;
  readonly year: number;
  readonly cells: readonly (number | null)[];
}

/** The texts that describe a company, by header of the file. */
export interface CompanyAttributes {
  readonly company: string;
  readonly attributes: Readonly<Record<string, string>>;
}

/** Panels, their versions, and what describes their companies. */
export class PanelsRepository {
  constructor(
    private readonly db: Kysely<Database>,
    private readonly workspaceId: string,
  ) {}

  /** Makes whoever else adds a version to a panel of this name wait until the transaction ends. */
  async lockName(name: string): Promise<void> {
    const key = `${this.workspaceId} ${name}`;
    await sql`select pg_advisory_xact_lock(hashtextextended(${key}, 0))`.execute(this.db);
  }

  async insertPanel(id: string, name: string): Promise<void> {
    await this.db.insertInto('panel').values({ workspaceId: this.workspaceId, id, name }).execute();
  }

  /** The newest version of a panel. */
  findLatest(panelId: string): Promise<PanelVersionRow | undefined> {
    return this.versions()
      .where('panelVersion.panelId', '=', panelId)
      .orderBy('panelVersion.number', 'desc')
      .limit(1)
      .executeTakeFirst();
  }

  /** The newest version of the panel that a version is of; undefined where that one is the newest. */
  newerThan(
    panelVersionId: string,
  ): Promise<{ readonly id: string; readonly number: number } | undefined> {
    return this.db
      .selectFrom('panelVersion as known')
      .innerJoin('panelVersion as newer', (join) =>
        join
          .onRef('newer.workspaceId', '=', 'known.workspaceId')
          .onRef('newer.panelId', '=', 'known.panelId')
          .onRef('newer.number', '>', 'known.number'),
      )
      .select(['newer.id', 'newer.number'])
      .where('known.workspaceId', '=', this.workspaceId)
      .where('known.id', '=', panelVersionId)
      .orderBy('newer.number', 'desc')
      .limit(1)
      .executeTakeFirst();
  }

  /** All versions of a panel, the first one first. */
  versionsOfPanel(panelId: string): Promise<PanelVersionRow[]> {
    return this.versions()
      .where('panelVersion.panelId', '=', panelId)
      .orderBy('panelVersion.number')
      .execute();
  }

  /** The newest version of the panel with this name. */
  findLatestByName(name: string): Promise<PanelVersionRow | undefined> {
    return this.versions()
      .where('panel.name', '=', name)
      .orderBy('panelVersion.number', 'desc')
      .limit(1)
      .executeTakeFirst();
  }

  async insertVersion(version: {
    readonly id: string;
    readonly panelId: string;
    readonly number: number;
    readonly parentId: string | null;
    readonly fileId: string;
    readonly origin: PanelOrigin;
    /** How the file became the panel; null where no file was read for this version. */
    readonly recipe: object | null;
    readonly currency: string;
    readonly unit: 'units' | 'thousands' | 'millions' | 'billions';
    readonly companyHeader: string;
    readonly yearHeader: string;
    readonly columns: readonly StoredColumn[];
    readonly note: string;
    readonly companies: number;
    readonly rowCount: number;
    readonly firstYear: number;
    readonly lastYear: number;
    readonly createdBy: string;
  }): Promise<void> {
    await this.db
      .insertInto('panelVersion')
      .values({
        ...version,
        columns: JSON.stringify(version.columns),
        recipe: version.recipe === null ? null : JSON.stringify(version.recipe),
        workspaceId: this.workspaceId,
      })
      .execute();
  }

  findVersion(id: string): Promise<PanelVersionRow | undefined> {
    return this.versions().where('panelVersion.id', '=', id).executeTakeFirst();
  }

  listVersions(): Promise<PanelVersionRow[]> {
    return this.versions().orderBy('panelVersion.createdAt', 'desc').execute();
  }

  /** Companies without any describing text need no row. */
  async insertCompanies(
    panelVersionId: string,
    companies: readonly CompanyAttributes[],
  ): Promise<void> {
    await sql`insert into panel_company (workspace_id, panel_version_id, company, attributes)
      select ${this.workspaceId}::uuid, ${panelVersionId}::uuid, company, attributes::jsonb
      from unnest(
        ${companies.map(({ company }) => company)}::text[],
        ${companies.map(({ attributes }) => JSON.stringify(attributes))}::text[]
      ) as line(company, attributes)`.execute(this.db);
  }

  /** In order of name; companies that nothing describes are not among them. */
  companyAttributes(panelVersionId: string): Promise<CompanyAttributes[]> {
    return this.db
      .selectFrom('panelCompany')
      .select(['company', 'attributes'])
      .where('workspaceId', '=', this.workspaceId)
      .where('panelVersionId', '=', panelVersionId)
      .orderBy('company')
      .execute();
  }

  /** How the version's file became the panel; undefined for an unknown version, null where no recipe was kept. */
  async recipe(panelVersionId: string): Promise<object | null | undefined> {
    const found = await this.db
      .selectFrom('panelVersion')
      .select('recipe')
      .where('workspaceId', '=', this.workspaceId)
      .where('id', '=', panelVersionId)
      .executeTakeFirst();
    return found?.recipe;
  }

  /** The companies of a version, in order of name. */
  async companyNames(panelVersionId: string): Promise<string[]> {
    const found = await this.db
      .selectFrom('panelRow')
      .select('company')
      .distinct()
      .where('workspaceId', '=', this.workspaceId)
      .where('panelVersionId', '=', panelVersionId)
      .orderBy('company')
      .execute();
    return found.map(({ company }) => company);
  }

  /** The first and the last year of a company; undefined of one that the version does not have. */
  async yearsOf(
    panelVersionId: string,
    company: string,
  ): Promise<{ readonly first: number; readonly last: number } | undefined> {
    const { first, last } = await this.db
      .selectFrom('panelRow')
      .select(({ fn }) => [
        fn.min<number | null>('year').as('first'),
        fn.max<number | null>('year').as('last'),
      ])
      .where('workspaceId', '=', this.workspaceId)
      .where('panelVersionId', '=', panelVersionId)
      .where('company', '=', company)
      .executeTakeFirstOrThrow();
    return first === null || last === null ? undefined : { first, last };
  }

  /** Rows of the named companies, in order of company and year. */
  async rows(panelVersionId: string, companies: readonly string[]): Promise<PanelRows> {
    const found = await this.db
      .selectFrom('panelRow')
      .select(['company', 'year', 'fileRow', 'cells'])
      .where('workspaceId', '=', this.workspaceId)
      .where('panelVersionId', '=', panelVersionId)
      .where('company', '=', sql<string>`any(${[...companies]}::text[])`)
      .orderBy('company')
      .orderBy('year')
      .execute();
    return {
      company: found.map((row) => row.company),
      year: found.map((row) => row.year),
      fileRow: found.map((row) => row.fileRow),
      cells: found.map((row) => row.cells),
    };
  }

  /** Currency in the file of each row of the named companies, as `rows` orders them; null where it names none. */
  async rowCurrencies(
    panelVersionId: string,
    companies: readonly string[],
  ): Promise<(string | null)[]> {
    const found = await this.db
      .selectFrom('panelRow')
      .select('currency')
      .where('workspaceId', '=', this.workspaceId)
      .where('panelVersionId', '=', panelVersionId)
      .where('company', '=', sql<string>`any(${[...companies]}::text[])`)
      .orderBy('company')
      .orderBy('year')
      .execute();
    return found.map(({ currency }) => currency);
  }

  /** The next rows of a version in order of company and year, from the row after the one that is named. */
  async rowsAfter(
    panelVersionId: string,
    last: { readonly company: string; readonly year: number } | undefined,
    most: number,
  ): Promise<PanelLine[]> {
    let query = this.db
      .selectFrom('panelRow')
      .select(['company', 'year', 'cells'])
      .where('workspaceId', '=', this.workspaceId)
      .where('panelVersionId', '=', panelVersionId);
    if (last !== undefined)
      query = query.where(sql<boolean>`(company, year) > (${last.company}, ${last.year}::integer)`);
    return query.orderBy('company').orderBy('year').limit(most).execute();
  }

  private versions() {
    return panelVersionQuery(this.db, this.workspaceId);
  }
}
