import { tTwoSided } from '../distributions/t-distribution';
import type { Drift } from '../fit-result';
import { calibratedError, calibratedInterval } from '../intervals/calibrated-interval';
import { companyForms } from '../intervals/company-forms';
import { slopeContrast } from '../intervals/contrast';
import type { IntervalContext } from '../intervals/interval-context';
import { rowsOf } from '../intervals/interval-reasons';
import type { PanelSample } from '../panel/panel-sample';
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
 * year for the own company and the year for all peers, with the calibrated interval of that fit and the persistence
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
  const augmented = augmentedFit(fit.sample, own);
  if (typeof augmented === 'string') return { drift: null, reason: augmented };
  const slopes = augmented.slopes.length;
  const weights = new Float64Array(slopes);
  weights[slopes - 2] = 1;
  weights[slopes - 1] = -1;
  const estimate = augmented.slopes[slopes - 2] - augmented.slopes[slopes - 1];
  const reason = context.reason ?? (isPerfectFit(augmented) ? perfectFitReason : undefined);
  if (reason !== undefined)
    return { drift: { ...withoutInterval(estimate, reason), pValue: null } };
  const forms = companyForms(augmented, context.persistence.used, cosines);
  const error = calibratedError(forms, slopeContrast(augmented, weights), cosines);
  const interval = calibratedInterval(estimate, error, { cosines, confidence });
  const pValue =
    error.standardError === null ? null : tTwoSided(estimate / error.standardError, cosines);
  return { drift: { ...interval, pValue } };
}

/** The fit with the two trends beside its regressors, or why there is none. */
function augmentedFit(sample: PanelSample, own: number): WithinFit | string {
  const from = sample.starts[own];
  const to = sample.starts[own + 1];
  const middle = (sample.years[0] + sample.years[sample.years.length - 1]) / 2;
  const isOwn = (row: number): boolean => row >= from && row < to;
  const trend = (isIncluded: (row: number) => boolean): Float64Array =>
    Float64Array.from(sample.year, (year, row) => (isIncluded(row) ? year - middle : 0));
  try {
    return withinFit({
      ...sample,
      regressors: [...sample.regressors, trend(isOwn), trend((row) => !isOwn(row))],
      regressorNames: [...sample.regressorNames, 'year of the own company', 'year of the peers'],
    });
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
  'no-residual-degrees-of-freedom':
    'The rows are too few for the two more slopes that a drift needs.',
};
