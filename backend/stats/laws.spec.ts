import * as fc from 'fast-check';
import type { FitResult, PanelColumns } from './fit-result';
import { leastSquares } from './linear-algebra/least-squares';
import { expectDigits } from './testing/expect-digits';
import { fitOf, panelOf, type PanelRow } from './testing/golden-panels';
import { randomPanelNames as names, randomPanels as panels } from './testing/random-panels';

const runs = { numRuns: 60 };

function figures(fit: FitResult): number[] {
  return [
    ...fit.slopes.flatMap(({ estimate, standardError, degreesOfFreedom }) => [
      estimate,
      standardError,
      degreesOfFreedom,
    ]),
    fit.goodness.f.value,
    fit.poolability.value,
    fit.standing?.estimate,
    fit.standing?.standardError,
    fit.drift?.estimate,
    ...(fit.gapPath ?? []).map(({ gap }) => gap),
  ].map((value) => value ?? 0);
}

function expectSame(left: FitResult, right: FitResult, digits: number): void {
  const expected = figures(right);
  figures(left).forEach((value, index) => {
    expectDigits(value, expected[index], digits, `figure ${index}`);
  });
}

function mapRows(rows: readonly PanelRow[], change: (row: PanelRow) => PanelRow): PanelColumns {
  return panelOf(rows.map(change), names);
}

