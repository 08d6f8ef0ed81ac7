import { tTwoSided } from '../distributions/t-distribution';
import type { Drift } from '../fit-result';
import { calibratedInterval } from '../intervals/calibrated-interval';
import { slopeContrast } from '../intervals/contrast';
import type { IntervalContext } from '../intervals/interval-context';
import { rowsOf } from '../intervals/interval-reasons';
import { dot } from '../linear-algebra/square-matrix';
import type { PanelSample } from '../panel/panel-sample';
import { calendar } from '../intervals/contrast-clock';
import { cosineWeights } from '../intervals/cosine-weights';
import { singleContrastError } from '../intervals/single-contrast';
import { withoutInterval } from '../prediction';
import { isPerfectFit, perfectFitReason } from '../regression/goodness';
import { type WithinFit, withinFit } from '../regression/within-fit';
import { StatsError } from '../stats-error';

const fewestRows = 8;

/** The drift, or why there is none. */
export type DriftOrReason =
  { readonly drift: Drift } | { readonly drift: null; readonly reason: string };

/**
 * How much the gap between the own company and its peers widens a year: δ_own − δ_peers of the fit augmented by the
 * year for the own company and the year for all peers (δ_own alone beside year effects), with the calibrated interval of that fit and the persistence
 * of the original one.
 *
 * @param own  index of the own company.
 */
export function driftOf(context: IntervalContext, own: number): DriftOrReason {
  const { fit, rankCosines: cosines, confidence } = context;
  const rows = rowsOf(fit, own);
  if (rows < fewestRows) {
    const reason = `${fit.sample.companies[own]} has ${rows} rows; a drift needs at least ${fewestRows}.`;
    return { drift: null, reason };
  }
  const augmented = augmentedFit(fit, own);
  if (typeof augmented === 'string') return { drift: null, reason: augmented };
  const slopeWeights = Float64Array.from(augmented.slopes, (_, k) => driftWeight(fit, k));
  const estimate = dot(slopeWeights, augmented.slopes);
  const reason = context.reason ?? (isPerfectFit(augmented) ? perfectFitReason : undefined);
  if (reason !== undefined)
    return { drift: { ...withoutInterval(estimate, reason), pValue: null } };
  const contrast = slopeContrast(augmented, slopeWeights);
  const weights = cosineWeights(calendar(fit.sample.years.length), cosines);
  const error = singleContrastError(augmented, contrast, context.persistence.used, weights);
  const interval = calibratedInterval(estimate, error, confidence);
  const pValue =
    error.standardError === null ? null : tTwoSided(estimate / error.standardError, error.cosines);
  return { drift: { ...interval, pValue } };
}

/** +1 for the own company's trend, −1 for the peers', 0 for a regressor; k counts the augmented slopes. */
function driftWeight(fit: WithinFit, k: number): number {
  const place = k - fit.slopes.length;
  if (place < 0) return 0;
  return place === 0 ? 1 : -1;
}

/**
 * The fit with the trends beside its regressors, or why there is none. Year effects take up a trend of all peers, so
 * with them the own company's alone is added.
 */
function augmentedFit(fit: WithinFit, own: number): WithinFit | string {
  const { sample } = fit;
  const from = sample.starts[own];
  const to = sample.starts[own + 1];
  const middle = (sample.years[0] + sample.years[sample.years.length - 1]) / 2;
  const isOwn = (row: number): boolean => row >= from && row < to;
  const trend = (isIncluded: (row: number) => boolean): Float64Array =>
    Float64Array.from(sample.year, (year, row) => (isIncluded(row) ? year - middle : 0));
  const trends = [{ name: 'year of the own company', values: trend(isOwn) }];
  if (fit.yearColumns === 0) {
    trends.push({ name: 'year of the peers', values: trend((row) => !isOwn(row)) });
  }
  const augmented: PanelSample = {
    ...sample,
    regressors: [...sample.regressors, ...trends.map(({ values }) => values)],
    regressorNames: [...sample.regressorNames, ...trends.map(({ name }) => name)],
  };
  try {
    return withinFit(augmented, fit.effects);
  } catch (error) {
    const reason = error instanceof StatsError ? reasons[error.code] : undefined;
    if (reason === undefined) throw error;
    return reason;
  }
}

const straightLineReason =
  'The regressors themselves run in a straight line over time, so a drift cannot be told from them.';

const reasons: Readonly<Partial<Record<StatsError['code'], string>>> = {
  'collinear-regressors': straightLineReason,
  'constant-within-companies': straightLineReason,
  'same-for-all-companies': straightLineReason,
  'no-residual-degrees-of-freedom':
    'The rows are too few for the two more slopes that a drift needs.',
};
