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
import type { TestGround } from './evidence-test';
import { hondaTest } from './honda';

interface Golden {
  readonly meta: { readonly dependent: string; readonly regressors: readonly string[] };
  readonly tests: {
    readonly plm_LM_honda_company: { readonly statistic: number; readonly p_value: number };
  };
}

function groundOf(rows: readonly PanelRow[]): TestGround {
  return openFit(
    {
      data: panelOf(rows, { outcome: 'y', regressors: ['x'] }),
      specification: plainSpecification,
      own: null,
      members: undefined,
    },
    { sha256 },
  );
}

describe('the Honda test', () => {
  for (const file of [
    'grunfeld10',
    'grunfeld11',
    'grunfeld10_unbalanced',
    'grunfeld10_loglog',
    'grunfeld11_value_on_inv_capital',
    'usairlines',
    'instinnovation120',
  ]) {
    it(`agrees with R’s plmtest on ${file}`, () => {
      const { meta, tests } = goldenJson<Golden>(`${file}.json`);
      const ground = openFit(
        {
          data: goldenPanel(`${file}.csv`, meta.dependent, meta.regressors),
          specification: plainSpecification,
          own: null,
          members: undefined,
        },
        { sha256 },
      );
      const outcome = hondaTest.compute(ground);
      const { statistic, p_value } = tests.plm_LM_honda_company;
      expectDigits(outcome.statistic, statistic, 9);
      expectDigits('pValue' in outcome ? outcome.pValue : null, p_value, 9);
    });
  }

  it('is one-sided: levels more alike than chance speak for nothing', () => {
    // Every company’s residuals sum to zero, which no chance makes smaller: p near 1.
    const rows = [1, 2, 3, 4].flatMap((company) =>
      [0, 1, 2, 3].map((year) => ({
        company: `K${company}`,
        year: 2000 + year,
        regressors: [year === 0 || year === 3 ? 1 : -1],
        outcome: year < 2 ? company : -company,
      })),
    );
    const outcome = hondaTest.compute(groundOf(rows));
    // n/√(2(ΣT² − n))·(0 − 1) with n = 16, ΣT² = 64.
    expectDigits(outcome.statistic, -16 / Math.sqrt(96), 12);
    expect('pValue' in outcome ? outcome.pValue : 0).toBeGreaterThan(0.94);
  });

  it('says why there is none for a perfect fit or year effects', () => {
    const rows = [1, 2, 3].flatMap((company) =>
      [0, 1, 2, 3, 4].map((year) => ({
        company: `K${company}`,
        year: 2000 + year,
        regressors: [year * year + company],
        outcome: 2 * (year * year + company) + company,
      })),
    );
    expect(hondaTest.compute(groundOf(rows))).toEqual(
      jasmine.objectContaining({ statistic: null, reason: jasmine.stringMatching(/perfect/u) }),
    );
    const { meta } = goldenJson<Golden>('grunfeld10.json');
    const withYears = openFit(
      {
        data: goldenPanel('grunfeld10.csv', meta.dependent, meta.regressors),
        specification: { ...plainSpecification, effects: 'company,year' },
        own: null,
        members: undefined,
      },
      { sha256 },
    );
    expect(hondaTest.compute(withYears)).toEqual({
      statistic: null,
      reason: 'The test compares models without year effects, and this one has them.',
    });
  });
});
