import * as fc from 'fast-check';
import { selectSample } from '../panel/select-sample';
import { expectedValue } from '../prediction';
import { withinFit } from '../regression/within-fit';
import { type DenseContrast, denseError } from '../testing/dense-error';
import { expectDigits } from '../testing/expect-digits';
import { fitOf, panelOf, type PanelRow } from '../testing/golden-panels';
import { randomNumbers, randomPanelNames, randomPanels } from '../testing/random-panels';
import { intervalContext } from './interval-context';

/** Weights by company whose rows drive the cosines; null for the calendar. */
type Clock = DenseContrast['intercepts'] | null;

interface Found {
  readonly fit: ReturnType<typeof fitOf>;
  readonly dense: (contrast: DenseContrast, cosines: number, clock: Clock) => number;
  readonly denseDrift: (cosines: number, clock: Clock) => number;
  readonly cosines: number;
  readonly rankCosines: number;
}

/** Engine figures beside functions that compute the same standard errors from their definition. */
function both(rows: readonly PanelRow[]): Found | null {
  const data = panelOf(rows, randomPanelNames);
  const fit = fitOf(data, 'K1');
  const context = intervalContext(withinFit(selectSample(data, 'K1', undefined), 'company'), 0.95);
  if (context.forms === null) return null;
  const { used } = context.persistence;
  const persistence = (company: string): number =>
    used[context.fit.sample.companies.indexOf(company)];
  return {
    fit,
    dense: (contrast, cosines, clock) =>
      denseError(rows, contrast, { persistence, cosines, clock }),
    denseDrift: (cosines, clock) => {
      const trend = (row: PanelRow, isIncluded: boolean): number =>
        isIncluded ? row.year - 2000 : 0;
      const augmented = rows.map((row) => {
        const isOwn = row.company === 'K1';
        return { ...row, regressors: [...row.regressors, trend(row, isOwn), trend(row, !isOwn)] };
      });
      const contrast = { intercepts: {}, slopes: [...none, 1, -1] };
      return denseError(augmented, contrast, { persistence, cosines, clock });
    },
    cosines: context.cosines,
    rankCosines: context.rankCosines,
  };
}

/** The clock of a contrast and how many of these cosines run over it, by the methods. */
function byMethod(
  rows: readonly PanelRow[],
  intercepts: DenseContrast['intercepts'],
  cosines: number,
): [number, Clock] {
  const rowsOf = (name: string): number => rows.filter(({ company }) => company === name).length;
  const years = new Set(rows.map(({ year }) => year)).size;
  const parts = Object.entries(intercepts).map(([name, weight]) => {
    const count = rowsOf(name);
    return { count, variance: weight ** 2 / count, isShort: count / years < 2 / 3 };
  });
  const sum = (of: typeof parts): number => of.reduce((total, { variance }) => total + variance, 0);
  const short = parts.filter(({ isShort }) => isShort);
  const [first] = [...short].sort((left, right) => right.variance - left.variance);
  const hasOwnClock = short.length > 0 && first.count > 3 && sum(short) >= sum(parts) / 2;
  return hasOwnClock ? [Math.min(cosines, first.count - 1), intercepts] : [cosines, null];
}

/** K1 against the average of these peers. */
function averagePair(peers: readonly string[]): DenseContrast['intercepts'] {
  const share = Math.sqrt(1 / peers.length);
  return { ...Object.fromEntries(peers.map((name) => [name, share])), K1: 1 };
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
        const weights = { ...intercepts, K1: 1 };
        const standing = dense(
          { intercepts: weights, slopes: none },
          ...byMethod(rows, weights, cosines),
        );
        expectDigits(fit.standing?.standardError, standing, 8, 'standing');
        for (const { company, standardError } of fit.intercepts) {
          const level = { intercepts: { [company]: 1 }, slopes: none };
          const clock: [number, Clock] =
            company === 'K1' ? byMethod(rows, { K1: 1 }, cosines) : [cosines, null];
          const expected = dense(level, ...clock);
          expectDigits(standardError, expected, 8, company);
        }
        const [forPairs, level] = byMethod(rows, { K1: 1 }, rankCosines);
        const shared = level && averagePair(peers);
        for (const { company, standardError } of fit.pairs ?? []) {
          const pair = { intercepts: { K1: 1, [company]: -1 }, slopes: none };
          const expected = dense(pair, forPairs, shared);
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
        const expected = found.dense(
          { intercepts: { K1: 1 }, slopes: plan },
          ...byMethod(rows, { K1: 1 }, found.cosines),
        );
        expectDigits(expectedValue(found.fit.prediction, plan).standardError, expected, 8);
      }),
      runs,
    );
  });
});

