import { tUpperTail } from '../distributions/t-distribution';
import type { PairComparison } from '../fit-result';
import { pairContrast } from '../intervals/contrast';
import { type CalibratedError, calibratedInterval } from '../intervals/calibrated-interval';
import { contrastError, type IntervalContext } from '../intervals/interval-context';
import { fewestRowsForRank, rowsOf } from '../intervals/interval-reasons';
import { holmRejections } from './holm';

/**
 * a_own − a_peer for every peer, each with the standard error at the ranks' number of cosines, and what Holm's
 * correction over all one-sided hypotheses shows. A pair without an interval is told apart by nothing. Holm's m is
 * twice the number of peers with 3 rows or more: a shorter one has no place in the rank set, so no hypothesis about it
 * is tested, and counting it would only make the others harder to tell apart.
 *
 * @param own  index of the own company.
 */
export function pairComparisons(context: IntervalContext, own: number): PairComparison[] {
  const { fit, rankCosines } = context;
  const peers = fit.sample.companies.map((_, index) => index).filter((index) => index !== own);
  const pairs = peers.map((peer) => ({
    estimate: fit.relativeIntercepts[own] - fit.relativeIntercepts[peer],
    error: contrastError(context, pairContrast(fit, own, peer), rankCosines),
  }));
  const ranked = peers.map((peer) => rowsOf(fit, peer) >= fewestRowsForRank);
  const oneSided = pairs
    .filter((_, index) => ranked[index])
    .flatMap(({ estimate, error }) => oneSidedPValues(estimate, error));
  const isRejected = holmRejections(oneSided, 1 - context.confidence);
  let place = 0;
  return pairs.map(({ estimate, error }, index): PairComparison => {
    const company = fit.sample.companies[peers[index]];
    const pair = calibratedInterval(estimate, error, context.confidence);
    if (!ranked[index]) return { company, ...pair, shown: 0 };
    const isOwnHigher = isRejected[place];
    const isPeerHigher = isRejected[place + 1];
    place += 2;
    return { company, ...pair, shown: shownBy(isOwnHigher, isPeerHigher) };
  });
}

/** [own ≤ peer, own ≥ peer] as null hypotheses; rejecting the first shows that the own company is higher. */
function oneSidedPValues(estimate: number, error: CalibratedError): [number, number] {
  if (error.standardError === null || error.standardError === 0) return [1, 1];
  const statistic = estimate / error.standardError;
  return [tUpperTail(statistic, error.cosines), tUpperTail(-statistic, error.cosines)];
}

/** −1: the peer is shown to be lower; +1: shown to be higher than the own company. */
function shownBy(isOwnHigher: boolean, isPeerHigher: boolean): -1 | 0 | 1 {
  if (isOwnHigher) return -1;
  return isPeerHigher ? 1 : 0;
}
