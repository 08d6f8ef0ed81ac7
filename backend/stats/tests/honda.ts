import { normalUpperTail } from '../distributions/normal-tails';
import { yearEffectsReason } from '../estimators/year-effects-reason';
import { isPerfectFit, perfectFitReason } from '../regression/goodness';
import { sumOfSquares } from '../regression/sum-of-squares';
import type { EvidenceTest, NoStatistic, TestGround } from './evidence-test';

/**
 * The signed score of a company effects' variance on pooled residuals e:
 * n/√(2(ΣT_i² − n)) · (Σ_i(Σ_t e_it)² / Σe² − 1), on unbalanced panels too.
 *
 * @see Honda (1985), Review of Economic Studies 52, 681–690; Baltagi & Li (1990), Econometric Theory 6, 283–284.
 */
export function companyEffectScore({ sample, fit, pooled }: TestGround): number | NoStatistic {
  if (fit.yearColumns > 0) return { statistic: null, reason: yearEffectsReason };
  if (isPerfectFit(fit)) return { statistic: null, reason: perfectFitReason };
  const { starts } = sample;
  const { residuals } = pooled;
  const observations = residuals.length;
  let squaredSums = 0;
  let squaredCounts = 0;
  for (let company = 0; company + 1 < starts.length; company += 1) {
    let sum = 0;
    for (let row = starts[company]; row < starts[company + 1]; row += 1) sum += residuals[row];
    squaredSums += sum * sum;
    squaredCounts += (starts[company + 1] - starts[company]) ** 2;
  }
  const share = squaredSums / sumOfSquares(residuals);
  return (observations / Math.sqrt(2 * (squaredCounts - observations))) * (share - 1);
}

/** One-sided: a variance cannot be negative. */
export const hondaTest: EvidenceTest = {
  code: 'honda',
  name: 'Honda',
  definition:
    'One-sided score test on the pooled residuals that the company effects have no variance.',
  source:
    'Honda (1985), Review of Economic Studies 52, 681–690; unbalanced as Baltagi & Li (1990), Econometric Theory 6, 283–284',
  reference: 'tests.plm_LM_honda_company',
  inHolm: true,
  caution: 'Assumes errors that do not persist.',
  readings: {
    rejects: 'Companies differ in level, so one constant for all of them leaves out too much.',
    keeps: 'The pooled residuals show no levels of the companies’ own.',
    none: 'Whether companies differ in level has to be read from poolability.',
  },
  compute: (ground) => {
    const score = companyEffectScore(ground);
    if (typeof score !== 'number') return score;
    return {
      statistic: score,
      distribution: 'normal',
      degreesOfFreedom: [],
      pValue: normalUpperTail(score),
    };
  },
};
