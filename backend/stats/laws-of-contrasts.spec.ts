import * as fc from 'fast-check';
import { tQuantile } from './distributions/t-distribution';
import {
  contrastDegreesOfFreedom,
  decompositionFromLast,
  decompositionToBase,
  expectedValue,
} from './prediction';
import { expectDigits } from './testing/expect-digits';
import { fitOf, panelOf, type PanelRow } from './testing/golden-panels';
import { randomPanelNames as names, randomPanels as panels } from './testing/random-panels';

const runs = { numRuns: 60 };

const plans = fc.tuple(
  fc.double({ min: -500, max: 500, noNaN: true }),
  fc.double({ min: -500, max: 500, noNaN: true }),
);

/** A sum of terms may lose as many digits as its largest term has before the point. */
function expectSum(total: number, terms: readonly number[], expected: number): void {
  const size = Math.max(1, ...terms.map(Math.abs), Math.abs(expected));
  expect(Math.abs(total - expected) / size).toBeLessThan(1e-9);
}

describe('the laws of contrasts', () => {
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
          panelOf(
            rows.map((row): PanelRow => ({
              ...row,
              regressors: [row.regressors[0], row.regressors[0] + row.regressors[1]],
            })),
            names,
          ),
          'K1',
        );
        const degrees =
          plain?.slopeDegreesOfFreedom &&
          contrastDegreesOfFreedom(plain.slopeDegreesOfFreedom, [1, -1]);
        expectDigits(degrees, turned.slopes[0].degreesOfFreedom ?? 0, 7);
      }),
      runs,
    );
  });

  it('plan against base is the sum of b·Δx, each term the slope times its change, and nothing else', () => {
    fc.assert(
      fc.property(panels, plans, plans, (rows, plan, base) => {
        const fit = fitOf(panelOf(rows, names), 'K1');
        const basis = fit.prediction!;
        const { terms, total } = decompositionToBase(basis, plan, base, tQuantile);
        expect(total).toBe(terms.reduce((sum, term) => sum + term.estimate, 0));
        terms.forEach((term, k) =>
          expectDigits(term.estimate, fit.slopes[k].estimate * (plan[k] - base[k]), 12),
        );
        const ends = [expectedValue(basis, plan).estimate, expectedValue(basis, base).estimate];
        expectSum(total, ends, ends[0] - ends[1]);
      }),
      runs,
    );
  });

  it('plan against the last actual value is the sum of b·Δx and the part of the gap that fades', () => {
    fc.assert(
      fc.property(panels, plans, (rows, plan) => {
        const basis = fitOf(panelOf(rows, names), 'K1').prediction!;
        const { terms, fadingGap, total } = decompositionFromLast(basis, plan, tQuantile);
        expect(total).toBe(terms.reduce((sum, term) => sum + term.estimate, 0) + fadingGap);
        const ends = [expectedValue(basis, plan).estimate, basis.last.actual];
        expectSum(total, ends, ends[0] - ends[1]);
      }),
      runs,
    );
  });

  it('own against a peer is the intercepts’ difference, Σ b·(x_own − x_peer) and the residuals’ difference', () => {
    fc.assert(
      fc.property(panels, (rows) => {
        const data = panelOf(rows, names);
        const fit = fitOf(data, 'K1');
        const own = fit.ownYears![0];
        const peer = fitOf(data, 'K0').ownYears!.find(({ year }) => year === own.year)!;
        const pair = fit.pairs!.find(({ company }) => company === 'K0')!;
        const terms = [
          pair.estimate,
          ...fit.slopes.map(
            ({ estimate }, k) => estimate * (own.regressors[k] - peer.regressors[k]),
          ),
          own.residual - peer.residual,
        ];
        const total = terms.reduce((sum, term) => sum + term, 0);
        expectSum(total, terms, own.actual - peer.actual);
      }),
      runs,
    );
  });
});
