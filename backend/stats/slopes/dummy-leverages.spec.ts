import { openFit } from '../open-fit';
import { goldenPanel, panelOf, plainSpecification, sha256 } from '../testing/golden-panels';
import { expectDigits } from '../testing/expect-digits';
import { randomNumbers } from '../testing/random-panels';
import { dummyLeverages } from './dummy-leverages';

describe('leverages of the regression with all dummies', () => {
  for (const effects of ['company', 'company,year'] as const) {
    it(`add up to the number of parameters, effects ${effects}`, () => {
      const data = goldenPanel('grunfeld10_unbalanced.csv', 'inv', ['value', 'capital']);
      const { fit } = openFit(
        {
          data,
          own: null,
          members: undefined,
          specification: { ...plainSpecification, effects },
        },
        { sha256 },
      );
      const sum = dummyLeverages(fit).reduce((total, value) => total + value, 0);
      expectDigits(sum, fit.sample.companies.length + fit.coefficients.length, 12);
    });
  }

  it('of 1 add nothing to any covariance by row', () => {
    // Company K0 has two rows, and x moves in no other: both rows are fitted exactly.
    const random = randomNumbers(4);
    const rows = Array.from({ length: 26 }, (_, index) => ({
      company: index < 2 ? 'K0' : `K${1 + Math.floor((index - 2) / 8)}`,
      year: 2000 + (index < 2 ? index : (index - 2) % 8),
      outcome: random(),
      regressors: [index < 2 ? index : 3, random() - 0.5],
    }));
    const data = panelOf(rows, { outcome: 'y', regressors: ['x', 'z'] });
    for (const slopes of ['hc0', 'hc1', 'hc2', 'hc3'] as const) {
      const { fit, result } = openFit(
        { data, own: null, members: undefined, specification: { ...plainSpecification, slopes } },
        { sha256 },
      );
      expect(
        [...dummyLeverages(fit).subarray(0, 2)].every((value) => value > 1 - 1e-12),
      ).toBeTrue();
      for (const { standardError } of result.slopes) {
        expect(standardError).toBeGreaterThan(0);
        expect(standardError).toBeLessThan(10);
      }
    }
  });
});
