import type { Specification } from '../fit-result';
import { fitOf, goldenJson, goldenPanel } from '../testing/golden-panels';
import { type StartingPoint, type Triangle, uncertainPlan } from './index';

interface SimulatedFan {
  readonly percentiles: readonly number[];
  /** The standard error of each with n draws is this over √n. */
  readonly unitErrors: readonly number[];
}

/** Simulated in R with its own generators: `tools/reference/uncertain_plan.R`. */
interface SimulatedPlan {
  readonly file: string;
  readonly outcome: string;
  readonly regressors: readonly string[];
  readonly own: string;
  readonly specification: Pick<Specification, 'effects' | 'form' | 'lag'>;
  readonly start: StartingPoint;
  readonly year: number;
  readonly inputs: readonly Triangle[];
  readonly expected: SimulatedFan & { readonly mean: number; readonly meanUnitError: number };
  readonly market: SimulatedFan;
}

const outside = goldenJson<{ readonly draws: number; readonly cases: readonly SimulatedPlan[] }>(
  'uncertain-plan.json',
);
const draws = 200_000;

/** Four standard errors of the difference of two simulations, ours of 200,000 draws and R's of a million. */
function expectWithin(found: number | null, expected: number, unitError: number, context: string) {
  const error = unitError * Math.sqrt(1 / draws + 1 / outside.draws);
  expect(Math.abs((found ?? NaN) - expected) / error)
    .withContext(context)
    .toBeLessThan(4);
}

describe('uncertainPlan, against R', () => {
  for (const one of outside.cases) {
    const { effects, form, lag } = one.specification;
    it(`has the same fans: ${one.own}, ${effects}, ${form}, lag ${lag}, ${one.start}`, () => {
      const data = goldenPanel(one.file, one.outcome, one.regressors);
      const basis = fitOf(data, one.own, one.specification).prediction!;
      const years = [1, 2].map((h) => ({ year: basis.last.year + h, inputs: one.inputs }));
      const found = uncertainPlan(basis, { years, seed: 1, start: one.start, draws })[1];
      if (found.expected === null) throw new Error(found.reason);
      if (found.market.percentiles === null) throw new Error(found.market.reason);
      expect(found.year).toBe(one.year);
      expect(found.of).toBe(one.year - lag);
      expectWithin(found.expected.mean, one.expected.mean, one.expected.meanUnitError, 'mean');
      for (const key of ['expected', 'market'] as const) {
        one[key].percentiles.forEach((value, index) => {
          const percentile = found[key].percentiles?.[index] ?? null;
          expectWithin(percentile, value, one[key].unitErrors[index], `${key} ${index}`);
        });
      }
    });
  }
});
