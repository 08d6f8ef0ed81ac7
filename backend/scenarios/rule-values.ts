import { applyRules, type PlanMove, type PredictionBasis } from '../stats/prediction';
import type { PlannedYear } from './evaluate-plan';
import type { RegressorRule } from './plan-types';

/** What the rules of a plan give; null where amounts were typed, for these are the plan's own. */
export type RuleValues =
  | { readonly kind: 'given'; readonly values: readonly (readonly (number | null)[])[] }
  | { readonly kind: 'refused'; readonly regressor: number; readonly reason: string };

/** Runs the rules of a plan over its years; moves of a typed regressor are in its amounts already. */
export function ruleValues(
  basis: Pick<PredictionBasis, 'regressors' | 'form' | 'held' | 'last'>,
  plan: readonly PlannedYear[],
  rules: readonly RegressorRule[],
): RuleValues {
  const isRuled = rules.map(({ rule }) => rule !== null);
  const moves = rules.flatMap((each, regressor): readonly PlanMove[] =>
    isRuled[regressor] ? each.moves.map((move) => ({ ...move, regressor })) : [],
  );
  const { values, reasons } = applyRules(basis, {
    years: plan.map(({ year }) => year),
    rules: rules.map(({ rule }) => rule),
    typed: plan.map((planned) => planned.values),
    moves,
  });
  const refusal = reasons.find(({ regressor }) => isRuled[regressor]);
  if (refusal !== undefined)
    return { kind: 'refused', regressor: refusal.regressor, reason: refusal.reason };
  return {
    kind: 'given',
    values: values.map((ofYear) =>
      ofYear.map((value, regressor) => (isRuled[regressor] ? value : null)),
    ),
  };
}

/** Amounts of a rule and those sent agree to this share of their size. */
const ruleTolerance = 1e-9;

export function isSameAmount(left: number, right: number): boolean {
  return Math.abs(left - right) <= ruleTolerance * Math.max(Math.abs(left), Math.abs(right));
}
