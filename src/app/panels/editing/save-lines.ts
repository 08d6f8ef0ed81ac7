import type { PanelColumn, SaveCorrections } from '@contract';
import { columnTitle } from '../panel-rows';
import {
  type CellPlace,
  type EditGround,
  type PanelEdits,
  type SavedRows,
  cellKey,
  rowKey,
  toSaveCorrections,
} from './panel-edits';

/** A changed cell on its way to be saved. */
export interface SaveLine {
  readonly key: string;
  readonly place: CellPlace;
  readonly title: string;
  readonly before: number | null;
  readonly after: number | null;
}

/** What is said of the changes before they are saved; kept when the dialog is closed. */
export interface SaveDraft {
  readonly note: string;
  /** What fills the cells that have no reason or source of their own. */
  readonly common: EditGround;
  /** By cell key. */
  readonly own: ReadonlyMap<string, Partial<EditGround>>;
}

export const emptyDraft: SaveDraft = {
  note: '',
  common: { reason: '', source: '' },
  own: new Map(),
};

export function isEmptyDraft({ note, common, own }: SaveDraft): boolean {
  return note === '' && common.reason === '' && common.source === '' && own.size === 0;
}

/** Every changed cell, by company, year and column. */
export function saveLines(
  edits: PanelEdits,
  saved: SavedRows,
  columns: readonly PanelColumn[],
): readonly SaveLine[] {
  return [...edits.cells.entries()]
    .map(([key, { place, value }]) => ({
      key,
      place,
      title: columnTitle(columns[place.column]),
      before: saved.get(rowKey(place))?.values[place.column] ?? null,
      after: value,
    }))
    .sort(
      (left, right) =>
        left.place.company.localeCompare(right.place.company) ||
        left.place.year - right.place.year ||
        left.place.column - right.place.column,
    );
}

/** The reason and source of a cell: its own, or the common one. */
export function groundOf(draft: SaveDraft, key: string): EditGround {
  const own = draft.own.get(key);
  const filled = (part: keyof EditGround): string => {
    const text = own?.[part]?.trim() ?? '';
    return text === '' ? draft.common[part].trim() : text;
  };
  return { reason: filled('reason'), source: filled('source') };
}

/** What is still needed, in the order of the form; empty once it can be saved. */
export interface MissingGround {
  readonly note: boolean;
  /** Cells without a reason. */
  readonly reasons: number;
  /** Cells that get a value and do not say where it was found. */
  readonly sources: number;
}

export function missingGround(draft: SaveDraft, lines: readonly SaveLine[]): MissingGround {
  let [reasons, sources] = [0, 0];
  for (const { key, after } of lines) {
    const { reason, source } = groundOf(draft, key);
    if (reason === '') reasons += 1;
    if (after !== null && source === '') sources += 1;
  }
  return { note: draft.note.trim() === '', reasons, sources };
}

export function isComplete({ note, reasons, sources }: MissingGround): boolean {
  return !note && reasons === 0 && sources === 0;
}

export function draftCorrections(edits: PanelEdits, draft: SaveDraft): SaveCorrections {
  return toSaveCorrections(edits, draft.note, (place) => groundOf(draft, cellKey(place)));
}
