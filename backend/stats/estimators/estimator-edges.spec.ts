import type { Specification } from '../fit-result';
import { componentsOf, slopesOf, summariesOfPanel } from '../testing/estimator-figures';
import { expectDigits } from '../testing/expect-digits';
import { type PanelRow, panelOf } from '../testing/golden-panels';
import { randomNumbers } from '../testing/random-panels';
import { normalTwoSidedQuantile } from './normal-quantile';

interface Shape {
  readonly companies: number;
  readonly years: number;
  readonly slopes: number;
}

/** y = level·company + Σx + noise, calendar years in steps of `step`. */
function rowsOf(
  { companies, years, slopes }: Shape,
  { level = 0, noise = 1, step = 1 }: { level?: number; noise?: number; step?: number },
): PanelRow[] {
  const random = randomNumbers(7);
  return Array.from({ length: companies * years }, (_, index) => {
    const company = Math.floor(index / years);
    const regressors = Array.from({ length: slopes }, () => 10 * random());
    const sum = regressors.reduce((total, value) => total + value, 0);
    return {
      company: `K${company}`,
      year: 2000 + step * (index % years),
      regressors,
      outcome: level * company + sum + noise * (random() - 0.5),
    };
  });
}

function summariesOf(
  rows: readonly PanelRow[],
  specification: Partial<Specification> = {},
): ReturnType<typeof summariesOfPanel> {
  const regressors = rows[0].regressors.map((_, k) => `x${k}`);
  return summariesOfPanel(panelOf(rows, { outcome: 'y', regressors }), specification);
}

describe('estimators at the edges', () => {
  it('say that the means of two companies tell no slope', () => {
    const summary = summariesOf(rowsOf({ companies: 2, years: 8, slopes: 1 }, { level: 5 }));
    expect(summary('between').slopes).toBeNull();
    expect(summary('between').reason).toMatch(/2 companies cannot tell 1 slopes/u);
    expect(summary('random-effects').slopes).toBeNull();
    expect(summary('random-effects').reason).toMatch(/2 companies leave nothing/u);
    expect(slopesOf(summary('pooled'))[0].low).not.toBeNull();
    expect(summary('first-differences').observations).toBe(14);
  });

  it('judge one slope by the means of three companies on one degree of freedom', () => {
    const summary = summariesOf(rowsOf({ companies: 3, years: 8, slopes: 1 }, { level: 5 }));
    expect(summary('between').degreesOfFreedom).toBe(1);
    expect(slopesOf(summary('between'))[0].high).not.toBeNull();
  });

  it('give a perfect fit no interval', () => {
    const summary = summariesOf(
      rowsOf({ companies: 5, years: 8, slopes: 1 }, { level: 5, noise: 0 }),
    );
    for (const code of ['fixed-effects', 'pooled', 'between', 'first-differences'] as const) {
      const [slope] = slopesOf(summary(code));
      expect(slope.standardError).withContext(code).toBeNull();
      expect(slope.intervalReason)
        .withContext(code)
        .toMatch(/perfect/u);
    }
    expectDigits(slopesOf(summary('first-differences'))[0].estimate, 1, 12);
    expect(summary('random-effects').slopes).toBeNull();
    expect(summary('random-effects').reason).toMatch(/perfect/u);
  });

  it('set a negative variance of the company effects to zero, and say so', () => {
    // Companies' means equal but for what the noise leaves: taken off within each company, then shared out evenly.
    const rows = rowsOf({ companies: 6, years: 8, slopes: 1 }, {});
    const levelled = rows.map((row) => {
      const own = rows.filter(({ company }) => company === row.company);
      const gap =
        own.reduce((sum, { outcome, regressors }) => sum + outcome - regressors[0], 0) / 8;
      return { ...row, outcome: row.outcome - gap };
    });
    const summary = summariesOf(levelled);
    const random = summary('random-effects');
    expect(random.reason).toMatch(/negative and was set to 0/u);
    expect(componentsOf(random).company).toBe(0);
    expect(componentsOf(random).theta).toEqual([0, 0]);
    const pooled = summary('pooled');
    expectDigits(slopesOf(random)[0].estimate, slopesOf(pooled)[0].estimate, 12);
    expectDigits(slopesOf(random)[0].standardError, slopesOf(pooled)[0].standardError ?? NaN, 12);
    expectDigits(random.constant, pooled.constant ?? NaN, 10);
  });

  it('find no change where no two years follow each other', () => {
    const rows = rowsOf({ companies: 4, years: 6, slopes: 1 }, { level: 5, step: 2 });
    const differences = summariesOf(rows)('first-differences');
    expect(differences.slopes).toBeNull();
    expect(differences.observations).toBe(0);
    expect(differences.reason).toMatch(/^0 changes/u);
  });

  it('name a regressor whose means are the same in all companies', () => {
    const rows = rowsOf({ companies: 6, years: 8, slopes: 2 }, { level: 5 }).map((row) => ({
      ...row,
      regressors: [row.regressors[0], (row.year - 2000) ** 2],
    }));
    const summary = summariesOf(rows);
    expect(summary('between').slopes).toBeNull();
    expect(summary('between').reason).toMatch(/x1/u);
    expect(slopesOf(summary('random-effects')).length).toBe(2);
  });

  it('take random effects to the fixed ones as the companies’ levels spread', () => {
    const summary = summariesOf(rowsOf({ companies: 6, years: 8, slopes: 1 }, { level: 1e6 }));
    expectDigits(
      slopesOf(summary('random-effects'))[0].estimate,
      slopesOf(summary('fixed-effects'))[0].estimate,
      6,
    );
  });

  it('leave the degrees of freedom of fixed effects out where they differ by slope', () => {
    const rows = rowsOf({ companies: 6, years: 8, slopes: 2 }, { level: 5 });
    expect(summariesOf(rows)('fixed-effects').degreesOfFreedom).toBeNull();
    expect(summariesOf(rows, { slopes: 'classical' })('fixed-effects').degreesOfFreedom).toBe(40);
  });
});

describe('the normal quantile', () => {
  // R 4.2.2: qnorm(0.975), qnorm(0.995), qnorm(0.75), -qnorm(5e-13)
  it('agrees with R', () => {
    expectDigits(normalTwoSidedQuantile(0.95), 1.959963984540054, 14);
    expectDigits(normalTwoSidedQuantile(0.99), 2.5758293035489004, 14);
    expectDigits(normalTwoSidedQuantile(0.5), 0.6744897501960817, 14);
  });
});
