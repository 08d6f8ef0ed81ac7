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
import { randomNumbers } from '../testing/random-panels';
import type { TestOutcome } from './evidence-test';
import { hausmanClusteredTest } from './hausman-clustered';

interface Block {
  readonly statistic: number;
  readonly parameter: { readonly df1: number; readonly df2: number };
  readonly p_value: number;
}

interface Golden {
  readonly meta: { readonly dependent: string; readonly regressors: readonly string[] };
}

/** Results of tools/reference/hausman_clustered.R: clubSandwich's Wald_test with CR2 and HTZ. */
const golden = goldenJson<Record<string, Block>>('hausman-clustered.json');

function outcomeOf(
  rows: readonly PanelRow[],
  effects: 'company' | 'company,year' = 'company',
): TestOutcome {
  const regressors = rows[0].regressors.map((_, k) => `x${k}`);
  return hausmanClusteredTest.compute(
    openFit(
      {
        data: panelOf(rows, { outcome: 'y', regressors }),
        specification: { ...plainSpecification, effects },
        own: null,
        members: undefined,
      },
      { sha256 },
    ),
  );
}

function reasonOf(outcome: TestOutcome): string {
  expect(outcome.statistic).toBeNull();
  return 'reason' in outcome ? (outcome.reason ?? '') : '';
}

function rowsOf(companies: number, years: number, noise = 1): PanelRow[] {
  const random = randomNumbers(11);
  return Array.from({ length: companies * years }, (_, index) => {
    const company = Math.floor(index / years);
    const x = 10 * random() + company;
    return {
      company: `K${company}`,
      year: 2000 + (index % years),
      regressors: [x],
      outcome: 2 * x + 3 * Math.sin(company) + noise * random(),
    };
  });
}

describe('the clustered Hausman test', () => {
  for (const file of Object.keys(golden).filter((name) => name !== 'versions')) {
    it(`agrees with R’s Wald_test on ${file}`, () => {
      const { meta } = goldenJson<Golden>(`${file}.json`);
      const outcome = hausmanClusteredTest.compute(
        openFit(
          {
            data: goldenPanel(`${file}.csv`, meta.dependent, meta.regressors),
            specification: plainSpecification,
            own: null,
            members: undefined,
          },
          { sha256 },
        ),
      );
      const { statistic, parameter, p_value } = golden[file];
      expectDigits(outcome.statistic, statistic, 9, 'F');
      const [df1, df2] = 'degreesOfFreedom' in outcome ? outcome.degreesOfFreedom : [];
      expect(df1).toBe(parameter.df1);
      expectDigits(df2, parameter.df2, 9, 'second degrees of freedom');
      expectDigits('pValue' in outcome ? outcome.pValue : null, p_value, 9, 'p');
    });
  }

  it('does not change when a regressor is measured otherwise or shifted', () => {
    const rows = rowsOf(7, 9);
    const plain = outcomeOf(rows);
    const other = outcomeOf(
      rows.map((row) => ({ ...row, regressors: [1000 * row.regressors[0] + 1e6] })),
    );
    expect(plain.statistic).toBeGreaterThan(0);
    expectDigits(other.statistic, plain.statistic ?? NaN, 9);
  });

  it('adds no term for a regressor with the same mean in all companies', () => {
    const rows = rowsOf(7, 9);
    const common = rows.map((row) => ({
      ...row,
      regressors: [...row.regressors, (row.year - 2004) ** 2],
    }));
    const outcome = outcomeOf(common);
    expect('degreesOfFreedom' in outcome ? outcome.degreesOfFreedom[0] : null).toBe(1);
    const only = rows.map((row) => ({ ...row, regressors: [(row.year - 2004) ** 2] }));
    expect(reasonOf(outcomeOf(only))).toMatch(/same mean in all companies/u);
  });

  it('says why there is none for two companies, a perfect fit or year effects', () => {
    expect(reasonOf(outcomeOf(rowsOf(2, 9)))).toMatch(/2 companies leave nothing/u);
    expect(reasonOf(outcomeOf(rowsOf(6, 9, 0)))).toMatch(/perfect/u);
    expect(reasonOf(outcomeOf(rowsOf(6, 9), 'company,year'))).toMatch(/without year effects/u);
  });

  it('says why there is none where single companies carry the mean terms', () => {
    const random = randomNumbers(7919);
    // Means that lie orders of magnitude apart: η falls below q − 1.
    const means = Array.from({ length: 5 }, () =>
      Array.from({ length: 3 }, () => Math.exp(6 * (random() + random() + random() - 1.5))),
    );
    const rows = rowsOf(5, 8).map((row, index) => {
      const regressors = means[Math.floor(index / 8)].map((mean) => mean * (1 + 0.3 * random()));
      return { ...row, regressors, outcome: regressors[0] + random() };
    });
    expect(reasonOf(outcomeOf(rows))).toMatch(/differ enough in their means/u);
  });
});
