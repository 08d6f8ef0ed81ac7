import { setImmediate } from 'node:timers/promises';
import { type Kysely, type RawBuilder, sql } from 'kysely';
import type { Database } from '../schema/database';
import { float8Array, int4Array, textArray } from './array-parameters';
import { batchRows } from './batches';

/** Rows of a panel version by column, all of the same length. */
export interface PanelBlockRows {
  /** In order of name when read. */
  readonly companies: readonly string[];
  /** Codes that point into `companies`. */
  readonly company: Int32Array;
  readonly year: Int32Array;
  readonly fileRow: Int32Array;
  /** values[column][row]; NaN stands for a missing cell. */
  readonly values: readonly Float64Array[];
  /** Currency of each row in the file; null where the file names none by row. */
  readonly currency: readonly (string | null)[] | null;
}

export interface InsertOptions {
  /** Told how many rows are written, after each batch. */
  readonly onWritten?: (rows: number) => void;
  /** Rejects with its reason before the next batch. */
  readonly signal?: AbortSignal;
}

/** Rows of panel versions as whole columns: 200,000 rows as objects take seconds, in which nobody else is answered. */
export class PanelRowsRepository {
  constructor(
    private readonly db: Kysely<Database>,
    private readonly workspaceId: string,
  ) {}

  /**
   * Writes all rows of a version. PostgreSQL refuses COPY into a table with row level security; arrays in statements took
   * as long as a COPY to a table on the side and a statement from there. The next statement is put into words while
   * PostgreSQL works on the one before: in turn, that was a quarter of the time.
   */
  async insert(
    panelVersionId: string,
    rows: PanelBlockRows,
    { onWritten, signal }: InsertOptions = {},
  ): Promise<void> {
    const names = rows.companies.map((name) => Buffer.from(name));
    const count = rows.year.length;
    const statement = (start: number) =>
      this.#insertOf(panelVersionId, rows, { start, end: start + batchRows, names });
    let next = statement(0);
    for (let written = 0; written < count; written += batchRows) {
      signal?.throwIfAborted();
      const end = written + batchRows;
      const [, following] = await Promise.all([
        next.execute(this.db),
        // Only then, so that the one before is on its way.
        end < count ? setImmediate().then(() => statement(end)) : next,
      ]);
      next = following;
      onWritten?.(Math.min(end, count));
    }
  }

  #insertOf(
    panelVersionId: string,
    rows: PanelBlockRows,
    { start, end, names }: { start: number; end: number; names: readonly Buffer[] },
  ): RawBuilder<unknown> {
    const company = Array.from(rows.company.subarray(start, end), (code) => names[code]);
    const currency = rows.currency?.slice(start, end) ?? null;
    const columns = rows.values.map((values, column) => ({
      name: sql.ref(`v${column}`),
      cells: float8Array(values.subarray(start, end)),
    }));
    const cells = sql.join(columns.map(({ name }) => name));
    return sql`insert into panel_row
        (workspace_id, panel_version_id, company, year, file_row, cells, currency)
      select ${this.workspaceId}::uuid, ${panelVersionId}::uuid, company, year, file_row,
        array[${cells}]::double precision[], currency
      from unnest(
        ${textArray(company)}::text[],
        ${int4Array(rows.year.subarray(start, end))}::integer[],
        ${int4Array(rows.fileRow.subarray(start, end))}::integer[],
        ${currency}::text[],
        ${sql.join(columns.map((column) => sql`${column.cells}::double precision[]`))}
      ) as line(company, year, file_row, currency, ${cells})`;
  }

  /**
   * All rows of a version, in order of company and year.
   *
   * @param columns  how many columns the version has.
   */
  async block(panelVersionId: string, columns: number): Promise<PanelBlockRows> {
    const ofVersion = sql`workspace_id = ${this.workspaceId} and panel_version_id = ${panelVersionId}`;
    const { rows: counted } = await sql<{ company: string; count: number; isPriced: boolean }>`
      select company, count(*) as count, bool_or(currency is not null) as is_priced
      from panel_row where ${ofVersion} group by company order by company`.execute(this.db);
    const hasCurrency = counted.some(({ isPriced }) => isPriced);
    const bytes = await this.#columnBytes(ofVersion, columns, hasCurrency);
    const company = new Int32Array(counted.reduce((sum, { count }) => sum + count, 0));
    let next = 0;
    counted.forEach(({ count }, code) => {
      company.fill(code, next, (next += count));
    });
    return {
      companies: counted.map((row) => row.company),
      company,
      year: new Int32Array(swapped(bytes.year, 4)),
      fileRow: new Int32Array(swapped(bytes.fileRow, 4)),
      values: bytes.values.map((column) => new Float64Array(swapped(column, 8))),
      currency: bytes.currency?.map((code) => (code === '' ? null : code)) ?? null,
    };
  }

  /**
   * One row of whole columns: numbers as PostgreSQL sends them, most significant byte first. Each column is a field of its
   * own: the driver reads an array of them character by character, which took 800 ms for 200,000 rows.
   */
  async #columnBytes(
    ofVersion: ReturnType<typeof sql>,
    columns: number,
    hasCurrency: boolean,
  ): Promise<{
    readonly year: Buffer;
    readonly fileRow: Buffer;
    readonly values: readonly Buffer[];
    readonly currency: readonly string[] | null;
  }> {
    const names = Array.from({ length: columns }, (_, column) => `v${column}` as const);
    const values = names.map(
      (name, column) =>
        sql`string_agg(float8send(coalesce(cells[${column + 1}::integer], 'NaN')), ''::bytea)
          as ${sql.ref(name)}`,
    );
    const {
      rows: [found],
    } = await sql<ColumnBytes>`
      select string_agg(int4send(year), ''::bytea) as year,
        string_agg(int4send(file_row), ''::bytea) as file_row,
        ${hasCurrency ? sql`convert_to(string_agg(coalesce(currency, ''), chr(10)), 'UTF8')` : sql`null::bytea`}
          as currency,
        ${sql.join(values)}
      from (
        select year, file_row, cells, currency from panel_row
        where ${ofVersion} order by company, year
      ) as line`.execute(this.db);
    const none = Buffer.alloc(0);
    return {
      year: found.year ?? none,
      fileRow: found.fileRow ?? none,
      values: names.map((name) => found[name] ?? none),
      currency: found.currency?.toString().split('\n') ?? null,
    };
  }
}

/** Null of a version without rows; the columns of the panel are `v0`, `v1` and so on. */
interface ColumnBytes extends Readonly<Record<`v${number}`, Buffer | null>> {
  readonly year: Buffer | null;
  readonly fileRow: Buffer | null;
  readonly currency: Buffer | null;
}

/** The bytes in an order and place that a typed array of this machine reads. */
function swapped(bytes: Buffer, width: 4 | 8): ArrayBuffer {
  const copy = new ArrayBuffer(bytes.length);
  const own = Buffer.from(copy);
  bytes.copy(own);
  if (width === 4) own.swap32();
  else own.swap64();
  return copy;
}
