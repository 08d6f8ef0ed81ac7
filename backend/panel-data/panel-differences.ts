import { matchedColumns } from './matched-columns';
import type { PanelColumn } from './panel-cells';

/** Rows of a panel by column, as they are compared. */
export interface ComparedPanel {
  readonly companies: readonly string[];
  /** Position in `companies`, by row. */
  readonly company: ArrayLike<number>;
  readonly year: ArrayLike<number>;
  /** In the order of `values`. */
  readonly columns: readonly PanelColumn[];
  /** values[column][row]; NaN where a cell is missing. */
  readonly values: readonly ArrayLike<number>[];
}

export interface PanelDifference {
  readonly company: string;
  readonly year: number;
  readonly kind: 'added-row' | 'removed-row' | 'changed-cell';
  /** Header of the column, the later panel's where the two differ; null for a row. */
  readonly column: string | null;
  /** Null where there is no value. */
  readonly before: number | null;
  readonly after: number | null;
}

export interface PanelDifferences {
  readonly addedRows: number;
  readonly removedRows: number;
  readonly changedCells: number;
  /** The first ones: changed cells, then removed rows, then added ones; the counts are over all. */
  readonly listed: readonly PanelDifference[];
}

/**
 * What changes from one panel to another: rows by company and year, cells by equality of doubles, columns of the model by
 * what they are to it and further ones by header. A column that one of the two does not have counts as missing in all of its rows. Where a panel has a company and year
 * twice, its first row counts.
 *
 * @param mostListed  how many differences to list.
 */
export function panelDifferences(
  before: ComparedPanel,
  after: ComparedPanel,
  mostListed: number,
): PanelDifferences {
  const columns = matchedColumns(before.columns, after.columns).map((matched) => ({
    column: matched.column.name,
    ofBefore: matched.before === null ? undefined : before.values[matched.before],
    ofAfter: matched.after === null ? undefined : after.values[matched.after],
  }));
  const rowsBefore = rowsByKey(before, before.companies);
  const rowsAfter = rowsByKey(after, before.companies);
  const changed = new BoundedList(mostListed);
  const added = new BoundedList(mostListed);
  const removed = new BoundedList(mostListed);
  for (const [key, row] of rowsAfter) {
    const rowBefore = rowsBefore.get(key);
    const place = { company: after.companies[after.company[row]], year: after.year[row] };
    if (rowBefore === undefined) {
      added.add(() => ({ ...place, kind: 'added-row', column: null, before: null, after: null }));
      continue;
    }
    for (const { column, ofBefore, ofAfter } of columns) {
      const was = ofBefore?.[rowBefore] ?? NaN;
      const is = ofAfter?.[row] ?? NaN;
      if (was === is || (Number.isNaN(was) && Number.isNaN(is))) continue;
      changed.add(() => ({
        ...place,
        kind: 'changed-cell',
        column,
        before: valueOrNull(was),
        after: valueOrNull(is),
      }));
    }
  }
  for (const [key, row] of rowsBefore) {
    if (rowsAfter.has(key)) continue;
    const place = { company: before.companies[before.company[row]], year: before.year[row] };
    removed.add(() => ({ ...place, kind: 'removed-row', column: null, before: null, after: null }));
  }
  return {
    addedRows: added.count,
    removedRows: removed.count,
    changedCells: changed.count,
    listed: [...changed.first, ...removed.first, ...added.first].slice(0, mostListed),
  };
}

/** More than the widest year. */
const yearSpan = 65_536;

/**
 * The first row of each company and year.
 *
 * @param names  number the companies of both panels alike; further ones follow in order of appearance.
 */
function rowsByKey(panel: ComparedPanel, names: readonly string[]): ReadonlyMap<number, number> {
  const codes = new Map(names.map((name, code) => [name, code]));
  const codeOf = panel.companies.map((name) => {
    const code = codes.get(name) ?? codes.size;
    codes.set(name, code);
    return code;
  });
  const rows = new Map<number, number>();
  for (let row = 0; row < panel.company.length; row++) {
    const key = codeOf[panel.company[row]] * yearSpan + panel.year[row];
    if (!rows.has(key)) rows.set(key, row);
  }
  return rows;
}

/** Counts all and keeps the first. */
class BoundedList {
  readonly first: PanelDifference[] = [];
  count = 0;

  constructor(private readonly most: number) {}

  add(difference: () => PanelDifference): void {
    this.count += 1;
    if (this.first.length < this.most) this.first.push(difference());
  }
}

function valueOrNull(value: number): number | null {
  return Number.isNaN(value) ? null : value;
}
