import type { InterceptEstimate } from '../fit-result';
import { interceptContrast } from '../intervals/contrast';
import { contrastInterval, type IntervalContext } from '../intervals/interval-context';
import { rowsOf } from '../intervals/interval-reasons';
import { withoutInterval } from '../prediction';
import type { WithinFit } from '../regression/within-fit';

const singleRowReason = 'One row fixes the intercept exactly and leaves nothing to judge it by.';

/** Every company's intercept, by name; companies with a single row get y − x'b, no deviation and no interval. */
export function interceptEstimates(context: IntervalContext): InterceptEstimate[] {
  const { fit } = context;
  const { companies, singles } = fit.sample;
  const relative = fit.relativeIntercepts;
  const mean = relative.reduce((sum, value) => sum + value, 0) / relative.length;
  const estimated = companies.map((company, index): InterceptEstimate => ({
    company,
    ...contrastInterval(
      context,
      relative[index] + fit.interceptOrigin,
      interceptContrast(fit, index),
      context.cosines,
    ),
    deviation: relative[index] - mean,
    rows: rowsOf(fit, index),
  }));
  const single = singles.map((row): InterceptEstimate => ({
    company: row.company,
    ...withoutInterval(singleIntercept(fit, row.outcome, row.regressors), singleRowReason),
    deviation: null,
    rows: 1,
  }));
  return [...estimated, ...single].sort((left, right) => (left.company < right.company ? -1 : 1));
}

function singleIntercept(fit: WithinFit, outcome: number, regressors: readonly number[]): number {
  let distance = outcome - fit.outcome.origin;
  regressors.forEach((value, k) => {
    distance -= (value - fit.regressors[k].origin) * fit.slopes[k];
  });
  return distance + fit.interceptOrigin;
}
