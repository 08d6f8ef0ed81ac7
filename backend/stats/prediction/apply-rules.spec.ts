import * as fc from 'fast-check';
import { expectDigits } from '../testing/expect-digits';
import {
  applyRules,
  type OwnYear,
  type PlanMove,
  type PlanRule,
  type PredictionBasis,
  type RuleRequest,
} from './index';

type Ground = Pick<PredictionBasis, 'regressors' | 'form' | 'held' | 'last'>;

const last: OwnYear = {
  year: 2025,
  fileRow: 9,
  actual: 3000,
  fitted: 2900,
  residual: 100,
  regressors: [110, 1000, 50],
};
const basis: Ground = { regressors: ['capex', 'equity', 'staff'], form: 'levels', last };
const years = [2026, 2027, 2028, 2029];
const hold: PlanRule = { kind: 'hold' };

/** With `rule` for capex, another for equity and moves where they are given; staff is held. */
function plan(
  rule: PlanRule | null,
  { equity = hold, ...rest }: { equity?: PlanRule | null } & Partial<RuleRequest> = {},
  ground: Ground = basis,
) {
  const typed = years.map(() => [7, 8, 9]);
  return applyRules(ground, { years, rules: [rule, equity, hold], typed, ...rest });
}

function capexOf(...from: Parameters<typeof plan>): readonly (number | null)[] {
  return plan(...from).values.map(([capex]) => capex);
}

const share = (percent: number, of: number): PlanRule => ({ kind: 'share', percent, of });
const grow = (percent: number): PlanRule => ({ kind: 'grow', percent });
const amounts = fc.integer({ min: -1e8, max: 1e8 }).map((cents) => cents / 100);
const moved = (year: number, amount: number, regressor = 1): PlanMove => ({
  year,
  regressor,
  amount,
});

describe('applyRules', () => {
  it('holds the last observed values, and with a lag the last year’s own', () => {
    expect(plan(hold)).toEqual({ values: years.map(() => last.regressors), reasons: [] });
    expect(capexOf(hold, {}, { ...basis, held: [120, 1100, 60] })).toEqual([120, 120, 120, 120]);
  });

  it('takes typed values where there is no rule', () => {
    expect(plan(null, { equity: null }).values).toEqual(years.map(() => [7, 8, 50]));
  });

  it('grows by a share a year, over calendar years', () => {
    // R 4.2.2: 110 * 1.035^(1:4)
    const expected = [
      113.84999999999999, 117.83474999999999, 121.95896624999997, 126.22753006874994,
    ];
    capexOf(grow(3.5)).forEach((value, index) => expectDigits(value, expected[index], 14));
    const typed = [[1, 1, 1]];
    const later = applyRules(basis, { years: [2028], rules: [grow(3.5), hold, hold], typed });
    expectDigits(later.values[0][0], expected[2], 14);
    expect(capexOf(grow(-100))).toEqual([0, 0, 0, 0]);
  });

  it('spreads a total evenly, rising and falling along a line', () => {
    // R 4.2.2: 1000 * (1:4)/sum(1:4)
    const rising = [100, 200, 300, 400];
    const of = (spread: 'even' | 'rising' | 'falling') =>
      capexOf({ kind: 'total', total: 1000, spread });
    expect(of('even')).toEqual([250, 250, 250, 250]);
    expect(of('rising')).toEqual(rising);
    expect(of('falling')).toEqual(rising.toReversed());
    fc.assert(
      fc.property(
        amounts,
        fc.constantFrom('even' as const, 'rising' as const, 'falling' as const),
        fc.integer({ min: 1, max: 5 }),
        (total, spread, count) => {
          const asked = { years: Array.from({ length: count }, (_, i) => 2026 + i), typed: [] };
          const rule = { kind: 'total', total, spread } as const;
          const { values } = applyRules(basis, { ...asked, rules: [rule, hold, hold] });
          const sum = values.reduce((so, [capex]) => so + (capex ?? NaN), 0);
          expect(Math.abs(sum - total)).toBeLessThanOrEqual(1e-15 * count * Math.abs(total));
        },
      ),
    );
  });

  it('takes a share of another regressor’s planned value of the same year, its moves included', () => {
    // R 4.2.2: 0.085 * (1000 * 1.02^(1:4) + c(0, -120, -120, 80))
    const expected = [
      86.700000000000003, 78.234000000000009, 80.002680000000012, 98.806733600000015,
    ];
    const moves = [moved(2027, -120), moved(2029, 200)];
    capexOf(share(8.5, 1), { equity: grow(2), moves }).forEach((value, index) =>
      expectDigits(value, expected[index], 14),
    );
    const chained = applyRules(basis, {
      years,
      rules: [share(50, 2), hold, share(10, 1)],
      typed: [],
    });
    expect(chained.values[3]).toEqual([50, 1000, 100]);
  });

  it('moves a level from one year on, on top of rules and typed values alike', () => {
    fc.assert(
      fc.property(
        fc.constantFrom<PlanRule | null>(hold, grow(5), null, share(200, 0)),
        amounts,
        amounts,
        (equity, raise, buyback) => {
          const moves = [moved(2027, raise), moved(2028, -buyback)];
          const plain = plan(hold, { equity });
          const lifted = plan(hold, { equity, moves });
          const turned = plan(hold, { equity, moves: moves.toReversed() });
          const lifts = [0, raise, raise - buyback, raise - buyback];
          lifted.values.forEach(([capex, value, staff], place) => {
            const size = 1e-12 * (1e4 + Math.abs(raise) + Math.abs(buyback));
            const before = plain.values[place][1] ?? NaN;
            expect([capex, staff]).toEqual([110, 50]);
            expect(Math.abs((value ?? NaN) - before - lifts[place])).toBeLessThan(size);
            expect(Math.abs((value ?? NaN) - (turned.values[place][1] ?? NaN))).toBeLessThan(size);
          });
        },
      ),
      { numRuns: 50 },
    );
  });
});

