import { openFit } from '../index';
import { expectDigits } from '../testing/expect-digits';
import { goldenJson, goldenPanel, plainSpecification, sha256 } from '../testing/golden-panels';
import { breuschPaganLmTest } from './breusch-pagan-lm';
import type { TestOutcome } from './evidence-test';

interface Golden {
  readonly meta: { readonly dependent: string; readonly regressors: readonly string[] };
  readonly tests: {
    readonly plm_LM_bp_company: {
      readonly statistic: number;
      readonly p_value: number;
      readonly parameter: { readonly df: number };
    };
  };
}

function outcomeOf(file: string, effects: 'company' | 'company,year' = 'company'): TestOutcome {
  const { meta } = goldenJson<Golden>(`${file}.json`);
  const data = goldenPanel(`${file}.csv`, meta.dependent, meta.regressors);
  return breuschPaganLmTest.compute(
    openFit(
      {
        data,
        specification: { ...plainSpecification, effects },
        own: null,
        members: undefined,
      },
      { sha256 },
    ),
  );
}

describe('the Breusch–Pagan LM test', () => {
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
      const block = goldenJson<Golden>(`${file}.json`).tests.plm_LM_bp_company;
      const outcome = outcomeOf(file);
      expectDigits(outcome.statistic, block.statistic, 9);
      expect('degreesOfFreedom' in outcome ? outcome.degreesOfFreedom : []).toEqual([
        block.parameter.df,
      ]);
      expectDigits('pValue' in outcome ? outcome.pValue : null, block.p_value, 9);
    });
  }

  it('says why there is none with year effects', () => {
    const outcome = outcomeOf('usairlines', 'company,year');
    expect(outcome.statistic).toBeNull();
    expect('reason' in outcome ? outcome.reason : '').toMatch(/without year effects/u);
  });
});
