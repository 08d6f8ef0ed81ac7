import { chiSquaredUpperTail } from '../distributions/chi-squared-upper-tail';
import type { EvidenceTest } from './evidence-test';
import { companyEffectScore } from './honda';

/** The square of the signed score. */
export const breuschPaganLmTest: EvidenceTest = {
  code: 'breusch-pagan-lm',
  name: 'Breusch–Pagan LM',
  definition:
    'Lagrange multiplier test on the pooled residuals that the company effects have no variance: random effects against pooled.',
  source:
    'Breusch & Pagan (1980), Review of Economic Studies 47, 239–253; unbalanced as Baltagi & Li (1990), Econometric Theory 6, 283–284',
  reference: 'tests.plm_LM_bp_company',
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
    const statistic = score * score;
    return {
      statistic,
      distribution: 'chi-squared',
      degreesOfFreedom: [1],
      pValue: chiSquaredUpperTail(statistic, 1),
    };
  },
};
