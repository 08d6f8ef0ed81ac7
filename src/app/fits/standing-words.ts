import type { FitResult } from '@contract';
import {
  type Bounded,
  asDifference,
  differenceKind,
  differenceUnit,
  levelUnit,
} from '../ui/model-form';
import { type FigureKind, type NumberFormat, headlineDigits } from '../ui/number-format';
import { modelText, placesText } from './fit-words';
import { confidenceText, counted, yearsText } from '../ui/phrases';

/** How many companies have a place: those with an intercept that counts. */
export function rankedCount(result: Pick<FitResult, 'intercepts'>): number {
  return result.intercepts.filter(({ deviation }) => deviation !== null).length;
}

/**
 * The finding of a fit in one sentence: `Velmara stands 1,810 (1,170 to 2,450) above its peers, place 2 to 5 of 13`,
 * in log form `34.2 % (12.1 to 60.4 %) above`. An interval that spans zero is not called above or below.
 */
export function standingFinding(
  result: Pick<FitResult, 'standing' | 'intercepts' | 'specification'>,
  ownCompany: string,
  numbers: NumberFormat,
): string {
  const { standing } = result;
  if (standing === null) return `${ownCompany} has no standing among its peers`;
  const place =
    standing.rankSet === null ? '' : `, ${placesText(standing.rankSet, rankedCount(result))}`;
  const { form } = result.specification;
  const distance = distanceText(asDifference(standing, form), differenceKind(form), numbers);
  return `${standing.company} ${distance}${place}`;
}

function distanceText(standing: Bounded, kind: FigureKind, numbers: NumberFormat): string {
  const { estimate, low, high } = standing;
  if (low === null || high === null) {
    const side = estimate < 0 ? 'below' : 'above';
    return `stands ${numbers.headline(Math.abs(estimate), kind)} ${side} its peers (no interval)`;
  }
  const text = (value: Bounded): string => numbers.interval(value, kind, headlineDigits);
  if (low > 0) return `stands ${text(standing)} above its peers`;
  if (high < 0)
    return `stands ${text({ estimate: -estimate, low: -high, high: -low })} below its peers`;
  return `is not clearly apart from its peers: ${text(standing)}`;
}

/** Under the finding: unit of the standing, confidence, model and sample. */
export function standingSource(result: FitResult, numbers: NumberFormat): string {
  return sourceIn(differenceUnit(result.specification.form, numbers), result);
}

/** Under the chart of company levels: their unit, in log form another than the standing's; confidence, model, sample. */
export function levelsSource(result: FitResult, numbers: NumberFormat): string {
  return sourceIn(levelUnit(result.specification.form, numbers), result);
}

function sourceIn(unit: string, result: FitResult): string {
  const { sample, specification } = result;
  return [
    unit,
    `${confidenceText(specification.confidence)} intervals`,
    `company intercepts of ${modelText(result)}`,
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
