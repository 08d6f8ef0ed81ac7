import type { PanelSample } from '../panel/panel-sample';
import { type WithinFit, withinFit } from '../regression/within-fit';
import { StatsError } from '../stats-error';
import type { Evidence, WithoutYear } from './evidence';
import { withoutYearSample } from './without-year-sample';

/** Rows × years × squared columns beyond which refitting without every year takes longer than a reader waits. */
const mostWork = 2e8;

/**
 * Slopes and the own company's standing without each year in turn, a refit each: the rows of the year leave the sample,
 * nothing else about its selection changes (a lagged value keeps the row it came from). T fits of n·P² each.
 *
 * @param own  name of the own company; null without one.
 */
export function withoutEachYear(
  fit: WithinFit,
  own: string | null,
  onProgress: (share: number) => void = () => undefined,
): Pick<Evidence, 'withoutYear' | 'withoutYearReason'> {
  const { years, year } = fit.sample;
  const work = year.length * years.length * fit.columns.length ** 2;
  if (work > mostWork) {
    const withoutYearReason = `Leaving out each of ${years.length} years takes as many fits of ${year.length} rows and ${fit.columns.length} columns; that is not done for a sample of this size.`;
    return { withoutYear: [], withoutYearReason };
  }
  const withoutYear = years.map((left, position) => {
    onProgress(position / years.length);
    return withoutOneYear(fit, own, left);
  });
  return { withoutYear };
}

function withoutOneYear(fit: WithinFit, own: string | null, year: number): WithoutYear {
  const { sample, leftOut } = withoutYearSample(fit.sample, year);
  const dropped = leftOut.length === 0 ? {} : { leftOut };
  if (sample.companies.length < 2) {
    const reason = `Without ${year} fewer than two companies have two rows.`;
    return { year, slopes: null, standing: null, reason, ...dropped };
  }
  try {
    const refit = withinFit(sample, fit.effects);
    return {
      year,
      slopes: Array.from(refit.slopes),
      ...standingIn(refit, { own, year, leftOut }),
      ...dropped,
    };
  } catch (error) {
    if (!(error instanceof StatsError)) throw error;
    const reason = `Without ${year} the model cannot be estimated: ${error.message}.`;
    return { year, slopes: null, standing: null, reason, ...dropped };
  }
}

function standingIn(
  { sample, relativeIntercepts }: { sample: PanelSample; relativeIntercepts: Float64Array },
  { own, year, leftOut }: { own: string | null; year: number; leftOut: readonly string[] },
): Pick<WithoutYear, 'standing' | 'reason'> {
  const index = own === null ? -1 : sample.companies.indexOf(own);
  if (own !== null && leftOut.includes(own)) {
    const reason = `Without ${year} ${own} has a single row left, so there is no standing.`;
    return { standing: null, reason };
  }
  if (index === -1) {
    const reason =
      'No company of two complete rows or more is the own one, so there is no standing.';
    return { standing: null, reason };
  }
  const total = relativeIntercepts.reduce((sum, value) => sum + value, 0);
  const level = relativeIntercepts[index];
  return { standing: level - (total - level) / (relativeIntercepts.length - 1) };
}
