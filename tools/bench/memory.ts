import type { PanelColumns } from '../../backend/stats';

/** Bytes of a panel's columns: outcome, regressors, company, year and line of the file. */
export function bytesOf({ outcome, regressors, company, year, fileRow }: PanelColumns): number {
  const columns = [outcome.values, ...regressors.map(({ values }) => values)];
  return [...columns, company, year, fileRow].reduce((sum, { byteLength }) => sum + byteLength, 0);
}

/**
 * The most bytes beyond those before a run that are taken at the end of one of its stages: typed arrays and objects, what
 * is garbage by then counted too unless it was collected on the way. Needs node --expose-gc.
 *
 * @param run  calls what it is given at the end of each stage.
 */
export function peakGrowth(run: (atStage: () => void) => unknown): number {
  const collect = globalThis.gc;
  if (collect === undefined) throw new Error('expected node --expose-gc');
  collect();
  const before = takenBytes();
  let most = before;
  const result = run(() => (most = Math.max(most, takenBytes())));
  return result === undefined ? 0 : most - before;
}

function takenBytes(): number {
  const { heapUsed, arrayBuffers } = process.memoryUsage();
  return heapUsed + arrayBuffers;
}
