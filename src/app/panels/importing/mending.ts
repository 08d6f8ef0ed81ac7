import type { FileMending, ImportCheck } from '@contract';

/** Where a cell stands in the file: its line and its column's header there. */
export interface FileCell {
  readonly row: number;
  readonly column: string;
}

/** What the cell was mended to; undefined for one that was not. */
export function mendedText({ cells }: FileMending, place: FileCell): string | undefined {
  return cells.find((cell) => isAt(cell, place))?.text;
}

/** With the cell reading as `text`. */
export function withCell(mending: FileMending, place: FileCell, text: string): FileMending {
  const { row, column } = place;
  return {
    ...mending,
    cells: [...mending.cells.filter((cell) => !isAt(cell, place)), { row, column, text }],
  };
}

/** With the cell as the file has it. */
export function withoutCell(mending: FileMending, place: FileCell): FileMending {
  return { ...mending, cells: mending.cells.filter((cell) => !isAt(cell, place)) };
}

/** With the line left out. */
export function withoutLine(mending: FileMending, row: number): FileMending {
  return { ...mending, excludedRows: [...new Set([...mending.excludedRows, row])] };
}

/** With the line taken again. */
export function withLine(mending: FileMending, row: number): FileMending {
  return { ...mending, excludedRows: mending.excludedRows.filter((line) => line !== row) };
}

/** With all these names read as one of them. */
export function readAsOne(mending: FileMending, names: readonly string[], to: string): FileMending {
  const others = names.filter((name) => name !== to);
  const rest = mending.renames.filter(({ from }) => !names.includes(from));
  return { ...mending, renames: [...rest, ...others.map((from) => ({ from, to }))] };
}

/** With the names that were read as this one standing for themselves again. */
export function readApart(mending: FileMending, to: string): FileMending {
  return { ...mending, renames: mending.renames.filter((rename) => rename.to !== to) };
}

/** The names that are read as one, by the name that stands for them. */
export function renamedGroups({
  renames,
}: FileMending): readonly { readonly to: string; readonly from: readonly string[] }[] {
  const names = [...new Set(renames.map(({ to }) => to))];
  return names.map((to) => ({
    to,
    from: renames.filter((rename) => rename.to === to).map(({ from }) => from),
  }));
}

/** The groups of spellings that nothing has been decided about since the check. */
export function openSpellings(
  spellings: ImportCheck['spellings'],
  { renames }: FileMending,
): ImportCheck['spellings'] {
  const decided = new Set(renames.map(({ from }) => from));
  return spellings
    .map((group) => group.filter(({ company }) => !decided.has(company)))
    .filter((group) => group.length > 1 && group.some(({ rows }) => rows > 0));
}

function isAt(cell: FileCell, place: FileCell): boolean {
  return cell.row === place.row && cell.column === place.column;
}
