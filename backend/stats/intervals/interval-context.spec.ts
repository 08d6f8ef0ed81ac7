import * as fc from 'fast-check';
import { selectSample } from '../panel/select-sample';
import { expectedValue } from '../prediction';
import { withinFit } from '../regression/within-fit';
import { type DenseContrast, denseError } from '../testing/dense-error';
import { expectDigits } from '../testing/expect-digits';
import { fitOf, panelOf, type PanelRow } from '../testing/golden-panels';
import { randomNumbers, randomPanelNames, randomPanels } from '../testing/random-panels';
import { intervalContext } from './interval-context';

/** Engine figures beside a function that computes the same standard error from its definition. */
function both(rows: readonly PanelRow[]): {
  fit: ReturnType<typeof fitOf>;
  dense: (contrast: DenseContrast, cosines: number, hasOwnClock?: boolean) => number;
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
    dense: (contrast, cosines, hasOwnClock = false) =>
      denseError(rows, contrast, { persistence, cosines, hasOwnClock }),
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

describe('standard errors of a company with few rows', () => {
  const plan = [120, 40];

  /** Four companies over 16 years, all rows but for K1, which has its last `ownRows`; K3 lacks every third. */
  function panelWith(ownRows: number): readonly PanelRow[] {
    const random = randomNumbers(5);
    return [0, 1, 2, 3].flatMap((company) =>
      Array.from({ length: 16 }, (_, year): PanelRow => {
        const regressors = [100 * random() * (company + 1), 50 * random()];
        const outcome = 1000 * company + 2 * regressors[0] - regressors[1] + 40 * random();
        return { company: `K${company}`, year: 2000 + year, outcome, regressors };
      }).filter(
        (_, year) => (company !== 1 || year >= 16 - ownRows) && (company !== 3 || year % 3 !== 2),
      ),
    );
  }

  /** Asserts every error that leans on K1, with B or what is left of it, on either clock. */
  function expectErrors(
    ownRows: number,
    {
      hasOwnClock,
      cosines,
      forPairs,
    }: Record<'cosines' | 'forPairs', number> & { hasOwnClock: boolean },
  ): void {
    const { fit, dense } = both(panelWith(ownRows))!;
    const standing = { K0: -1 / 3, K1: 1, K2: -1 / 3, K3: -1 / 3 };
    expect(fit.standing?.cosines).toBe(cosines);
    expectDigits(
      fit.standing?.standardError,
      dense({ intercepts: standing, slopes: none }, cosines, hasOwnClock),
      8,
      'standing',
    );
    for (const { company, standardError } of fit.pairs ?? []) {
      const pair = { intercepts: { K1: 1, [company]: -1 }, slopes: none };
      expectDigits(standardError, dense(pair, forPairs, hasOwnClock), 8, company);
    }
    const intercept = fit.intercepts.find(({ company }) => company === 'K1');
    const level = { intercepts: { K1: 1 }, slopes: none };
    expectDigits(intercept?.standardError, dense(level, cosines, hasOwnClock), 8, 'intercept');
    const expected = { intercepts: { K1: 1 }, slopes: plan };
    expect(fit.prediction?.lambdas.length).toBe(cosines);
    expectDigits(
      expectedValue(fit.prediction!, plan).standardError,
      dense(expected, cosines, hasOwnClock),
      8,
      'expected value',
    );
  }

  it('run by the calendar from half of the years on', () => {
    expectErrors(8, { hasOwnClock: false, cosines: 3, forPairs: 6 });
  });

  it('run with its own rows below, on no more cosines than those can tell apart', () => {
    expectErrors(7, { hasOwnClock: true, cosines: 3, forPairs: 6 });
    expectErrors(5, { hasOwnClock: true, cosines: 3, forPairs: 4 });
    expectErrors(4, { hasOwnClock: true, cosines: 3, forPairs: 3 });
  });

  it('run by the calendar where its rows are too few for three cosines', () => {
    expectErrors(3, { hasOwnClock: false, cosines: 3, forPairs: 6 });
  });

  it('leave those of other companies by the calendar', () => {
    const { fit, dense } = both(panelWith(5))!;
    for (const company of ['K0', 'K2', 'K3']) {
      const { standardError } = fit.intercepts.find((one) => one.company === company)!;
      const level = { intercepts: { [company]: 1 }, slopes: none };
      expectDigits(standardError, dense(level, 3), 8, company);
    }
  });
});
