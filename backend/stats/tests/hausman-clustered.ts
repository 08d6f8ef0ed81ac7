import { fUpperTail } from '../distributions/f-upper-tail';
import { isNotComputed } from '../estimators/estimator';
import { hotellingApproximation } from '../estimators/hotelling-approximation';
import { mundlakTerms } from '../estimators/mundlak-terms';
import { yearEffectsReason } from '../estimators/year-effects-reason';
import { isPerfectFit, perfectFitReason } from '../regression/goodness';
import type { EvidenceTest } from './evidence-test';

const notJudgedReason =
  'Too few companies differ enough in their means to judge the mean terms together.';

/** Wald test of the company-mean terms with `cr2` by company and the approximate Hotelling T². */
export const hausmanClusteredTest: EvidenceTest = {
  code: 'hausman-clustered',
  name: 'Hausman, clustered',
  definition:
    'Adds the companies’ means of the regressors to the pooled regression and tests their coefficients together, with the bias-reduced covariance by company and an approximate Hotelling T².',
  source:
    'Mundlak (1978), Econometrica 46, 69–85; Pustejovsky & Tipton (2018), Journal of Business & Economic Statistics 36, 672–683',
  reference: 'hausman-clustered',
  inHolm: true,
  caution: 'Rejects in 8 % of cases at a nominal 5 % with 12 companies and 20 years.',
  readings: {
    rejects: 'Slopes between companies differ from those within: read the fixed effects.',
    keeps:
      'Slopes between and within companies agree within chance; the fixed effects hold either way.',
    none: 'It says nothing here; the fixed effects need no such test.',
  },
  compute: ({ fit, ground }) => {
    if (fit.yearColumns > 0) return { statistic: null, reason: yearEffectsReason };
    if (isPerfectFit(fit)) return { statistic: null, reason: perfectFitReason };
    const terms = mundlakTerms(fit, ground.products);
    if (isNotComputed(terms)) return { statistic: null, reason: terms.reason };
    const test = hotellingApproximation(terms.contrasts, terms.companies);
    if (test === null) return { statistic: null, reason: notJudgedReason };
    const { statistic, degreesOfFreedom } = test;
    const [df1, df2] = degreesOfFreedom;
    return {
      statistic,
      distribution: 'F',
      degreesOfFreedom,
      pValue: fUpperTail(statistic, df1, df2),
    };
  },
};
