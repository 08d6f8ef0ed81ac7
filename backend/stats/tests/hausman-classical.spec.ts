import { openFit } from '../index';
import { expectDigits } from '../testing/expect-digits';
import {
  goldenJson,
  goldenPanel,
  type PanelRow,
  panelOf,
  plainSpecification,
  sha256,
} from '../testing/golden-panels';
import type { TestOutcome } from './evidence-test';
import { hausmanClassicalTest } from './hausman-classical';

interface Golden {
  readonly meta: { readonly dependent: string; readonly regressors: readonly string[] };
  readonly tests: {
    readonly hausman: {
      readonly statistic: number;
      readonly p_value: number;
      readonly parameter: { readonly df: number };
    };
  };
}

function outcomeOf(file: string, effects: 'company' | 'company,year' = 'company'): TestOutcome {
  const { meta } = goldenJson<Golden>(`${file}.json`);
  const specification = { ...plainSpecification, effects };
  const data = goldenPanel(`${file}.csv`, meta.dependent, meta.regressors);
  return hausmanClassicalTest.compute(
    openFit({ data, specification, own: null, members: undefined }, { sha256 }),
  );
}

describe('the classical Hausman test', () => {
  for (const file of [
    'grunfeld10',
    'grunfeld11',
    'grunfeld10_unbalanced',
    'grunfeld10_loglog',
    'instinnovation120',
  ]) {
    it(`agrees with R’s phtest on ${file}`, () => {
      const { hausman } = goldenJson<Golden>(`${file}.json`).tests;
      const outcome = outcomeOf(file);
      expectDigits(outcome.statistic, hausman.statistic, 9);
      expect(outcome).toEqual(
        jasmine.objectContaining({
          distribution: 'chi-squared',
          degreesOfFreedom: [hausman.parameter.df],
        }),
      );
      expectDigits('pValue' in outcome ? outcome.pValue : null, hausman.p_value, 9);
    });
  }

  // R 4.2.2, eigen(vcov(within) - vcov(random)) by plm 2.6-2: two negative eigenvalues on the first, one on the second;
  // phtest prints a statistic all the same.
  for (const file of ['grunfeld11_value_on_inv_capital', 'usairlines']) {
    it(`is not defined on ${file}, where the difference is not positive definite`, () => {
      const outcome = outcomeOf(file);
      expect(outcome.statistic).toBeNull();
      expect('reason' in outcome ? outcome.reason : '').toMatch(/not positive definite/u);
    });
  }

  it('says why there is none with year effects', () => {
    expect(outcomeOf('grunfeld10', 'company,year')).toEqual({
      statistic: null,
      reason: 'The test compares models without year effects, and this one has them.',
    });
  });

  it('says why there is none for two companies or a perfect fit', () => {
    const reasonOf = (rows: readonly PanelRow[]): string => {
      const open = openFit(
        {
          data: panelOf(rows, { outcome: 'y', regressors: ['x'] }),
          specification: plainSpecification,
          own: null,
          members: undefined,
        },
        { sha256 },
      );
      const outcome = hausmanClassicalTest.compute(open);
      expect(outcome.statistic).toBeNull();
      return 'reason' in outcome ? (outcome.reason ?? '') : '';
    };
    const row = (company: number, year: number, noise: number): PanelRow => ({
      company: `K${company}`,
      year: 2000 + year,
      regressors: [year * year + company],
      outcome: 3 * (year * year + company) + 7 * company + noise,
    });
    const years = [0, 1, 2, 3, 4, 5];
    const two = [1, 2].flatMap((company) => years.map((year) => row(company, year, year % 2)));
    expect(reasonOf(two)).toMatch(/2 companies/u);
    const perfect = [1, 2, 3, 4].flatMap((company) => years.map((year) => row(company, year, 0)));
    expect(reasonOf(perfect)).toMatch(/perfect/u);
  });
});
