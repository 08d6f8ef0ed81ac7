import type { PlanMove, PlanRule, PlanUncertainty, RegressorPlan } from '@contract';
import { type PredictionBasis, applyRules, heldRegressors } from '@prediction';
import { type AskedPlan, typedByHand } from './asked-plan';
import { heldPlan, withYearAdded, withYearRemoved } from './change-plan';
import type { PlannedYear } from './planned-year';

/** What a change of a plan comes to, or why there is none. */
export type AskedChange =
  | {
      readonly kind: 'changed';
      readonly asked: AskedPlan;
      /** Regressors whose rule ended, for an amount under it was changed. */
      readonly freed: readonly number[];
    }
  | { readonly kind: 'refused'; readonly reason: string };

/** One planned amount, in the panel's unit. */
export interface PlannedAmount {
  readonly year: number;
  readonly regressor: number;
  readonly value: number;
}

type RuleGround = Pick<PredictionBasis, 'regressors' | 'form' | 'held' | 'last'>;

/** With amounts set by hand: a rule that gave another amount ends, the amounts that it gave stay. */
export function withAmounts(
  basis: RuleGround,
  asked: AskedPlan,
  amounts: readonly PlannedAmount[],
): AskedChange {
  const changed = amounts.filter(({ year, regressor, value }) =>
    asked.plan.some((planned) => planned.year === year && planned.values[regressor] !== value),
  );
  const plan = asked.plan.map(({ year, values }) => ({
    year,
    values: values.map((value, k) => {
      const set = changed.find((each) => each.year === year && each.regressor === k);
      return set === undefined ? value : set.value;
    }),
  }));
  const freed = asked.rules.flatMap(({ rule }, k) =>
    rule !== null && changed.some(({ regressor }) => regressor === k) ? [k] : [],
  );
  const rules = asked.rules.map((rule, k) => (freed.includes(k) ? { ...rule, rule: null } : rule));
  return filled(basis, { ...asked, plan, rules }, freed);
}

/** With a plan of the same or another length, as sliders give it. */
export function withPlan(
  basis: RuleGround,
  asked: AskedPlan,
  plan: readonly PlannedYear[],
): AskedChange {
  if (plan.length > asked.plan.length) return withYearMore(basis, asked);
  if (plan.length < asked.plan.length) return withYearLess(basis, asked);
  const amounts = plan.flatMap(({ year, values }) =>
    values.map((value, regressor) => ({ year, regressor, value })),
  );
  return withAmounts(basis, asked, amounts);
}

/** One more year: rules reach on, what was typed keeps its last amount. */
export function withYearMore(basis: RuleGround, asked: AskedPlan): AskedChange {
  return filled(basis, { ...asked, plan: withYearAdded(asked.plan) });
}

/** Without the last year, and what moves in it. */
export function withYearLess(basis: RuleGround, asked: AskedPlan): AskedChange {
  const plan = withYearRemoved(asked.plan);
  const last = plan[plan.length - 1].year;
  const rules = asked.rules.map(({ rule, moves }) => ({
    rule,
    moves: moves.filter(({ year }) => year <= last),
  }));
  return filled(basis, { ...asked, plan, rules });
}

/** The base again: the last actual values held, no rule and no range; years and outlook stay. */
export function heldAgain(basis: RuleGround, asked: AskedPlan): AskedChange {
  const plan = heldPlan(basis, asked.plan.length);
  const rules = asked.rules.map(() => typedByHand);
  return { kind: 'changed', asked: { ...asked, plan, rules, uncertainty: null }, freed: [] };
}

/** Under a rule, or with null by hand: the amounts that there are stay. */
export function withRule(
  basis: RuleGround,
  asked: AskedPlan,
  regressor: number,
  rule: PlanRule | null,
): AskedChange {
  return filled(basis, withRegressor(asked, regressor, { ...asked.rules[regressor], rule }));
}

/** With an equity raise or a buyback in a year, in the place of one that the year had. */
export function withMove(
  basis: RuleGround,
  asked: AskedPlan,
  regressor: number,
  move: PlanMove,
): AskedChange {
  const before = asked.rules[regressor].moves.find(({ year }) => year === move.year)?.amount ?? 0;
  const moved = shifted(asked, regressor, move.year, move.amount - before);
  const others = asked.rules[regressor].moves.filter(({ year }) => year !== move.year);
  const moves = [...others, move].sort((a, b) => a.year - b.year);
  return filled(basis, withRegressor(moved, regressor, { ...asked.rules[regressor], moves }));
}