describe('the laws of company effects', () => {
  it('the within regression equals least squares with a constant and N − 1 dummies, whichever company is the reference', () => {
    fc.assert(
      fc.property(panels, fc.nat(), (rows, pick) => {
        const companies = [...new Set(rows.map(({ company }) => company))];
        const reference = companies[pick % companies.length];
        const dummies = companies.filter((company) => company !== reference);
        const coefficients = dummyRegression(rows, dummies, []);
        const fit = fitOf(panelOf(rows, names));
        fit.slopes.forEach(({ estimate }, k) =>
          expectDigits(estimate, coefficients[companies.length + k], 9, 'slope'),
        );
        for (const { company, estimate } of fit.intercepts) {
          const dummy = dummies.indexOf(company);
          const expected = coefficients[0] + (dummy === -1 ? 0 : coefficients[1 + dummy]);
          expect(Math.abs(estimate - expected)).toBeLessThan(1e-8);
        }
      }),
      runs,
    );
  });

  it('shifting the outcome and the regressors moves no slope, no standing and no gap', () => {
    fc.assert(
      fc.property(panels, (rows) => {
        const shifted = mapRows(rows, (row) => ({
          ...row,
          outcome: row.outcome + 1e6,
          regressors: row.regressors.map((value) => value - 1e6),
        }));
        expectSame(fitOf(shifted, 'K1'), fitOf(panelOf(rows, names), 'K1'), 7);
      }),
      runs,
    );
  });

  it('a change of unit scales what has that unit and nothing else', () => {
    fc.assert(
      fc.property(panels, (rows) => {
        const plain = fitOf(panelOf(rows, names), 'K1');
        const scaled = fitOf(
          mapRows(rows, (row) => ({
            ...row,
            outcome: row.outcome * 1000,
            regressors: [row.regressors[0] * 1000, row.regressors[1]],
          })),
          'K1',
        );
        expectDigits(scaled.slopes[0].estimate, plain.slopes[0].estimate, 9);
        expectDigits(scaled.slopes[1].estimate, 1000 * plain.slopes[1].estimate, 9);
        expectDigits(
          scaled.standing?.standardError ?? 0,
          1000 * (plain.standing?.standardError ?? 0),
          9,
        );
        expectDigits(scaled.poolability.value ?? 0, plain.poolability.value ?? 0, 9);
        expectDigits(
          scaled.slopes[0].degreesOfFreedom ?? 0,
          plain.slopes[0].degreesOfFreedom ?? 0,
          9,
        );
      }),
      runs,
    );
  });

  it('the order of rows changes no bit of any figure, nor the hash', () => {
    fc.assert(
      fc.property(panels, fc.infiniteStream(fc.nat()), (rows, keys) => {
        const shuffled = rows
          .map((row) => ({ row, key: keys.next().value as number }))
          .sort((left, right) => left.key - right.key);
        const left = fitOf(
          panelOf(
            shuffled.map(({ row }) => row),
            names,
          ),
          'K1',
        );
        const right = fitOf(panelOf(rows, names), 'K1');
        expect(figures(left)).toEqual(figures(right));
        expect(left.hash).toBe(right.hash);
      }),
      runs,
    );
  });

  it('other names in another order change no figure, but the hash', () => {
    fc.assert(
      fc.property(panels, (rows) => {
        const renamed = fitOf(
          mapRows(rows, (row) => ({ ...row, company: `${9 - Number(row.company.slice(1))} Ltd` })),
          '8 Ltd',
        );
        const plain = fitOf(panelOf(rows, names), 'K1');
        expectSame(renamed, plain, 8);
        expect(renamed.hash).not.toBe(plain.hash);
      }),
      runs,
    );
  });

  it('the differences of intercepts are the dummies’ coefficients, whichever company is the reference', () => {
    fc.assert(
      fc.property(panels, (rows) => {
        const companies = [...new Set(rows.map(({ company }) => company))];
        for (const reference of companies) {
          const dummies = companies.filter((company) => company !== reference);
          const coefficients = dummyRegression(rows, dummies, []);
          for (const { company, estimate } of fitOf(panelOf(rows, names), reference).pairs ?? []) {
            const expected = -coefficients[1 + dummies.indexOf(company)];
            expect(Math.abs(estimate - expected)).toBeLessThan(1e-8);
          }
        }
      }),
      runs,
    );
  });

  it('with year effects the within regression equals N − 1 company and T − 1 year dummies, on unbalanced panels too', () => {
    fc.assert(
      fc.property(panels, fc.nat(), fc.nat(), (rows, one, other) => {
        const companies = [...new Set(rows.map(({ company }) => company))];
        const years = [...new Set(rows.map(({ year }) => year))].sort();
        const reference = years[other % years.length];
        const dummies = companies.filter((_, index) => index !== one % companies.length);
        const yearDummies = years.filter((year) => year !== reference);
        const coefficients = dummyRegression(rows, dummies, yearDummies);
        const fit = fitOf(panelOf(rows, names), null, { effects: 'company,year' });
        const first = coefficients.length - names.regressors.length;
        fit.slopes.forEach(({ estimate }, k) =>
          expectDigits(estimate, coefficients[first + k], 9, 'slope'),
        );
        const dummyOf = (year: number): number =>
          year === reference ? 0 : coefficients[1 + dummies.length + yearDummies.indexOf(year)];
        const effects = fit.yearEffects!;
        const offset = effects.find(({ year }) => year === reference)!.estimate;
        for (const { year, estimate } of effects) {
          expect(Math.abs(estimate - offset - dummyOf(year))).toBeLessThan(1e-8);
        }
      }),
      runs,
    );
  });

  it('a constant added to the outcome shifts every intercept by it and nothing else', () => {
    fc.assert(
      fc.property(panels, fc.double({ min: -1e4, max: 1e4, noNaN: true }), (rows, constant) => {
        const plain = fitOf(panelOf(rows, names), 'K1');
        const shifted = fitOf(
          mapRows(rows, (row) => ({ ...row, outcome: row.outcome + constant })),
          'K1',
        );
        expectSame(shifted, plain, 7);
        plain.intercepts.forEach((intercept, index) => {
          const moved = shifted.intercepts[index];
          expect(Math.abs(moved.estimate - intercept.estimate - constant)).toBeLessThan(1e-7);
          // A draw of five fiscal years has no interval, shifted or not.
          if (intercept.standardError === null) expect(moved.standardError).toBeNull();
          else expectDigits(moved.standardError, intercept.standardError, 7);
        });
      }),
      runs,
    );
  });

  it('a company with one row changes no figure, and is listed with y − x’b', () => {
    fc.assert(
      fc.property(panels, (rows) => {
        const single = { company: 'K9', year: 2003, outcome: 55, regressors: [10, 4] };
        const plain = fitOf(panelOf(rows, names), 'K1');
        const fit = fitOf(panelOf([...rows, single], names), 'K1');
        expect(figures(fit)).toEqual(figures(plain));
        expect(fit.sample.singleRow).toEqual(['K9']);
        const listed = fit.intercepts.find(({ company }) => company === 'K9');
        const fitted = single.regressors.reduce(
          (sum, value, k) => sum + value * fit.slopes[k].estimate,
          0,
        );
        expectDigits(listed?.estimate, single.outcome - fitted, 9);
        expect(listed?.low).toBeNull();
      }),
      runs,
    );
  });

  // With X'X and RSS doubled, RSS/df·(X'X)⁻¹ changes by the degrees of freedom alone; the sandwich of scores has none.
  for (const effects of ['company', 'company,year'] as const) {
    it(`a panel held twice under new names halves variances but for the degrees of freedom, with ${effects} effects`, () => {
      fc.assert(
        fc.property(panels, (rows) => {
          const twice = [...rows, ...rows.map((row) => ({ ...row, company: `${row.company} b` }))];
          const companies = new Set(rows.map(({ company }) => company)).size;
          const years = new Set(rows.map(({ year }) => year)).size;
          const parameters = names.regressors.length + (effects === 'company' ? 0 : years - 1);
          const df = rows.length - companies - parameters;
          const dfTwice = 2 * (rows.length - companies) - parameters;
          const variance = (
            panel: readonly PanelRow[],
            slopes: 'classical' | 'cr0',
            k: number,
          ): number =>
            fitOf(panelOf(panel, names), null, { effects, slopes }).slopeCovariance![k][k];
          names.regressors.forEach((_, k) => {
            const classical = variance(rows, 'classical', k);
            expectDigits(variance(twice, 'classical', k), (classical * df) / dfTwice, 8);
            expectDigits(variance(twice, 'cr0', k), variance(rows, 'cr0', k) / 2, 8);
          });
        }),
        runs,
      );
    });
  }
});

/** Least squares with a constant, dummies of these companies and years, and the regressors, in this order. */
function dummyRegression(
  rows: readonly PanelRow[],
  companies: readonly string[],
  years: readonly number[],
): Float64Array {
  const column = (value: (row: PanelRow) => number): Float64Array => Float64Array.from(rows, value);
  const columns = [
    column(() => 1),
    ...companies.map((company) => column((row) => (row.company === company ? 1 : 0))),
    ...years.map((year) => column((row) => (row.year === year ? 1 : 0))),
    ...names.regressors.map((_, k) => column((row) => row.regressors[k])),
  ];
  return leastSquares(
    columns,
    column(({ outcome }) => outcome),
  ).coefficients;
}
