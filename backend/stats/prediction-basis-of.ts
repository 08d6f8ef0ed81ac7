import { tQuantile } from './distributions/t-distribution';
import { familiarGroundOf } from './familiar-ground';
import type { OwnYear, PredictionBasis, Smearing } from './fit-result';
import { heldValues } from './held-values';
import { type Contrast, levelContrast, slopeContrast } from './intervals/contrast';
import { lambdasOf, residualForm, varianceForm } from './intervals/contrast-forms';
import { formsFor, type IntervalContext } from './intervals/interval-context';
import { contrastIntervalReason } from './intervals/interval-reasons';
import { toRows } from './linear-algebra/square-matrix';
import type { FitParts } from './fit-parts';
import { ownErrorsOf } from './own-errors';
import { peerYearsOf } from './peer-years';
import { twoSidedQuantile, yearEffectOrder } from './prediction';
import { perfectFitReason } from './regression/goodness';
import type { WithinFit } from './regression/within-fit';
import { yearEffectChoices } from './year-effect-choices';

export interface PredictionInput extends Pick<
  FitParts,
  'context' | 'ownIndex' | 'inference' | 'data' | 'specification'
> {
  readonly ownYears: readonly OwnYear[];
  readonly smearing: Smearing | null;
}

/** All that prediction of the own company needs; see `PredictionBasis` for the measures. */
export function predictionBasisOf(input: PredictionInput): PredictionBasis {
  const { context, ownIndex: own, inference, data, specification, ownYears, smearing } = input;
  const { fit } = context;
  const company = fit.sample.companies[own];
  const ownMeans = fit.regressors.map(({ origin, means }) => origin + means[own]);
  const last = ownYears[ownYears.length - 1];
  const { covariance } = inference;
  return {
    company,
    regressors: fit.sample.regressorNames,
    form: specification.form,
    lag: specification.lag,
    smear: smearing?.factor ?? null,
    coefficients: [fit.relativeIntercepts[own] + fit.interceptOrigin, ...fit.slopes],
    ownLevel: fit.outcome.origin + fit.outcome.means[own],
    ownMeans,
    ...calibratedForms(context, own),
    years: fit.sample.years.length,
    confidence: context.confidence,
    slopeCovariance: covariance === null ? null : toRows(covariance, fit.slopes.length),
    slopeDegreesOfFreedom: inference.degrees,
    slopeIntervalReason:
      context.reason === perfectFitReason ? perfectFitReason : inference.covarianceReason,
    ...(inference.noVarianceReason !== undefined && {
      slopeNoVarianceReason: inference.noVarianceReason,
    }),
    last,
    held:
      specification.lag === 0
        ? last.regressors
        : heldValues({ data, form: specification.form }, company, last.year),
    ownErrors: ownErrorsOf(context, own),
    peers: peerYearsOf(fit, own),
    residualVariance: fit.residualSquares / fit.residualDegreesOfFreedom,
    ...familiarGroundOf(fit, own, ownMeans),
  };
}

type CalibratedForms = Pick<
  PredictionBasis,
  'yearEffects' | 'lambdas' | 'a' | 'd' | 'quantile' | 'intervalReason'
>;

/** λ, A and D over [own level, slopes, year effects in `yearEffectOrder`], by the clock of the own company's level. */
function calibratedForms(context: IntervalContext, own: number): CalibratedForms {
  const { fit } = context;
  const years = yearEffectChoices(fit, own);
  const yearEffects = years?.estimates ?? null;
  const level = levelContrast(fit, own);
  // A company of fewer than 3 rows has no interval at all here, though a carried gap can weigh it by less than one half.
  const intervalReason = context.reason ?? contrastIntervalReason(fit, level);
  const { forms, cosines } = formsFor(context, level);
  const quantile = twoSidedQuantile(tQuantile, context.confidence, cosines);
  if (forms === null || intervalReason !== undefined) {
    return { yearEffects, lambdas: [], a: [], d: [], quantile, intervalReason };
  }
  const ofYears = years === null ? [] : yearEffectOrder.map((name) => years.contrasts[name]);
  const basis = [level, ...slopeContrasts(fit), ...ofYears];
  const lambdas = basis.map((contrast) => lambdasOf(forms, contrast, cosines));
  return {
    yearEffects,
    lambdas: Array.from({ length: cosines }, (_, cosine) => lambdas.map((row) => row[cosine])),
    a: basis.map((left) => basis.map((right) => varianceForm(forms, left, right))),
    d: basis.map((left) => basis.map((right) => residualForm(forms, left, right, cosines))),
    quantile,
  };
}

function slopeContrasts(fit: WithinFit): Contrast[] {
  return Array.from(fit.slopes, (_, k) =>
    slopeContrast(
      fit,
      fit.slopes.map((__, index) => (index === k ? 1 : 0)),
    ),
  );
}