export function withoutMove(
  basis: RuleGround,
  asked: AskedPlan,
  regressor: number,
  year: number,
): AskedChange {
  const { rule, moves } = asked.rules[regressor];
  const amount = moves.find((move) => move.year === year)?.amount ?? 0;
  const left = moves.filter((move) => move.year !== year);
  const moved = shifted(asked, regressor, year, -amount);
  return filled(basis, withRegressor(moved, regressor, { rule, moves: left }));
}

/** What the rules give now, in the place of what they gave; ranges hold the amounts again. */
export function filled(
  basis: RuleGround,
  asked: AskedPlan,
  freed: readonly number[] = [],
): AskedChange {
  const { plan, rules } = asked;
  const isRuled = rules.map(({ rule }) => rule !== null);
  const { values, reasons } = applyRules(basis, {
    years: plan.map(({ year }) => year),
    rules: rules.map(({ rule }) => rule),
    typed: plan.map((planned) => planned.values),
    // What moves amounts that were typed is in them already.
    moves: rules.flatMap(({ moves }, regressor) =>
      isRuled[regressor] ? moves.map((move) => ({ ...move, regressor })) : [],
    ),
  });
  const refusal = reasons.find(({ regressor }) => isRuled[regressor]);
  if (refusal !== undefined)
    return {
      kind: 'refused',
      reason: refusal.year === null ? refusal.reason : `FY${refusal.year}: ${refusal.reason}`,
    };
  const ruled = plan.map((planned, index) => ({
    year: planned.year,
    values: planned.values.map((value, k) => (isRuled[k] ? (values[index][k] ?? value) : value)),
  }));
  const uncertainty = asked.uncertainty && holding(asked.uncertainty, ruled);
  return { kind: 'changed', asked: { ...asked, plan: ruled, uncertainty }, freed };
}

/** Ranges of as many years as the plan has, each widened where the planned amount has left it. */
function holding({ seed, ranges }: PlanUncertainty, plan: readonly PlannedYear[]): PlanUncertainty {
  return {
    seed,
    ranges: plan.map(({ values }, index) =>
      values.map((likely, k) => {
        const range = ranges.at(index)?.[k] ?? null;
        return range && { low: Math.min(range.low, likely), high: Math.max(range.high, likely) };
      }),
    ),
  };
}

/** Typed amounts from a year on lifted by a move; those under a rule are filled anew. */
function shifted(asked: AskedPlan, regressor: number, from: number, by: number): AskedPlan {
  if (asked.rules[regressor].rule !== null) return asked;
  const plan = asked.plan.map(({ year, values }) => ({
    year,
    values: values.map((value, k) => (k === regressor && year >= from ? value + by : value)),
  }));
  return { ...asked, plan };
}

function withRegressor(asked: AskedPlan, regressor: number, rule: RegressorPlan): AskedPlan {
  return { ...asked, rules: asked.rules.map((other, k) => (k === regressor ? rule : other)) };
}

/** With low and high of one amount, null where it is certain. */
export function withRange(
  asked: AskedPlan,
  year: number,
  regressor: number,
  range: { readonly low: number; readonly high: number } | null,
): AskedPlan {
  const { seed, ranges } = asked.uncertainty ?? noRanges(asked);
  const index = asked.plan.findIndex((planned) => planned.year === year);
  const changed = ranges.map((ofYear, row) =>
    ofYear.map((old, k) => (row === index && k === regressor ? range : old)),
  );
  return { ...asked, uncertainty: { seed, ranges: changed } };
}

export const usualSeed = 1;

function noRanges({ plan }: AskedPlan): PlanUncertainty {
  return { seed: usualSeed, ranges: plan.map(({ values }) => values.map(() => null)) };
}

/** Whether any amount of the plan is taken as uncertain. */
export function isUncertain({ uncertainty }: AskedPlan): boolean {
  return uncertainty?.ranges.some((ofYear) => ofYear.some((range) => range !== null)) ?? false;
}

/** What a regressor's rules start from: its last observed amount. */
export function lastAmount(basis: RuleGround, regressor: number): number {
  return heldRegressors(basis)[regressor];
}
