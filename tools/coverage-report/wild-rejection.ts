import { bootstrapPValue, isAccepted } from '../../backend/stats/slopes/bootstrap/accepted-values';
import { blockedStatistics } from '../../backend/stats/slopes/bootstrap/blocked-statistics';
import { drawStatistics, slopeScores } from '../../backend/stats/slopes/bootstrap/draw-statistics';
import {
  mostEnumerated,
  type SignDraws,
  signDraws,
} from '../../backend/stats/slopes/bootstrap/sign-draws';
import { cr0 } from '../../backend/stats/slopes/covariances/cr0';
import type { SlopeGround } from '../../backend/stats/slopes/slope-ground';
import { nominal } from './measures';
import { trueSlope } from './company-paths';

/** Fewer than a fit's 9,999: the size of a test at .05 needs no finer p. */
export const simulatedDraws = 999;

/** Whether the bootstrap of the first slope keeps its true value; the interval itself is not looked for. */
export function keepsTrueSlope(ground: SlopeGround, seed: number): boolean {
  const { fit, products } = ground;
  const standardError = Math.sqrt(cr0.covariance(ground).matrix[0]);
  const draws = fewerDraws(products.length, seed);
  const statisticsOf = products.length > mostEnumerated ? blockedStatistics : drawStatistics;
  const statistics = statisticsOf(slopeScores(ground, 0, standardError), draws, () => undefined);
  const tau = (fit.slopes[0] - trueSlope) / standardError;
  return isAccepted(bootstrapPValue(statistics, draws, tau), 1 - nominal);
}

/** The engine's sign vectors, random ones cut short; up to 12 companies there are few enough to look at all. */
function fewerDraws(companies: number, seed: number): SignDraws {
  const draws = signDraws(companies, seed);
  if (companies <= mostEnumerated) return draws;
  const all = simulatedDraws + 1;
  return {
    ...draws,
    count: simulatedDraws,
    pValue: (count) => (1 + count) / all,
    smallest: 1 / all,
  };
}
