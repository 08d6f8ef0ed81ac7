import { engineVersion } from '../engine-version';
import { estimatorSummaries } from '../estimators/estimator-summaries';
import { residualSummary } from '../influence/residual-summary';
import type { OpenFit } from '../fit-parts';
import { covarianceSummaries } from '../slopes/covariance-summaries';
import { testSummary } from '../tests/test-summary';
import { alternativesOf } from './alternatives';
import type { Evidence } from './evidence';
import { regressorLines } from './regressor-lines';
import { verdictOf } from './verdict';
import { withoutEachYear } from './without-year';

/**
 * What speaks for and against a fit, read off what it was made from; other models and other years are fitted beside it.
 *
 * @param onProgress  told the share done, 0 to 1, at each step.
 */
export function evidenceOf(
  open: OpenFit,
  onProgress: (share: number) => void = () => undefined,
): Evidence {
  const { fit, pooled, ownIndex, result } = open;
  const estimators = estimatorSummaries(open);
  onProgress(0.1);
  const covariances = covarianceSummaries(open);
  onProgress(0.3);
  const tests = testSummary(open);
  onProgress(0.5);
  const withoutYear = withoutEachYear(fit, open.own, (share) => {
    onProgress(0.5 + 0.2 * share);
  });
  const alternatives = alternativesOf(open, estimators, (share) => {
    onProgress(0.7 + 0.25 * share);
  });
  const residuals = residualSummary(open);
  onProgress(0.98);
  const judged = { estimators, covariances, tests, ...withoutYear, alternatives };
  const evidence: Evidence = {
    engine: engineVersion,
    hash: open.hash,
    verdict: verdictOf({ result, ...judged }),
    lines: regressorLines(fit, pooled, ownIndex),
    ...judged,
    residuals,
  };
  onProgress(1);
  return evidence;
}
