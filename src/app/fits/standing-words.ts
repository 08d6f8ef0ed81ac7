import type { FitResult } from '@contract';
import { type NumberFormat, headlineDigits } from '../ui/number-format';
import { placesText, regressorWord } from './fit-words';
import { confidenceText, counted, listed, yearsText } from '../ui/phrases';

/** How many companies have a place: those with an intercept that counts. */
export function rankedCount(result: Pick<FitResult, 'intercepts'>): number {
  return result.intercepts.filter(({ deviation }) => deviation !== null).length;
}

type Standing = NonNullable<FitResult['standing']>;

/**
 * The finding of a fit in one sentence: `Velmara stands 1,810 (1,170 to 2,450) above its peers, place 2 to 5 of 13`.
 * An interval that spans zero is not called above or below.
 */
export function standingFinding(
  result: Pick<FitResult, 'standing' | 'standingReason' | 'intercepts' | 'prediction'>,
  ownCompany: string,
  numbers: NumberFormat,
): string {
  const { standing } = result;
  if (standing === null) return `${ownCompany} has no standing among its peers`;
  const place =
    standing.rankSet === null ? '' : `, ${placesText(standing.rankSet, rankedCount(result))}`;
  return `${standing.company} ${distanceText(standing, numbers)}${place}`;
}

function distanceText(standing: Standing, numbers: NumberFormat): string {
  const { estimate, low, high } = standing;
  if (low === null || high === null) {
    const side = estimate < 0 ? 'below' : 'above';
    return `stands ${numbers.headline(Math.abs(estimate))} ${side} its peers (no interval)`;
  }
  const text = (value: Parameters<NumberFormat['interval']>[0]): string =>
    numbers.interval(value, 'money', headlineDigits);
  if (low > 0) return `stands ${text(standing)} above its peers`;
  if (high < 0)
    return `stands ${text({ estimate: -estimate, low: -high, high: -low })} below its peers`;
  return `is not clearly apart from its peers: ${text(standing)}`;
}

/** Under the finding: unit, confidence, model and sample. */
export function standingSource(result: FitResult, numbers: NumberFormat): string {
  const { sample, specification, slopes } = result;
  const regressors = listed(slopes.map(({ name }, index) => regressorWord(name, index)));
  return [
    numbers.unitLabel(),
    `${confidenceText(specification.confidence)} intervals`,
    `company intercepts of market value on ${regressors}`,
    `${counted(sample.companies, 'company', 'companies')}, ${yearsText(sample.firstYear, sample.lastYear)}, ${counted(sample.observations, 'row')}`,
  ].join(' · ');
}

/** The unweighted mean of the peers' intercepts that count; null without any. */
export function meanOfPeers(
  result: Pick<FitResult, 'intercepts'>,
  ownCompany: string,
): number | null {
  const peers = result.intercepts.filter(
    ({ company, deviation }) => company !== ownCompany && deviation !== null,
  );
  if (peers.length === 0) return null;
  return peers.reduce((sum, { estimate }) => sum + estimate, 0) / peers.length;
}

/** A peer's place against the own company, as far as the data tell. */
export function shownText(shown: -1 | 0 | 1): string {
  if (shown === 0) return 'not told apart';
  return shown === 1 ? 'shown higher' : 'shown lower';
}
