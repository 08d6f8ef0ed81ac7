import { placeOfCell, type Table } from './table';
import type { TableFinding } from './table-finding';

/**
 * Collects findings and keeps the first of each kind, by line: a column without a single number has as many findings as
 * rows, of which nobody reads more than some hundreds.
 */
export class FindingList {
  readonly #most: number;
  #blocking: TableFinding[] = [];
  #others: TableFinding[] = [];
  #blockingCount = 0;
  #count = 0;

  /** @param most  how many blocking findings and how many others to keep. */
  constructor(most = Infinity) {
    this.#most = most;
  }

  add(finding: TableFinding): void {
    this.#count += 1;
    if (finding.isBlocking) {
      this.#blockingCount += 1;
      this.#blocking = this.#with(this.#blocking, finding);
    } else {
      this.#others = this.#with(this.#others, finding);
    }
  }

  /** All that were added, kept or not. */
  get count(): number {
    return this.#count;
  }

  get blockingCount(): number {
    return this.#blockingCount;
  }

  /** Those kept, blocking ones first, each kind by line. */
  first(): readonly TableFinding[] {
    const all = [...byLine(this.#blocking), ...byLine(this.#others)];
    return this.#most === Infinity ? all : all.slice(0, this.#most);
  }

  /** The list with one more; cut down to the first ones when it has grown to twice as many. */
  #with(list: TableFinding[], finding: TableFinding): TableFinding[] {
    list.push(finding);
    return list.length < 2 * this.#most ? list : byLine(list).slice(0, this.#most);
  }
}

/** What a finding says of a cell besides where it stands and what was found. */
export type CellRemark = Pick<TableFinding, 'code' | 'detail' | 'isBlocking'>;

/** A finding at one cell of a table; `row` and `column` count from 0. */
export function findingAt(
  table: Table,
  row: number,
  column: number,
  remark: CellRemark,
): TableFinding {
  const { line, header } = placeOfCell(table, row, column);
  return { row: line, column: header, found: table.rows[row][column], ...remark };
}

function byLine(list: readonly TableFinding[]): TableFinding[] {
  return list.toSorted((left, right) => left.row - right.row);
}
