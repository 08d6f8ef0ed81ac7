import { tQuantile } from '../distributions/t-distribution';
import type { Specification } from '../fit-result';
import { expectDigits } from '../testing/expect-digits';
import { fitOf, goldenJson, goldenPanel } from '../testing/golden-panels';
import {
  differenceOfScenarios,
  type ObservedRange,
  type Outlook,
  sensitivity,
  type StartingPoint,
  type YearEffectChoice,
} from './index';

interface Figures {
  readonly estimate: number;
  readonly low: number;
  readonly high: number;
}

interface Look {
  readonly start: StartingPoint;
  readonly yearEffect: YearEffectChoice;
}

/** From the full dummy regression in R: `tools/reference/scenarios.R`. */
interface ScenarioCase {
  readonly file: string;
  readonly outcome: string;
  readonly regressors: readonly string[];
  readonly own: string;
  readonly specification: Pick<Specification, 'effects' | 'form' | 'lag' | 'confidence'>;
  readonly plans: Readonly<Record<'left' | 'right', readonly number[]>>;
  readonly differences: readonly (Figures & {
    readonly year: number;
    readonly left: Look;
    readonly right: Look;
    readonly kind: 'slopes' | 'calibrated';
    readonly standardError: number;
  })[];
  readonly peerSpread: readonly ObservedRange[];
  readonly sensitivity: {
    readonly year: number;
    readonly moves: readonly {
      readonly regressor: number;
      readonly expected: { readonly low: Figures; readonly high: Figures };
      readonly change: Figures & { readonly standardError: number };
    }[];
  };
}

const { cases } = goldenJson<{ readonly cases: readonly ScenarioCase[] }>('scenarios.json');
const digits = 9;

for (const outside of cases) {
  const { effects, form, lag } = outside.specification;
  describe(`scenarios of ${outside.own}, ${effects}, ${form}, lag ${lag}`, () => {
    const data = goldenPanel(outside.file, outside.outcome, outside.regressors);
    const basis = fitOf(data, outside.own, outside.specification).prediction!;

    it('differ by one contrast with its own interval', () => {
      for (const expected of outside.differences) {
        const { year, kind } = expected;
        const sideOf = (side: 'left' | 'right') => {
          const outlook: Outlook = { year, ...expected[side] };
          return { regressors: outside.plans[side], outlook };
        };
        const found = differenceOfScenarios(basis, sideOf('left'), sideOf('right'), tQuantile);
        const context = `${year} ${JSON.stringify([expected.left, expected.right])}`;
        expect(found.kind).withContext(context).toBe(kind);
        for (const key of ['estimate', 'standardError', 'low', 'high'] as const)
          expectDigits(found[key], expected[key], digits, `${context} ${key}`);
      }
    });

    it('know the peers’ 10th and 90th percentile of what the model read', () => {
      outside.peerSpread.forEach(({ low, high }, k) => {
        expectDigits(basis.peerSpread?.[k].low, low, 14, 'low');
        expectDigits(basis.peerSpread?.[k].high, high, 14, 'high');
      });
    });

    it('move by one regressor as much as over the peers’ spread, the largest move first', () => {
      const { year, moves } = outside.sensitivity;
      const found = sensitivity(basis, { regressors: outside.plans.left, year }, tQuantile);
      if (found.regressors === null) throw new Error(found.reason);
      const sizes = moves.map(({ change }) => Math.abs(change.estimate));
      expect(found.regressors.map(({ index }) => sizes[index])).toEqual(
        sizes.toSorted((left, right) => right - left),
      );
      for (const { index, low, high, change, planned } of found.regressors) {
        const move = moves[index];
        expect(planned).toBe(outside.plans.left[index]);
        for (const key of ['estimate', 'standardError', 'low', 'high'] as const)
          expectDigits(change[key], move.change[key], digits, `change ${key}`);
        for (const key of ['estimate', 'low', 'high'] as const) {
          expectDigits(low.expected?.[key], move.expected.low[key], digits, `low end ${key}`);
          expectDigits(high.expected?.[key], move.expected.high[key], digits, `high end ${key}`);
        }
      }
    });
  });
}
