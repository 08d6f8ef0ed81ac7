import type { OwnYear, PredictionBasis, Smearing } from './fit-result';
import { tQuantile } from './distributions/t-distribution';
import { levelContrast, slopeContrast } from './intervals/contrast';
import { lambdasOf, residualForm, varianceForm } from './intervals/contrast-forms';
import type { IntervalContext } from './intervals/interval-context';
import { contrastIntervalReason } from './intervals/interval-reasons';
import { congruence, type SquareMatrix, toRows } from './linear-algebra/square-matrix';
import type { FitParts } from './open-fit';
import { ownLeverages, observedRanges, peerLeverage } from './observed-range';
import { type SlopeDegreesOfFreedom, twoSidedQuantile } from './prediction';
import { isPerfectFit, perfectFitReason } from './regression/goodness';
import type { WithinFit } from './regression/within-fit';

export interface PredictionInput extends Pick<FitParts, 'context' | 'ownIndex' | 'inference'> {
  readonly ownYears: readonly OwnYear[];
  readonly smearing: Smearing | null;
}

/** All that prediction of the own company needs; see `PredictionBasis` for the measures. */
export function predictionBasisOf({
  context,
  ownIndex: own,
  inference: slopes,
  ownYears,
}: PredictionInput): PredictionBasis {
  const { fit } = context;
  const size = fit.slopes.length;
  const ownMeans = fit.regressors.map(({ origin, means }) => origin + means[own]);
  const unit = Float64Array.from({ length: size * size }, (_, index) =>
    index % (size + 1) === 0 ? 1 : 0,
  );
  const inverseCrossProduct = toRows(congruence(fit.inverseR, unit, size), size);
  const largestOwnLeverage = Math.max(...ownLeverages(inverseCrossProduct, ownMeans, ownYears));
  return {
    company: fit.sample.companies[own],
    regressors: fit.sample.regressorNames,
    coefficients: [fit.relativeIntercepts[own] + fit.interceptOrigin, ...fit.slopes],
    ownLevel: fit.outcome.origin + fit.outcome.means[own],
    ownMeans,
    years: fit.sample.years.length,
    ...calibratedForms(context, own),
    confidence: context.confidence,
    slopeCovariance: toRows(slopes.covariance!, size),
    slopeDegreesOfFreedom: slopes.degrees!,
    slopeIntervalReason: isPerfectFit(fit) ? perfectFitReason : undefined,
    last: ownYears[ownYears.length - 1],
    inverseCrossProduct,
    residualVariance: fit.residualSquares / fit.residualDegreesOfFreedom,
    largestOwnLeverage,
    largestLeverage: Math.max(largestOwnLeverage, peerLeverage(fit, fit.basis, own)),
    ...observedRanges(fit.sample, own),
  };
}

function calibratedForms(
  context: IntervalContext,
  own: number,
): Pick<PredictionBasis, 'lambdas' | 'a' | 'd' | 'quantile' | 'intervalReason'> {
  const { fit, forms, cosines } = context;
  const quantile = twoSidedQuantile(tQuantile, context.confidence, cosines);
  const basis = basisContrasts(fit, own);
  const intervalReason = context.reason ?? contrastIntervalReason(fit, basis[0]);
  if (forms === null || intervalReason !== undefined) {
    return { lambdas: [], a: [], d: [], quantile, intervalReason };
  }
  const lambdas = basis.map((contrast) => lambdasOf(forms, contrast, cosines));
  return {
    lambdas: Array.from({ length: cosines }, (_, cosine) => lambdas.map((row) => row[cosine])),
    a: basis.map((left) => basis.map((right) => varianceForm(forms, left, right))),
    d: basis.map((left) => basis.map((right) => residualForm(forms, left, right, cosines))),
    quantile,
  };
}

function basisContrasts(fit: WithinFit, own: number): ReturnType<typeof levelContrast>[] {
  const size = fit.slopes.length;
  return [
    levelContrast(fit, own),
    ...Array.from({ length: size }, (_, k) =>
      slopeContrast(
        fit,
        Float64Array.from({ length: size }, (__, index) => (index === k ? 1 : 0)),
      ),
    ),
  ];
}
