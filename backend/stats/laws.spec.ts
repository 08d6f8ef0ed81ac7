import * as fc from 'fast-check';
import type { FitResult, PanelColumns } from './fit-result';
import { leastSquares } from './linear-algebra/least-squares';
import { contrastDegreesOfFreedom } from './prediction';
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
        const columns = [
          Float64Array.from(rows, () => 1),
          ...dummies.map((company) =>
            Float64Array.from(rows, (row) => (row.company === company ? 1 : 0)),
          ),
          ...names.regressors.map((_, k) => Float64Array.from(rows, (row) => row.regressors[k])),
        ];
        const { coefficients } = leastSquares(
          columns,
          Float64Array.from(rows, ({ outcome }) => outcome),
        );
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

  it('degrees of freedom of a contrast from the stored forms equal those of the fit', () => {
    fc.assert(
      fc.property(panels, (rows) => {
        const fit = fitOf(panelOf(rows, names), 'K1');
        fit.slopes.forEach(({ degreesOfFreedom }, k) => {
          const weights = names.regressors.map((_, index) => (index === k ? 1 : 0));
          const stored = fit.prediction?.slopeDegreesOfFreedom;
          expectDigits(
            stored && contrastDegreesOfFreedom(stored, weights),
            degreesOfFreedom ?? 0,
            8,
          );
        });
      }),
      runs,
    );
  });

  it('a contrast of two slopes has the degrees of freedom of the slope it becomes in other regressors', () => {
    fc.assert(
      fc.property(panels, (rows) => {
        // y = b·x + c·z = (b − c)·x + c·(x + z): the contrast b − c is a slope of the second form.
        const plain = fitOf(panelOf(rows, names), 'K1').prediction;
        const turned = fitOf(
          mapRows(rows, (row) => ({
            ...row,
            regressors: [row.regressors[0], row.regressors[0] + row.regressors[1]],
          })),
          'K1',
        );
        const degrees = plain && contrastDegreesOfFreedom(plain.slopeDegreesOfFreedom, [1, -1]);
        expectDigits(degrees, turned.slopes[0].degreesOfFreedom ?? 0, 7);
      }),
      runs,
    );
  });
});