describe('what rules cannot do', () => {
  const whole = (rule: PlanRule | null, reason: string, from: Parameters<typeof plan>[1] = {}) => {
    const found = plan(rule, from);
    expect(found.reasons).toContain({ regressor: 0, year: null, reason });
    expect(found.values.every(([capex]) => capex === null)).toBeTrue();
    expect(found.values.every(([, , staff]) => staff === 50)).toBeTrue();
  };

  it('is said of numbers that are not there', () => {
    whole(grow(NaN), 'No rate of growth is given for capex.');
    whole({ kind: 'total', total: Infinity, spread: 'even' }, 'No total is given for capex.');
    whole(share(NaN, 1), 'No share is given for capex.');
    whole(share(10, 9), 'There is no regressor 9.');
    whole(hold, 'No amount is given for the move of capex in FY2027.', {
      moves: [moved(2027, NaN, 0)],
    });
    whole(hold, 'FY2030 is no year of the plan, so nothing moves in it.', {
      moves: [moved(2030, 5, 0)],
    });
  });

  it('is said of growth below minus 100 % and of growth from below zero', () => {
    whole(grow(-100.01), 'capex cannot shrink by more than 100 % a year.');
    const negative = { ...basis, held: [-3, 1, 1] };
    expect(plan(grow(5), {}, negative).reasons).toEqual([
      {
        regressor: 0,
        year: null,
        reason: 'capex was below zero in FY2025: from there a rate of growth has no meaning.',
      },
    ]);
  });

  it('is said of shares that lead back to themselves, and of what depends on them', () => {
    whole(share(10, 0), 'capex cannot be a share of itself.');
    const circle = 'is a share of what is a share of it: give one of them another rule.';
    whole(share(10, 1), `capex ${circle}`, { equity: share(10, 0) });
    const outside = applyRules(basis, {
      years,
      rules: [share(10, 1), share(10, 0), share(5, 1)],
      typed: [],
    });
    expect(outside.values.flat().every((value) => value === null)).toBeTrue();
    expect(outside.reasons).toEqual([
      { regressor: 0, year: null, reason: `capex ${circle}` },
      { regressor: 1, year: null, reason: `equity ${circle}` },
      {
        regressor: 2,
        year: null,
        reason: 'equity, which staff is a share of, has no value.',
      },
    ]);
  });

  it('is said of one year where only that lacks a value', () => {
    const typed = years.map((year) => [year === 2027 ? null : 20, 1, 1]);
    const { values, reasons } = plan(null, { equity: share(10, 0), typed });
    expect(values.map((row) => row.slice(0, 2))).toEqual([
      [20, 2],
      [null, null],
      [20, 2],
      [20, 2],
    ]);
    expect(reasons).toEqual([
      { regressor: 0, year: 2027, reason: 'No value is given for capex.' },
      {
        regressor: 1,
        year: 2027,
        reason: 'capex, which equity is a share of, has no value.',
      },
    ]);
    expect(plan(null, { typed: years.map(() => [NaN, 1, 1]) }).reasons.length).toBe(4);
  });

  it('is said of values the log form cannot read and a double cannot hold', () => {
    const logs = { ...basis, form: 'log' } as const;
    const { values, reasons } = plan(hold, { moves: [moved(2028, -1000)] }, logs);
    expect(values.map(([, equity]) => equity)).toEqual([1000, 1000, null, null]);
    const reason = 'The log form needs values above zero; equity is not.';
    expect(reasons).toEqual([
      { regressor: 1, year: 2028, reason },
      { regressor: 1, year: 2029, reason },
    ]);
    expect(plan(grow(1e200)).reasons[0]).toEqual({
      regressor: 0,
      year: 2027,
      reason: 'capex is beyond what a number can hold.',
    });
  });
});
