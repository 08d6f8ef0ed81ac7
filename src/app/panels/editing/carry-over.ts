import type { PanelColumn } from '@contract';
import {
  type CellChange,
  type CellPlace,
  type PanelEdits,
  type RowPlace,
  type SavedRows,
  addRow,
  cellKey,
  countEdits,
  editedRows,
  noEdits,
  removeRows,
  rowKey,
  savedRows,
  setCells,
} from './panel-edits';
import { type SaveDraft, isEmptyDraft } from './save-lines';

/** A version of the panel, with what a person has changed in it and not saved. */
export interface EditedVersion {
  readonly columns: readonly PanelColumn[];
  readonly saved: SavedRows;
  readonly edits: PanelEdits;
}

/** Changed by the person in the older version and otherwise in the newer one. */
export type CarryConflict =
  | {
      readonly kind: 'cell';
      readonly key: string;
      /** In the newer version's columns. */
      readonly place: CellPlace;
      /** What both began from. */
      readonly before: number | null;
      readonly mine: number | null;
      /** Undefined where the newer version does not have the row any more. */
      readonly theirs: number | null | undefined;
    }
  /** Taken out by the person; the newer version has other figures in it. */
  | { readonly kind: 'row'; readonly key: string; readonly row: RowPlace };

/** What becomes of edits in a newer version; each of them is in one place here. */
export interface Carrying {
  /** What the newer version has as the older one had it, in the newer version's columns. */
  readonly cells: readonly CellChange[];
  readonly added: readonly RowPlace[];
  readonly removed: readonly RowPlace[];
  /** How many stand in the newer version just so. */
  readonly settled: number;
  readonly conflicts: readonly CarryConflict[];
  /** What the newer version has no column for, in the older version's columns. */
  readonly left: PanelEdits;
}

/** Holds the edits of a version against a newer one of the same panel, of the same currency and unit. */
export function carryOver(from: EditedVersion, onto: EditedVersion): Carrying {
  const columns = newColumns(from.columns, onto.columns);
  const shown = shownRows(onto);
  const [cells, conflicts]: [CellChange[], CarryConflict[]] = [[], []];
  let [left, settled] = [noEdits, 0];
  for (const change of from.edits.cells.values()) {
    const { place, value: mine } = change;
    const column = columns[place.column];
    if (column === undefined) {
      if (from.edits.added.has(rowKey(place))) left = addRow(left, from.saved, place);
      left = setCells(left, from.saved, [change]);
      continue;
    }
    const newPlace = { ...place, column };
    const before = from.saved.get(rowKey(place))?.values[place.column] ?? null;
    const row = shown.get(rowKey(place));
    const isNew = from.edits.added.has(rowKey(place));
    const theirs = row === undefined && isNew ? before : row?.values[column];
    if (Object.is(theirs, mine)) settled += 1;
    else if (Object.is(theirs, before)) cells.push({ place: newPlace, value: mine });
    else conflicts.push(contest(newPlace, before, mine, theirs));
  }
  const added = [...from.edits.added.values()].filter((row) => !shown.has(rowKey(row)));
  const removed: RowPlace[] = [];
  for (const [key, row] of from.edits.removed) {
    const [then, now] = [from.saved.get(key)?.values ?? [], shown.get(key)?.values];
    if (now === undefined) settled += 1;
    else if (
      then.every((value, at) => columns[at] === undefined || Object.is(value, now[columns[at]]))
    )
      removed.push(row);
    else conflicts.push({ kind: 'row', key, row });
  }
  settled += from.edits.added.size - added.length;
  return { cells, added, removed, settled, conflicts, left };
}

function contest(
  place: CellPlace,
  before: number | null,
  mine: number | null,
  theirs: number | null | undefined,
): CarryConflict {
  return { kind: 'cell', key: cellKey(place), place, before, mine, theirs };
}

/** The edits of the newer version once they are carried. @param mine  keys of the conflicts that go the person's way. */
export function carriedEdits(
  { cells, added, removed, conflicts }: Carrying,
  mine: ReadonlySet<string>,
  { saved, edits: before }: EditedVersion,
): PanelEdits {
  const won = conflicts.filter(({ key }) => mine.has(key));
  const wonCells = won.filter((conflict) => conflict.kind === 'cell');
  const wonRows = won.filter((conflict) => conflict.kind === 'row').map(({ row }) => row);
  const rows = [...added, ...wonCells.filter(({ theirs }) => theirs === undefined).map(rowOf)];
  const withRows = rows.reduce((edits, row) => addRow(edits, saved, row), before);
  const changes = wonCells.map(({ place, mine: value }) => ({ place, value }));
  const withCells = setCells(withRows, saved, [...cells, ...changes]);
  return removeRows(withCells, saved, [...removed, ...wonRows]);
}

/** What is said of the edits, for the newer version's columns; what is said there already gives way only where empty. */
export function carriedDraft(
  draft: SaveDraft,
  { cells, conflicts }: Carrying,
  from: readonly PanelColumn[],
  onto: readonly PanelColumn[],
  there: SaveDraft,
): SaveDraft {
  if (isEmptyDraft(draft)) return there;
  const columns = newColumns(from, onto);
  const contested = conflicts.filter((conflict) => conflict.kind === 'cell');
  const own = new Map(there.own);
  for (const { place } of [...cells, ...contested]) {
    const ground = draft.own.get(cellKey({ ...place, column: columns.indexOf(place.column) }));
    if (ground !== undefined) own.set(cellKey(place), { ...ground, ...own.get(cellKey(place)) });
  }
  return {
    note: there.note || draft.note,
    common: {
      reason: there.common.reason || draft.common.reason,
      source: there.common.source || draft.common.source,
    },
    own,
  };
}

/** Where each column stands in the newer version, found by its name; undefined where it is gone. */
function newColumns(
  from: readonly PanelColumn[],
  onto: readonly PanelColumn[],
): readonly (number | undefined)[] {
  const places = new Map(onto.map(({ name }, place) => [name, place]));
  return from.map(({ name }) => places.get(name));
}

function shownRows({ columns, saved, edits }: EditedVersion): SavedRows {
  if (countEdits(edits) === 0) return saved;
  return savedRows(editedRows([...saved.values()], saved, columns.length, edits));
}

function rowOf({ place: { company, year } }: { readonly place: CellPlace }): RowPlace {
  return { company, year };
}
