import type { PanelColumns } from '../../backend/stats';

/** Bytes of a panel's columns: outcome, regressors, company, year and line of the file. */
export function bytesOf({ outcome, regressors, company, year, fileRow }: PanelColumns): number {
  const columns = [outcome.values, ...regressors.map(({ values }) => values)];
  return [...columns, company, year, fileRow].reduce((sum, { byteLength }) => sum + byteLength, 0);
}

/**
 * Bytes that are held at the end of a run beyond those before it, typed arrays and objects, garbage left out: what the
 * result and everything it keeps take. Needs node --expose-gc.
 */
export function peakGrowth(run: () => unknown): number {
  const collect = globalThis.gc;
  if (collect === undefined) throw new Error('expected node --expose-gc');
  collect();
  const before = heldBytes();
  const result = run();
  const grown = heldBytes() - before;
  return result === undefined ? 0 : grown;
}

function heldBytes(): number {
  const { heapUsed, arrayBuffers } = process.memoryUsage();
  return heapUsed + arrayBuffers;
}
