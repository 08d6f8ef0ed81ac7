import type { EvidenceTest } from './evidence-test';

/**
 * The panel Durbin–Watson statistic Σ(e_t − e_{t−1})² / Σe²: about 2 without persistence, towards 0 as errors persist.
 * Differences are between consecutive calendar years of one company; after a gap the row's own e² takes the place of
 * the difference, as in the outside result (Bhargava, Franzini & Narendranathan's statistic modified for gaps).
 *
 * @see Bhargava, Franzini & Narendranathan (1982), Review of Economic Studies 49, 533–549; Baltagi & Wu (1999),
 *   Econometric Theory 15, 814–823.
 */
export const durbinWatsonTest: EvidenceTest = {
  code: 'durbin-watson',
  name: 'Panel Durbin–Watson',
  definition:
    'Squared differences of consecutive residuals of one company over squared residuals; after a calendar gap the residual’s own square.',
  source: 'Bhargava, Franzini & Narendranathan (1982), Review of Economic Studies 49, 533–549',
  reference: 'tests.bhargava_dw',
  inHolm: false,
  readings: {
    rejects: 'Errors persist from year to year.',
    keeps: 'Nothing shows that errors persist from year to year.',
    none: 'No verdict: near 2 errors do not persist, near 0 they persist fully.',
  },
  compute({ sample, fit }) {
    const { starts, year, companies } = sample;
    const { residuals } = fit;
    let differences = 0;
    for (let company = 0; company < companies.length; company += 1) {
      for (let row = starts[company] + 1; row < starts[company + 1]; row += 1) {
        const before = year[row] - year[row - 1] === 1 ? residuals[row - 1] : 0;
        differences += (residuals[row] - before) ** 2;
      }
    }
    return {
      statistic: differences / fit.residualSquares,
      distribution: null,
      degreesOfFreedom: [],
      pValue: null,
      reason: 'Statistic only: its tables hold for balanced panels of given sizes.',
    };
  },
};
