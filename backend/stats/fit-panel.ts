import { canonicalFitText } from './canonical-fit-text';
import { checkSpecification } from './check-specification';
import { engineVersion } from './engine-version';
import type { FitResult, PanelColumns, Sample, Specification } from './fit-result';
import { intervalContext, type IntervalContext } from './intervals/interval-context';
import { toRows } from './linear-algebra/square-matrix';
import { ownYearsOf } from './own-years';
import type { PanelSample } from './panel/panel-sample';
import { selectSample } from './panel/select-sample';
import { predictionBasisOf } from './prediction-basis-of';
import { goodnessOf } from './regression/goodness';
import { pooledFit } from './regression/pooled-fit';
import { withinFit } from './regression/within-fit';
import { companyProducts } from './slopes/company-products';
import { slopeCovariance } from './slopes/slope-covariance';
import { contrastDegrees, slopeEstimates } from './slopes/slope-estimates';
import { withoutEachCompany } from './slopes/without-company';
import { driftOf } from './standing/drift-of';
import { gapPath } from './standing/gap-path';
import { interceptEstimates } from './standing/intercept-estimates';
import { pairComparisons } from './standing/pair-comparisons';
import { standingOf } from './standing/standing-of';
import { warningsOf } from './warnings/warnings-of';

/** What a fit needs from its surroundings. */
export interface FitOptions {
  /** SHA-256 of a text's UTF-8 bytes, in hex. */
  readonly sha256: (text: string) => string;
  /** Told the share done, 0 to 1, at each step. */
  readonly onProgress?: (share: number) => void;
}

/**
 * Fits the company effects model and reads off all that is shown of it.
 *
 * @param own  the own company; null for a fit without a standing.
 * @param members  names of the peer group, the own company is added; undefined means every company of the panel.
 * @throws {StatsError} for input the engine refuses, with what is concerned.
 */
export function fitPanel(
  data: PanelColumns,
  specification: Specification,
  own: string | null,
  members: readonly string[] | undefined,
  { sha256, onProgress = () => undefined }: FitOptions,
): FitResult {
  checkSpecification(specification);
  const sample = selectSample(data, own, members);
  const hash = sha256(canonicalFitText(sample, specification, own));
  onProgress(0.2);
  const fit = withinFit(sample);
  const { pooled, poolability } = pooledFit(fit);
  onProgress(0.4);
  const products = companyProducts(fit);
  const covariance = slopeCovariance(fit, products, specification.slopes);
  const slopes = slopeEstimates(fit, products, covariance, {
    name: specification.slopes,
    confidence: specification.confidence,
  });
  onProgress(0.5);
  const context = intervalContext(fit, specification.confidence);
  onProgress(0.7);
  const ownIndex = own === null ? -1 : sample.companies.indexOf(own);
  const intercepts = interceptEstimates(context);
  const withoutCompany = withoutEachCompany(fit, products, ownIndex);
  onProgress(0.8);
  const ofOwn = ownFigures(context, own, ownIndex);
  const prediction =
    ofOwn.ownYears === null
      ? null
      : predictionBasisOf(
          context,
          ownIndex,
          { covariance, degrees: contrastDegrees(fit, products, specification.slopes) },
          ofOwn.ownYears,
        );
  onProgress(1);
  return {
    engine: engineVersion,
    hash,
    specification,
    outcome: sample.outcomeName,
    members: sample.members,
    sample: sampleOf(sample),
    slopes,
    slopeCovariance: toRows(covariance, slopes.length),
    intercepts,
    yearEffects: null,
    ...ofOwn,
    goodness: goodnessOf(fit),
    pooled,
    poolability,
    withoutCompany,
    prediction,
    warnings: warningsOf({
      context,
      covariance: specification.slopes,
      slopes,
      withoutCompany,
      own: ownIndex,
      names: data.companies,
    }),
  };
}

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

function ownFigures(context: IntervalContext, own: string | null, index: number): OwnFigures {
  const none = { standing: null, pairs: null, gapPath: null, drift: null, ownYears: null };
  if (own === null) return none;
  const { fit } = context;
  if (index === -1) {
    const rows = fit.sample.singles.some(({ company }) => company === own) ? 'one' : 'no';
    const reason = `${own} has ${rows} complete row; a standing needs at least two.`;
    return { ...none, standingReason: reason, driftReason: reason, predictionReason: reason };
  }
  const pairs = pairComparisons(context, index);
  const drift = driftOf(context, index);
  return {
    standing: standingOf(context, index, pairs),
    pairs,
    gapPath: gapPath(fit, index),
    drift: drift.drift,
    driftReason: drift.drift === null ? drift.reason : undefined,
    ownYears: ownYearsOf(fit, index),
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
