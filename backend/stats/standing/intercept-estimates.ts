import type { InterceptEstimate } from '../fit-result';
import { type CalibratedError, calibratedInterval } from '../intervals/calibrated-interval';
import { interceptContrast } from '../intervals/contrast';
import { aloneError, contrastError, type IntervalContext } from '../intervals/interval-context';
import { rowsOf } from '../intervals/interval-reasons';
import { withoutInterval } from '../prediction';
import type { SingleRow } from '../panel/panel-sample';
import type { WithinFit } from '../regression/within-fit';
import { yearWeights } from '../regression/year-columns';

const singleRowReason = 'One row fixes the intercept exactly and leaves nothing to judge it by.';

/**
 * Every company's intercept, by name; companies with a single row get y − x'b, no deviation and no interval. The own
 * company's goes by its own clock, as all that is said of it; the others by the calendar.
 *
 * @param own  index of the own company; −1 without one.
 */
export function interceptEstimates(context: IntervalContext, own: number): InterceptEstimate[] {
  const { fit } = context;
  const errorOf = (company: number): CalibratedError => {
    const contrast = interceptContrast(fit, company);
    return company === own
      ? aloneError(context, contrast)
      : contrastError(context, contrast, context);
  };
  const { companies, singles } = fit.sample;
  const relative = fit.relativeIntercepts;
  const mean = relative.reduce((sum, value) => sum + value, 0) / relative.length;
  const estimated = companies.map((company, index): InterceptEstimate => ({
    company,
    ...calibratedInterval(
      relative[index] + fit.interceptOrigin,
      errorOf(index),
      context.confidence,
    ),
    deviation: relative[index] - mean,
    rows: rowsOf(fit, index),
  }));
  const single = singles.map((row): InterceptEstimate => ({
    company: row.company,
    ...withoutInterval(singleIntercept(fit, row), singleRowReason),
    deviation: null,
    rows: 1,
  }));
  return [...estimated, ...single].sort((left, right) => (left.company < right.company ? -1 : 1));
}

/** y − x'b (− the effect of its year; 0, their mean, where the sample has no such year). */
function singleIntercept(fit: WithinFit, single: SingleRow): number {
  const { years } = fit.sample;
  const position = years.indexOf(single.year);
  const inYears =
    fit.yearColumns === 0 || position === -1
      ? new Float64Array(fit.yearColumns)
      : yearWeights(years.length, position);
  let distance = single.outcome - fit.outcome.origin;
  [...inYears, ...single.regressors].forEach((value, k) => {
    distance -= (value - fit.columns[k].origin) * fit.coefficients[k];
  });
  return distance + fit.interceptOrigin;
}
