import { leastSquares } from '../../linear-algebra/least-squares';
import { congruence } from '../../linear-algebra/square-matrix';
import { invertUpper } from '../../linear-algebra/triangular';
import { expectDigits } from '../../testing/expect-digits';
import { fitOf, goldenJson, goldenRows, panelOf, type PanelRow } from '../../testing/golden-panels';
import { randomNumbers } from '../../testing/random-panels';
import { groupScores, rowProducts, scoreProducts } from '../score-products';
import { twoWayMiddle } from './two-way';

interface Errors {
  readonly se: { readonly '(Intercept)': number; readonly x: number };
  readonly published_from_memory: { readonly '(Intercept)': number; readonly x: number };
}

interface Petersen {
  readonly white: Errors;
  readonly cluster_firm: Errors;
  readonly cluster_year: Errors;
  readonly cluster_both: Errors;
}

/** Codes 0 … groups − 1 of a column, in the order of appearance. */
function codesOf(values: readonly string[]): { codes: Int32Array; groups: number } {
  const names = [...new Set(values)];
  return { codes: Int32Array.from(values, (name) => names.indexOf(name)), groups: names.length };
}

describe('clustering by company and year', () => {
  it('gives the published figures of petersen on the pooled regression, with a factor on each term', () => {
    const golden = goldenJson<Petersen>('petersen.json');
    const rows = goldenRows('petersen.csv');
    const columns = [
      new Float64Array(rows.length).fill(1),
      Float64Array.from(rows, ({ x }) => Number(x)),
    ];
    const pooled = leastSquares(
      columns,
      Float64Array.from(rows, ({ y }) => Number(y)),
    );
    const inverseR = invertUpper(pooled.r, 2);
    const factor = (groups: number): number =>
      ((groups / (groups - 1)) * (rows.length - 1)) / (rows.length - 2);
    const company = codesOf(rows.map((row) => row['company']));
    const year = codesOf(rows.map((row) => row['year']));
    const terms = {
      company: scoreProducts(groupScores(pooled, company.codes, company.groups), 2),
      year: scoreProducts(groupScores(pooled, year.codes, year.groups), 2),
      row: rowProducts(pooled),
    };
    const factors = {
      company: factor(company.groups),
      year: factor(year.groups),
      row: factor(rows.length),
    };
    const none = { company: 0, year: 0, row: 0 };
    for (const [expected, middle] of [
      [golden.cluster_both, twoWayMiddle(terms, factors)],
      [golden.cluster_firm, twoWayMiddle(terms, { ...none, company: factors.company })],
      [golden.cluster_year, twoWayMiddle(terms, { ...none, year: factors.year })],
      [golden.white, twoWayMiddle(terms, { ...none, row: -factors.row })],
    ] as const) {
      const covariance = congruence(inverseR, middle, 2);
      const constant = Math.sqrt(covariance[0]);
      const slope = Math.sqrt(covariance[3]);
      expectDigits(constant, expected.se['(Intercept)'], 9, 'constant');
      expectDigits(slope, expected.se.x, 9, 'x');
      // Petersen's test-data page, from memory; it prints seven decimals, and one of the eight is a last digit off.
      const published = expected.published_from_memory;
      expect(Math.abs(constant - published['(Intercept)'])).toBeLessThan(1.2e-7);
      expect(Math.abs(slope - published.x)).toBeLessThan(1.2e-7);
    }
  });

  it('sets a negative eigenvalue to 0 and says so', () => {
    const fit = fitOf(panelOf(cancelling(2), { outcome: 'y', regressors: ['x', 'z'] }), null, {
      slopes: 'two-way',
    });
    const [[a, b], [c, d]] = fit.slopeCovariance ?? [];
    expect(a).toBeGreaterThan(0);
    expect(d).toBeGreaterThan(0);
    expectDigits(b, c, 9);
    // A matrix with an eigenvalue of 0 has no determinant.
    expect(Math.abs(a * d - b * c)).toBeLessThan(1e-12 * d * d);
    const warning = fit.warnings.find(({ code }) => code === 'negative-eigenvalues');
    expect(warning?.detail).toContain('a negative eigenvalue, set to 0');
  });

  it('has no interval where a slope’s only variance would be negative, and says why', () => {
    const fit = fitOf(panelOf(cancelling(1), { outcome: 'y', regressors: ['x'] }), null, {
      slopes: 'two-way',
    });
    const [{ standardError, low, pValue, degreesOfFreedom, intervalReason }] = fit.slopes;
    expect([standardError, low, pValue]).toEqual([null, null, null]);
    expect(degreesOfFreedom).toBe(5);
    expect(intervalReason).toContain('companies and years');
    expect(fit.warnings.map(({ code }) => code)).toContain('negative-eigenvalues');
  });
});

/**
 * Errors that, times x, cancel within every company and within every year, so that rows add more than both; times z,
 * the second regressor, they add up within companies.
 */
function cancelling(regressors: 1 | 2): PanelRow[] {
  const random = randomNumbers(11);
  return Array.from({ length: 48 }, (_, index): PanelRow => {
    const company = Math.floor(index / 8);
    const year = index % 8;
    const x = year % 2 === 0 ? 1 : -1;
    const z = year < 4 ? 1 : -1;
    const pairs = year % 4 < 2 ? 1 : -1;
    const shock = (company % 2 === 0 ? pairs : -pairs) + (company < 3 ? z : -z) * (regressors - 1);
    return {
      company: `K${company}`,
      year: 2000 + year,
      outcome: company + x + shock + 0.01 * random(),
      regressors: [x + 0.01 * random(), z + 0.01 * random()].slice(0, regressors),
    };
  });
}
