import { engineVersion } from './engine-version';
import type { FitResult, Sample, Smearing } from './fit-result';
import { toRows } from './linear-algebra/square-matrix';
import type { FitParts } from './fit-parts';
import { ownYearsOf } from './own-years';
import type { PanelSample } from './panel/panel-sample';
import { predictionBasisOf } from './prediction-basis-of';
import { goodnessOf } from './regression/goodness';
import { smearingOf } from './regression/smearing';
import { yearEffectsOf } from './regression/year-columns';
import { driftOf } from './standing/drift-of';
import { gapPath } from './standing/gap-path';
import { interceptEstimates } from './standing/intercept-estimates';
import { pairComparisons } from './standing/pair-comparisons';
import { standingOf } from './standing/standing-of';
import { warningsOf } from './warnings/warnings-of';

/** All that is shown of a fit. */
export function fitResultOf(parts: FitParts): FitResult {
  const { data, specification, sample, fit, pooled, inference, context, ownIndex } = parts;
  const smearing = specification.form === 'log' ? smearingOf(fit, ownIndex) : null;
  const ofOwn = ownFigures(parts, smearing);
  return {
    engine: engineVersion,
    hash: parts.hash,
    specification,
    outcome: sample.outcomeName,
    members: sample.members,
    sample: sampleOf(sample),
    slopes: inference.slopes,
    slopeCovariance:
      inference.covariance === null ? null : toRows(inference.covariance, fit.slopes.length),
    slopeCovarianceReason: inference.covarianceReason,
    intercepts: interceptEstimates(context),
    yearEffects: yearEffects(parts),
    smearing,
    ...ofOwn,
    goodness: goodnessOf(fit),
    pooled: pooled.pooled,
    poolability: pooled.poolability,
    withoutCompany: parts.withoutCompany,
    prediction:
      ofOwn.ownYears === null
        ? null
        : predictionBasisOf({ ...parts, ownYears: ofOwn.ownYears, smearing }),
    warnings: warningsOf({
      context,
      covariance: specification.slopes,
      inference,
      withoutCompany: parts.withoutCompany,
      smearing,
      own: ownIndex,
      names: data.companies,
    }),
  };
}

function yearEffects({ fit, sample }: FitParts): FitResult['yearEffects'] {
  if (fit.yearColumns === 0) return null;
  const effects = yearEffectsOf(fit.coefficients.subarray(0, fit.yearColumns));
  return sample.years.map((year, position) => ({ year, estimate: effects[position] }));
}

const beyondFittedReason = 'A fitted value out of logs is beyond what a number can hold.';

type OwnFigures = Pick<
  FitResult,
  | 'standing'
  | 'standingReason'
  | 'pairs'
  | 'gapPath'
  | 'drift'
  | 'driftReason'
  | 'ownYears'
  | 'predictionReason'
>;

function ownFigures(
  { own, ownIndex, context, sample, specification }: FitParts,
  smearing: Smearing | null,
): OwnFigures {
  const none = { standing: null, pairs: null, gapPath: null, drift: null, ownYears: null };
  if (own === null) return none;
  const { fit } = context;
  if (ownIndex === -1) {
    const rows = sample.singles.some(({ company }) => company === own) ? 'one' : 'no';
    const reason = `${own} has ${rows} complete row; a standing needs at least two.`;
    return { ...none, standingReason: reason, driftReason: reason, predictionReason: reason };
  }
  const pairs = pairComparisons(context, ownIndex);
  const drift = driftOf(context, ownIndex);
  const ownYears = ownYearsOf(fit, ownIndex, smearing);
  return {
    standing: standingOf(context, { own: ownIndex, pairs, form: specification.form }),
    pairs,
    gapPath: gapPath(fit, ownIndex),
    drift: drift.drift,
    driftReason: drift.drift === null ? drift.reason : undefined,
    ownYears,
    predictionReason: ownYears === null ? (smearing?.reason ?? beyondFittedReason) : undefined,
  };
}

function sampleOf(sample: PanelSample): Sample {
  const companies = sample.companies.length;
  const years = sample.years.length;
  const observations = sample.year.length;
  return {
    companies,
    years,
    observations,
    balanced: observations === companies * years,
    firstYear: sample.years[0],
    lastYear: sample.years[years - 1],
    dropped: sample.dropped,
    singleRow: sample.singles.map(({ company }) => company),
  };
}
