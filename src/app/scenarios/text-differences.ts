import type { PlanOutlook, PlanUncertainty } from '@contract';
import type { PredictionBasis } from '@prediction';
import type { NumberFormat } from '../ui/number-format';
import { confidenceText } from '../ui/phrases';
import { isSameRange, isSameRule } from '../ui/plan/asked-plan';
import { capitalised } from '../ui/plan/plan-words';
import { regressorKind } from '../ui/plan/regressor-labels';
import { moveWords, ruleWords } from '../ui/plan/rule-words';
import type { ScenarioText } from './scenario-text';

/** What two versions of a scenario do not share, one place at a time, each as it reads there. */
export interface TextDifference {
  /** Names the place: `name`, `years`, `amount 0 2026`, `regressor 1`, `range 0 2026`, … */
  readonly key: string;
  readonly label: string;
  readonly left: string;
  readonly right: string;
}

export interface DifferenceGround {
  readonly basis: Pick<PredictionBasis, 'held' | 'last'>;
  readonly labels: readonly string[];
  readonly numbers: Pick<NumberFormat, 'full' | 'shown'>;
}

const none = '–';

/** Every place at which two versions differ. A regressor under a rule in one of them is one place as a whole. */
export function textDifferences(
  left: ScenarioText,
  right: ScenarioText,
  ground: DifferenceGround,
): readonly TextDifference[] {
  const rows: TextDifference[] = [
    { key: 'name', label: 'Name', left: left.name, right: right.name },
    { key: 'note', label: 'Note', left: left.note || none, right: right.note || none },
    { key: 'years', label: 'Years', left: yearsOf(left), right: yearsOf(right) },
    ...ground.labels.flatMap((_, k) => regressorRows(left, right, k, ground)),
    ...outlookRows(left.outlook, right.outlook),
    {
      key: 'seed',
      label: 'Seed of the draws',
      left: String(left.uncertainty?.seed ?? none),
      right: String(right.uncertainty?.seed ?? none),
    },
  ];
  return rows.filter((row) => row.left !== row.right);
}

function yearsOf({ plan }: ScenarioText): string {
  return plan.map(({ year }) => `FY${year}`).join(', ');
}

function regressorRows(
  left: ScenarioText,
  right: ScenarioText,
  k: number,
  ground: DifferenceGround,
): readonly TextDifference[] {
  const label = capitalised(ground.labels[k]);
  const years = [...new Set([...left.plan, ...right.plan].map(({ year }) => year))];
  const ranges = years.flatMap((year): readonly TextDifference[] => {
    const [mine, other] = [rangeOf(left, year, k), rangeOf(right, year, k)];
    return isSameRange(mine, other)
      ? []
      : [
          {
            key: `range ${k} ${year}`,
            label: `Low and high of ${ground.labels[k]} FY${year}`,
            left: rangeText(mine, k, ground),
            right: rangeText(other, k, ground),
          },
        ];
  });
  if (isWhole(left, right, k))
    return [
      {
        key: `regressor ${k}`,
        label: `${label}, all years`,
        left: wholeText(left, k, ground),
        right: wholeText(right, k, ground),
      },
      ...ranges,
    ];
  const amounts = years.flatMap((year): readonly TextDifference[] => {
    const [mine, other] = [amountOf(left, year, k), amountOf(right, year, k)];
    return mine === undefined || other === undefined || mine === other
      ? []
      : [
          {
            key: `amount ${k} ${year}`,
            label: `${label} FY${year}`,
            left: ground.numbers.full(mine, regressorKind(k)),
            right: ground.numbers.full(other, regressorKind(k)),
          },
        ];
  });
  return [...amounts, ...ranges];
}

/** Whether a regressor is chosen as a whole: its amounts hang together by a rule or moves in one of the two. */
export function isWhole(left: ScenarioText, right: ScenarioText, k: number): boolean {
  const [mine, other] = [left.rules[k], right.rules[k]];
  const isByHand = mine.rule === null && other.rule === null;
  return !(isByHand && isSameRule(mine, other));
}

function wholeText(text: ScenarioText, k: number, { basis, labels, numbers }: DifferenceGround) {
  const { rule, moves } = text.rules[k];
  const [first, last] = [text.plan[0].year, text.plan[text.plan.length - 1].year];
  const ruled = { basis, labels, regressor: k, years: [first, last] as const };
  const amounts = text.plan.map(({ values }) => numbers.full(values[k], regressorKind(k)));
  const words = [
    ruleWords(rule, ruled, numbers),
    ...moves.map((move) => moveWords(move, k, numbers)),
  ];
  return `${words.join('; ')}: ${amounts.join(' · ')}`;
}

function outlookRows(left: PlanOutlook, right: PlanOutlook): readonly TextDifference[] {
  const row = (key: string, label: string, of: (outlook: PlanOutlook) => string) => ({
    key,
    label,
    left: of(left),
    right: of(right),
  });
  return [
    row('start', 'Starting point', ({ start }) => startWords[start]),
    row('yearEffect', 'Year effect', ({ yearEffect }) => yearEffectWords(yearEffect)),
    row('confidence', 'Confidence of intervals', ({ confidence }) => confidenceText(confidence)),
    row('bandConfidence', 'Confidence of the band', ({ bandConfidence }) =>
      confidenceText(bandConfidence),
    ),
  ];
}

export const startWords = {
  'model-level': 'model level',
  'carry-the-gap': 'carries the gap',
} as const;

export function yearEffectWords(effect: PlanOutlook['yearEffect']): string {
  if (typeof effect === 'object') return `given as ${effect.given}`;
  return effect === 'last' ? 'of the last year' : 'mean of the last three';
}

type AmountRange = PlanUncertainty['ranges'][number][number];

export function rangeOf({ plan, uncertainty }: ScenarioText, year: number, k: number): AmountRange {
  const index = plan.findIndex((planned) => planned.year === year);
  return index === -1 ? null : (uncertainty?.ranges[index][k] ?? null);
}

function rangeText(range: AmountRange, k: number, { numbers }: DifferenceGround): string {
  if (range === null) return 'certain';
  const kind = regressorKind(k);
  return `${numbers.full(range.low, kind)} to ${numbers.full(range.high, kind)}`;
}

function amountOf({ plan }: ScenarioText, year: number, k: number): number | undefined {
  return plan.find((planned) => planned.year === year)?.values[k];
}
