import { type PanelEdits, noEdits } from './panel-edits';

/** Edits with the way back and forth. */
export interface EditHistory {
  readonly now: PanelEdits;
  /** What each step back leads to, the nearest last, with what the step after it did. */
  readonly past: readonly EditStep[];
  readonly future: readonly EditStep[];
}

export interface EditStep {
  readonly edits: PanelEdits;
  /** What was done, as `3 cells pasted`. */
  readonly words: string;
}

export const noHistory: EditHistory = { now: noEdits, past: [], future: [] };

/** A step further; what could be done again before is gone. Edits that change nothing are no step. */
export function step(history: EditHistory, edits: PanelEdits, words: string): EditHistory {
  if (edits === history.now) return history;
  return { now: edits, past: [...history.past, { edits: history.now, words }], future: [] };
}

export function undo(history: EditHistory): EditHistory {
  const last = history.past.at(-1);
  if (last === undefined) return history;
  return {
    now: last.edits,
    past: history.past.slice(0, -1),
    future: [...history.future, { edits: history.now, words: last.words }],
  };
}

export function redo(history: EditHistory): EditHistory {
  const next = history.future.at(-1);
  if (next === undefined) return history;
  return {
    now: next.edits,
    past: [...history.past, { edits: history.now, words: next.words }],
    future: history.future.slice(0, -1),
  };
}
