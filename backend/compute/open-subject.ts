import { createHash } from 'node:crypto';
import { type FitOptions, type FitRequest, fitHash, openFit, StatsError } from '../stats';
import type { OpenFit } from '../stats/fit-parts';
import type { FitSubject, Refusal } from './messages';

/** @throws {StatsError} for input the engine refuses. */
export function openSubject(subject: FitSubject, onProgress?: FitOptions['onProgress']): OpenFit {
  return openFit(requestOf(subject), { sha256, onProgress });
}

/** The digest of the fit, without fitting. @throws {StatsError} where there is nothing to fit. */
export function hashOfSubject(subject: FitSubject): string {
  return fitHash(requestOf(subject), { sha256 });
}

function requestOf({ columns, specification, own, members }: FitSubject): FitRequest {
  return { data: columns, specification, own, members };
}

function sha256(text: string): string {
  return createHash('sha256').update(text).digest('hex');
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
