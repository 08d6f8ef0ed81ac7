import type { EstimatorSummary } from '../evidence/evidence';
import type { EstimatorGround } from './estimator';
import { estimatorTable } from './estimator-table';

/** The slopes by every estimator of the table, beside those of the fit. */
export function estimatorSummaries(open: EstimatorGround): EstimatorSummary[] {
  return estimatorTable.map((estimator) => ({ code: estimator.code, ...estimator.figures(open) }));
}
