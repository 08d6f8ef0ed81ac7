import { type Kysely, sql } from 'kysely';
import type { Database } from '../schema/database';

/** Where a compared column stands in the two versions; null where one does not have it. */
export interface ComparedColumn {
  readonly before: number | null;
  readonly after: number | null;
  /** Power of ten by which its values are multiplied in the first version, to be in the second one's unit. */
  readonly shift: number;
}

/** A row that differs; `before` or `after` is null where a version does not have it, else one value a compared column. */
export interface DifferingRow {
  readonly company: string;
  readonly year: number;
  /** In the unit of the second version. */
  readonly before: readonly (number | null)[] | null;
  readonly after: readonly (number | null)[] | null;
  /** Of each compared column; of a row that one version does not have, of no interest. */
  readonly isChanged: readonly boolean[];
}

export interface DifferingRows {
  readonly addedRows: number;
  readonly removedRows: number;
  readonly changedCells: number;
  /** Changed ones first, then removed ones, then added ones, each in order of company and year. */
  readonly first: readonly DifferingRow[];
}

interface CountedRow extends DifferingRow {
  readonly addedRows: number;
  readonly removedRows: number;
  readonly changedCells: number;
}

/** What two panel versions have different, found within PostgreSQL: nobody waits while 200,000 rows are compared. */
export class PanelDifferencesRepository {
  constructor(
    private readonly db: Kysely<Database>,
    private readonly workspaceId: string,
  ) {}

  /**
   * Values are the same when their doubles are; of a column that is shifted, when they agree in 15 digits: a decimal
   * fraction need not survive a power of ten.
   *
   * @param most  how many rows to answer; the counts are over all.
   */
  async between(
    beforeId: string,
    afterId: string,
    columns: readonly ComparedColumn[],
    most: number,
  ): Promise<DifferingRows> {
    const before = columns.map(({ before: place, shift }) => ({ place, shift }));
    const after = columns.map(({ after: place }) => ({ place, shift: 0 }));
    const isShifted = columns.map(({ shift }) => shift !== 0);
    const { rows } = await sql<CountedRow>`
      select company, year, before, after, is_changed,
        count(*) filter (where before is null) over () as added_rows,
        count(*) filter (where after is null) over () as removed_rows,
        sum(changed_cells) over ()::integer as changed_cells
      from ${this.#cellsOf(beforeId, before, 'before')} as first
      full join ${this.#cellsOf(afterId, after, 'after')} as second using (company, year)
      cross join lateral (
        select array_agg(changed order by place) as is_changed,
          count(*) filter (where changed and before is not null and after is not null)
            as changed_cells
        from (
          select place, was is distinct from comes
            and (not shifted or abs(was - comes) > 1e-15 * abs(comes)) is not false as changed
          from unnest(before, after, ${isShifted}::boolean[])
            with ordinality as cell(was, comes, shifted, place)
        ) as cells
      ) as counted
      where before is distinct from after
        and (before is null or after is null or changed_cells > 0)
      order by before is null, after is null, company, year
      limit ${most}`.execute(this.db);
    const [
      { addedRows, removedRows, changedCells } = { addedRows: 0, removedRows: 0, changedCells: 0 },
    ] = rows;
    return { addedRows, removedRows, changedCells, first: rows };
  }

  #cellsOf(
    id: string,
    columns: readonly { readonly place: number | null; readonly shift: number }[],
    name: string,
  ) {
    const cells = columns.map(({ place, shift }) =>
      place === null ? sql`null` : shiftedCell(place, shift),
    );
    return sql`(
      select company, year, array[${sql.join(cells)}]::double precision[] as ${sql.ref(name)}
      from panel_row where workspace_id = ${this.workspaceId} and panel_version_id = ${id}
    )`;
  }
}

/** Divided where it becomes smaller: a quotient by a power of ten is rounded once. */
function shiftedCell(place: number, shift: number) {
  const cell = sql`cells[${place + 1}::integer]`;
  const power = 10 ** Math.abs(shift);
  if (shift === 0) return cell;
  return shift > 0
    ? sql`${cell} * ${power}::double precision`
    : sql`${cell} / ${power}::double precision`;
}
