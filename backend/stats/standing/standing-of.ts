import type { IntervalPercent, PairComparison, Specification, Standing } from '../fit-result';
import { calibratedInterval } from '../intervals/calibrated-interval';
import { standingContrast } from '../intervals/contrast';
import { aloneError, type IntervalContext } from '../intervals/interval-context';
import { fewestRowsForRank, rowsOf } from '../intervals/interval-reasons';
import { type IntervalEstimate, outOfLogs } from '../prediction';

export interface StandingInput {
  /** Index of the own company. */
  readonly own: number;
  /** The own company's comparisons with every peer. */
  readonly pairs: readonly PairComparison[];
  readonly form: Specification['form'];
}

/**
 * The own company's intercept minus the unweighted mean of the others', with its calibrated interval, and the places
 * among the companies of 3 rows or more that the data cannot rule out. The mean takes in every peer; places and the
 * correction behind them count only those of 3 rows or more, because the others' intercepts have no interval.
 * In log form the standing is also given as percent, 100 · (exp(·) − 1).
 */
export function standingOf(
  context: IntervalContext,
  { own, pairs, form }: StandingInput,
): Standing {
  const { fit, persistence } = context;
  const relative = fit.relativeIntercepts;
  const others = relative.reduce((sum, value, index) => (index === own ? sum : sum + value), 0);
  const estimate = relative[own] - others / (relative.length - 1);
  const error = aloneError(context, standingContrast(fit, own));
  const interval = calibratedInterval(estimate, error, context.confidence);
  const ownPersistence = persistence.own[own];
  return {
    company: fit.sample.companies[own],
    ...interval,
    calibration: error.calibration,
    cosines: error.standardError === null ? context.cosines : error.cosines,
    persistence: persistence.pooled,
    ownPersistence: Number.isNaN(ownPersistence) ? null : ownPersistence,
    ...rankOf(context, own, pairs),
    ...(form === 'log' && { percent: percentOf(interval) }),
  };
}

function percentOf(interval: IntervalEstimate): IntervalPercent {
  return outOfLogs(interval, (log) => 100 * Math.expm1(log));
}

function rankOf(
  context: IntervalContext,
  own: number,
  pairs: readonly PairComparison[],
): Pick<Standing, 'rank' | 'rankSet' | 'rankReason'> {
  const { fit } = context;
  if (rowsOf(fit, own) < fewestRowsForRank) {
    const rankReason = `${fit.sample.companies[own]} has ${rowsOf(fit, own)} rows; a rank needs at least ${fewestRowsForRank}.`;
    return { rank: null, rankSet: null, rankReason };
  }
  const ranked = fit.sample.companies
    .map((_, index) => index)
    .filter((index) => rowsOf(fit, index) >= fewestRowsForRank);
  if (ranked.length < 2) {
    const rankReason = `No peer has ${fewestRowsForRank} rows or more, so there is no one to rank against.`;
    return { rank: null, rankSet: null, rankReason };
  }
  const higher = ranked.filter(
    (index) => fit.relativeIntercepts[index] > fit.relativeIntercepts[own],
  );
  const rank = 1 + higher.length;
  if (context.reason !== undefined) return { rank, rankSet: null, rankReason: context.reason };
  const shownHigher = pairs.filter(({ shown }) => shown === 1).length;
  const shownLower = pairs.filter(({ shown }) => shown === -1).length;
  return { rank, rankSet: [1 + shownHigher, ranked.length - shownLower] };
}
