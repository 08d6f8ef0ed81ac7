import { tQuantile } from '../../distributions/t-distribution';
import type { PredictionBasis } from '../../fit-result';
import {
  decompositionFromLast,
  differenceOfPlans,
  differenceToPeer,
  expectedValue,
  familiarRange,
  marketValueBand,
  type Outlook,
  peersMean,
  reachValue,
} from '../../prediction';
import { type FigureValues, intervalValues } from './figure-values';

const horizons = [1, 3, 5];
/** The values that the first regressor is to reach, as shares of the first plan's expected value. */
const reachedShares = [1.05, 2];

type Plans = readonly (readonly number[])[];

/**
 * Predictions of the own company for several plans, in the order of the outside values.
 *
 * @param plans  what the model reads, in the panel's measure.
 */
export function predictionFigures(basis: PredictionBasis, plans: Plans): FigureValues {
  const differences = plans
    .slice(1)
    .map((plan) => intervalValues(differenceOfPlans(basis, plan, plans[0], tQuantile)));
  const familiar = plans.map((plan) => familiarRange(basis, plan).leverage);
  const figures: FigureValues = {
    planDifference: [0, 1, 2, 3].flatMap((place) => differences.map((values) => values[place])),
    peersMean: peersMeanValues(basis),
    familiarRange: [...familiar, basis.largestOwnLeverage, basis.largestLeverage],
  };
  if (basis.yearEffects === null || basis.yearEffects === undefined) {
    return { ...figures, ...outlookFigures(basis, plans, {}) };
  }
  return {
    ...figures,
    ...outlookFigures(basis, plans, { yearEffect: 'last' }, '.last'),
    ...outlookFigures(basis, plans, { yearEffect: 'mean-of-last-three' }, '.meanOfLastThree'),
  };
}

function outlookFigures(
  basis: PredictionBasis,
  plans: Plans,
  outlook: Outlook,
  suffix = '',
): FigureValues {
  const expected = plans.map((plan) => expectedValue(basis, plan, outlook));
  const inHorizon = (h: number): Outlook => ({ ...outlook, year: basis.last.year + h });
  const ends = (plan: readonly number[], at: Outlook): (number | null)[] => {
    const { low, high } = marketValueBand(basis, plan, at, tQuantile);
    return [low, high];
  };
  const figures = {
    expected: expected.flatMap((value) => intervalValues(value.log?.inLogs ?? value)),
    ...(basis.form === 'log' && {
      expectedValue: expected.flatMap(({ estimate, low, high }) => [estimate, low, high]),
      medianValue: expected.map(({ log }) => log?.median),
    }),
    band: plans.flatMap((plan) => horizons.flatMap((h) => ends(plan, inHorizon(h)))),
    carriedGap: plans.flatMap((plan) =>
      horizons.flatMap((h) => {
        const at = { ...inHorizon(h), start: 'carry-the-gap' } as const;
        const value = expectedValue(basis, plan, at);
        return [...intervalValues(value.log?.inLogs ?? value), ...ends(plan, at)];
      }),
    ),
    fromLast: plans.flatMap((plan) =>
      horizons.flatMap((h) =>
        (['model-level', 'carry-the-gap'] as const).map(
          (start) =>
            decompositionFromLast(basis, plan, tQuantile, { ...inHorizon(h), start }).total,
        ),
      ),
    ),
    reachedValue: reachedShares.flatMap((share) =>
      reachedValues(basis, plans[0], share * expected[0].estimate, outlook),
    ),
  };
  return Object.fromEntries(
    Object.entries(figures).map(([name, values]) => [`${name}${suffix}`, values]),
  );
}

function reachedValues(
  basis: PredictionBasis,
  regressors: readonly number[],
  target: number,
  outlook: Outlook,
): (number | null)[] {
  const reach = reachValue(basis, { ...outlook, target, regressor: 0, regressors });
  if (reach.value === null) return [target, null, null, null];
  return reach.range?.kind === 'interval'
    ? [target, reach.value, reach.range.low, reach.range.high]
    : [target, reach.value, null, null];
}

/** Intercepts, slopes, residuals and their sum; a null without a peer in the own company's last year. */
function peersMeanValues(basis: PredictionBasis): (number | null)[] {
  const mean = peersMean(basis, 'mean of the peers');
  if (mean === null) return [null];
  const { intercepts, terms, residuals, total } = differenceToPeer(basis, mean, tQuantile);
  const ofSlopes = terms.reduce((sum, { estimate }) => sum + estimate, 0);
  return [intercepts, ofSlopes, residuals, total];
}