describe('standard errors of a company with few rows', () => {
  const plan = [120, 40];

  /** Four companies over 16 years, all rows but for K1, which has its last `ownRows`; K3 lacks every fourth. */
  function panelWith(ownRows: number): readonly PanelRow[] {
    const random = randomNumbers(5);
    return [0, 1, 2, 3].flatMap((company) =>
      Array.from({ length: 16 }, (_, year): PanelRow => {
        const regressors = [100 * random() * (company + 1), 50 * random()];
        const outcome = 1000 * company + 2 * regressors[0] - regressors[1] + 40 * random();
        return { company: `K${company}`, year: 2000 + year, outcome, regressors };
      }).filter(
        (_, year) => (company !== 1 || year >= 16 - ownRows) && (company !== 3 || year % 4 !== 2),
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
      dense({ intercepts: standing, slopes: none }, cosines, hasOwnClock ? standing : null),
      8,
      'standing',
    );
    for (const { company, standardError } of fit.pairs ?? []) {
      const pair = { intercepts: { K1: 1, [company]: -1 }, slopes: none };
      const clock = hasOwnClock ? averagePair(['K0', 'K2', 'K3']) : null;
      expectDigits(standardError, dense(pair, forPairs, clock), 8, company);
    }
    const intercept = fit.intercepts.find(({ company }) => company === 'K1');
    const level = { intercepts: { K1: 1 }, slopes: none };
    expectDigits(
      intercept?.standardError,
      dense(level, cosines, hasOwnClock ? { K1: 1 } : null),
      8,
      'intercept',
    );
    const expected = { intercepts: { K1: 1 }, slopes: plan };
    expect(fit.prediction?.lambdas.length).toBe(cosines);
    expectDigits(
      expectedValue(fit.prediction!, plan).standardError,
      dense(expected, cosines, hasOwnClock ? { K1: 1 } : null),
      8,
      'expected value',
    );
  }

  it('run by the calendar from two thirds of the years on', () => {
    expectErrors(11, { hasOwnClock: false, cosines: 3, forPairs: 6 });
  });

  it('run with its own rows below, on no more cosines than those can tell apart', () => {
    expectErrors(10, { hasOwnClock: true, cosines: 3, forPairs: 6 });
    expectErrors(5, { hasOwnClock: true, cosines: 3, forPairs: 4 });
    expectErrors(4, { hasOwnClock: true, cosines: 3, forPairs: 3 });
  });

  it('run by the calendar where its rows are too few for three cosines', () => {
    expectErrors(3, { hasOwnClock: false, cosines: 3, forPairs: 6 });
  });

  it('take the drift along', () => {
    const short = both(panelWith(8))!;
    expectDigits(short.fit.drift?.standardError, short.denseDrift(6, { K1: 1 }), 8, 'short');
    const long = both(panelWith(11))!;
    expectDigits(long.fit.drift?.standardError, long.denseDrift(6, null), 8, 'long');
  });

  it('leave those of other companies by the calendar', () => {
    const { fit, dense } = both(panelWith(5))!;
    for (const company of ['K0', 'K2', 'K3']) {
      const { standardError } = fit.intercepts.find((one) => one.company === company)!;
      const level = { intercepts: { [company]: 1 }, slopes: none };
      expectDigits(standardError, dense(level, 3, null), 8, company);
    }
  });
});
