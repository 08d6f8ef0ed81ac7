import { fUpperTail } from '../distributions/f-upper-tail';
import { clusteredLagSlope, laggedPairs } from './clustered-lag-slope';
import type { EvidenceTest } from './evidence-test';

/**
 * Wooldridge's test on the residuals of the fit: without persistence the slope of a residual on the one before is
 * −1/(T − 1), T the years of the sample. The pairs are rows next to each other, also across a calendar gap. p from
 * F(1, N − 1): with the degrees of freedom of rows it rejects twice too often in short panels. With year effects it is
 * taken on the residuals that they leave.
 *
 * @see Wooldridge (2010), Econometric Analysis of Cross Section and Panel Data, 2nd ed., §10.5.4.
 */
export const wooldridgeWithinTest: EvidenceTest = {
  code: 'wooldridge-within',
  name: 'Wooldridge, within residuals',
  definition:
    'Slope of each residual on the one of the row before against −1/(T − 1), clustered by company without a factor, F(1, N − 1).',
  source:
    'Wooldridge (2010), Econometric Analysis of Cross Section and Panel Data, 2nd ed., §10.5.4',
  reference: 'tests.wooldridge_within_pwartest',
  inHolm: true,
  caution:
    'Without persistence it rejects at 5 % in 6 % of simulated panels of 12 companies and 20 years.',
  readings: {
    rejects:
      'Errors persist from year to year: read no interval that takes the years as independent.',
    keeps: 'Nothing shows that errors persist from year to year.',
    none: 'It remains open whether errors persist from year to year.',
  },
  compute({ sample, fit }) {
    const slope = clusteredLagSlope(laggedPairs(fit.residuals, sample.starts));
    if (slope === null) {
      return {
        statistic: null,
        reason: 'The residuals have too few rows a company to be set against the year before.',
      };
    }
    const expected = -1 / (sample.years.length - 1);
    const statistic = (slope.slope - expected) ** 2 / slope.variance;
    const df2 = sample.companies.length - 1;
    return {
      statistic,
      distribution: 'F',
      degreesOfFreedom: [1, df2],
      pValue: fUpperTail(statistic, 1, df2),
    };
  },
};
