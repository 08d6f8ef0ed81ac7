import type { AskedPlan } from '../ui/plan/asked-plan';

interface HistoryStep {
  readonly plan: AskedPlan;
  /** What was done, as `Capex FY2026`. */
  readonly words: string;
}

/** The way back and forth between plans; the one on the page is not in it. */
export interface PlanHistory {
  /** What each step back leads to, the nearest last, with what the step after it did. */
  readonly past: readonly HistoryStep[];
  readonly future: readonly HistoryStep[];
  /** Of the last step, while a further one with the same key goes on with it. */
  readonly open: { readonly key: string; readonly atMs: number } | null;
}

export const noHistory: PlanHistory = { past: [], future: [], open: null };

/** Moves of one slider that follow each other within this time are one step. */
const togetherMs = 1000;

export interface PlanStep {
  readonly words: string;
  /** Steps with the same key that follow each other at once are one. */
  readonly key?: string;
}

/** With a step on from a plan; what could be done again before is gone. */
export function stepped(
  history: PlanHistory,
  from: AskedPlan,
  { words, key }: PlanStep,
  atMs: number,
): PlanHistory {
  const open = key === undefined ? null : { key, atMs };
  const goesOn =
    key !== undefined && history.open?.key === key && atMs - history.open.atMs < togetherMs;
  return goesOn
    ? { past: history.past, future: [], open }
    : { past: [...history.past, { plan: from, words }], future: [], open };
}

export interface Moved {
  readonly history: PlanHistory;
  readonly plan: AskedPlan;
  readonly words: string;
}

/** A step back; null where there is none. */
export function undone(history: PlanHistory, now: AskedPlan): Moved | null {
  const last = history.past.at(-1);
  if (last === undefined) return null;
  const { plan, words } = last;
  const future = [...history.future, { plan: now, words }];
  return { history: { past: history.past.slice(0, -1), future, open: null }, plan, words };
}

/** A step forth again; null where there is none. */
export function redone(history: PlanHistory, now: AskedPlan): Moved | null {
  const next = history.future.at(-1);
  if (next === undefined) return null;
  const { plan, words } = next;
  const past = [...history.past, { plan: now, words }];
  return { history: { past, future: history.future.slice(0, -1), open: null }, plan, words };
}
