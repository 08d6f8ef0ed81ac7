import { createHash } from 'node:crypto';
import { type FitOptions, openFit, StatsError } from '../stats';
import type { OpenFit } from '../stats/fit-parts';
import type { FitSubject, Refusal } from './messages';

/** @throws {StatsError} for input the engine refuses. */
export function openSubject(
  { columns, specification, own, members }: FitSubject,
  onProgress?: FitOptions['onProgress'],
): OpenFit {
  const sha256 = (text: string): string => createHash('sha256').update(text).digest('hex');
  return openFit({ data: columns, specification, own, members }, { sha256, onProgress });
}

/** Shares how far a worker is with the thread that waits for it. */
export function storeShare(progress: Int32Array): (share: number) => void {
  return (share) => {
    Atomics.store(progress, 0, Math.round(share * 1000));
  };
}

/** The engine's refusal as it crosses a message port. @throws whatever else went wrong. */
export function refusalOf(error: unknown): Refusal {
  if (!(error instanceof StatsError)) throw error;
  return { kind: 'refused', code: error.code, detail: error.message, data: error.data };
}
