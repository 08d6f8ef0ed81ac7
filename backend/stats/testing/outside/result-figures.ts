import type { FitResult, FTest } from '../../fit-result';
import { type FigureValues, intervalValues, orNull } from './figure-values';

/** What a fit's result says, in the order of the outside values. */
export function resultFigures(result: FitResult): FigureValues {
  const { goodness, pooled, smearing, yearEffects } = result;
  const intercepts = result.intercepts.filter(({ rows }) => rows > 1);
  return {
    slopes: result.slopes.map(({ estimate }) => estimate),
    intercepts: intercepts.map(({ estimate }) => estimate),
    deviations: intercepts.map(({ deviation }) => deviation),
    interceptErrors: intercepts.map(({ standardError }) => standardError),
    ...(yearEffects !== null && { yearEffects: yearEffects.map(({ estimate }) => estimate) }),
    goodness: [
      goodness.withinRSquared,
      goodness.rSquared,
      goodness.adjustedRSquared,
      goodness.residualStandardError,
    ],
    fAll: testValues(goodness.f),
    fSlopes: testValues(goodness.fSlopes),
    pooled: [pooled.constant, ...Object.values(pooled.slopes), pooled.rSquared, pooled.f.value],
    poolability: testValues(result.poolability),
    ...(smearing !== null && { smearing: [smearing.factor, smearing.own] }),
    withoutCompany: result.withoutCompany.flatMap(({ slopes }) => orNull(slopes)),
    withoutCompanyStanding: result.withoutCompany.map(({ standing }) => standing),
    ...standingFigures(result),
  };
}

function standingFigures({ standing, pairs, gapPath, drift }: FitResult): FigureValues {
  if (standing === null || pairs === null || gapPath === null) return {};
  const { percent } = standing;
  return {
    persistence: [standing.persistence, standing.ownPersistence],
    standing: [...intervalValues(standing), standing.calibration],
    ...(percent !== undefined && {
      standingPercent: [percent.estimate, percent.low, percent.high],
    }),
    rankSet: [standing.rank, ...(standing.rankSet ?? [null, null])],
    pairs: [
      ...pairs.map(({ estimate }) => estimate),
      ...pairs.map(({ standardError }) => standardError),
    ],
    gapPath: [...gapPath.map(({ gap }) => gap), ...gapPath.map(({ peers }) => peers)],
    drift:
      drift === null ? [null, null, null, null, null] : [...intervalValues(drift), drift.pValue],
  };
}

function testValues({ value, df1, df2, pValue }: FTest): (number | null)[] {
  return [value, df1, df2, pValue];
}
