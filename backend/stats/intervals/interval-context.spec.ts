import * as fc from 'fast-check';
import { selectSample } from '../panel/select-sample';
import { expectedValue } from '../prediction';
import { withinFit } from '../regression/within-fit';
import { type DenseContrast, denseError } from '../testing/dense-error';
import { expectDigits } from '../testing/expect-digits';
import { fitOf, panelOf, type PanelRow } from '../testing/golden-panels';
import { randomPanelNames, randomPanels } from '../testing/random-panels';
import { intervalContext } from './interval-context';

/** Engine figures beside a function that computes the same standard error from its definition. */
function both(rows: readonly PanelRow[]): {
  fit: ReturnType<typeof fitOf>;
  dense: (contrast: DenseContrast, cosines: number) => number;
  cosines: number;
  rankCosines: number;
} | null {
  const data = panelOf(rows, randomPanelNames);
  const fit = fitOf(data, 'K1');
  const context = intervalContext(withinFit(selectSample(data, 'K1', undefined), 'company'), 0.95);
  if (context.forms === null) return null;
  const { used } = context.persistence;
  const persistence = (company: string): number =>
    used[context.fit.sample.companies.indexOf(company)];
  return {
    fit,
    dense: (contrast, cosines) => denseError(rows, contrast, persistence, cosines),
    cosines: context.cosines,
    rankCosines: context.rankCosines,
  };
}

const none = [0, 0];
const runs = { numRuns: 40 };

describe('calibrated standard errors', () => {
  it('of standing, intercepts and pairs equal their definition written out row by row', () => {
    fc.assert(
      fc.property(randomPanels, (rows) => {
        const found = both(rows);
        if (found === null) return;
        const { fit, dense, cosines, rankCosines } = found;
        const peers = fit.members.filter((name) => name !== 'K1');
        const intercepts = Object.fromEntries(peers.map((name) => [name, -1 / peers.length]));
        const standing = dense({ intercepts: { ...intercepts, K1: 1 }, slopes: none }, cosines);
        expectDigits(fit.standing?.standardError, standing, 8, 'standing');
        for (const { company, standardError } of fit.intercepts) {
          const expected = dense({ intercepts: { [company]: 1 }, slopes: none }, cosines);
          expectDigits(standardError, expected, 8, company);
        }
        for (const { company, standardError } of fit.pairs ?? []) {
          const expected = dense(
            { intercepts: { K1: 1, [company]: -1 }, slopes: none },
            rankCosines,
          );
          expectDigits(standardError, expected, 8, `K1 against ${company}`);
        }
      }),
      runs,
    );
  });

  it('of an expected value from λ, A and D equal their definition written out row by row', () => {
    const plans = fc.tuple(
      fc.integer({ min: -900, max: 900 }),
      fc.integer({ min: -900, max: 900 }),
    );
    fc.assert(
      fc.property(randomPanels, plans, (rows, plan) => {
        const found = both(rows);
        if (found?.fit.prediction == null) return;
        const expected = found.dense({ intercepts: { K1: 1 }, slopes: plan }, found.cosines);
        expectDigits(expectedValue(found.fit.prediction, plan).standardError, expected, 8);
      }),
      runs,
    );
  });
});
