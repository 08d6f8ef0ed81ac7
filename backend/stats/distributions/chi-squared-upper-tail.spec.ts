import { goldenJson } from '../testing/golden-panels';
import { expectDigits } from '../testing/expect-digits';
import { chiSquaredUpperTail } from './chi-squared-upper-tail';
import { normalTwoSided, normalUpperTail } from './normal-tails';

interface Block {
  readonly statistic: number;
  readonly p_value: number;
  readonly parameter: { readonly df: number };
}

describe('tails without 1 − cdf', () => {
  // R 4.2.2: the p values of plm's tests beside their statistics.
  for (const panel of ['grunfeld10', 'grunfeld11', 'usairlines']) {
    const { tests } = goldenJson<{ tests: Record<string, Block> }>(`${panel}.json`);

    it(`give R’s p values of chi-squared and normal statistics on ${panel}`, () => {
      for (const name of ['hausman', 'plm_LM_bp_company', 'breusch_godfrey_order1']) {
        const { statistic, parameter, p_value } = tests[name];
        expectDigits(chiSquaredUpperTail(statistic, parameter.df), p_value, 11, name);
      }
      const { statistic, p_value } = tests['pesaran_cd'];
      expectDigits(normalTwoSided(statistic), p_value, 11);
      const honda = tests['plm_LM_honda_company'];
      expectDigits(normalUpperTail(honda.statistic), honda.p_value, 11);
    });
  }
});
