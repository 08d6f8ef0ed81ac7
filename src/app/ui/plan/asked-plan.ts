import type { PlanOutlook, PlanUncertainty, RegressorPlan } from '@contract';
import type { PredictionBasis } from '@prediction';
import { heldPlan, isSamePlan } from './change-plan';
import type { PlannedYear } from './planned-year';

/** All that a plan is read by: its amounts, how they came about, how far they may miss, and how it is looked at. */
export interface AskedPlan {
  readonly plan: readonly PlannedYear[];
  readonly outlook: PlanOutlook;
  /** One a regressor of the fit, in its order. */
  readonly rules: readonly RegressorPlan[];
  /** Null where every amount is taken as certain. */
  readonly uncertainty: PlanUncertainty | null;
}

const usualBandConfidence = 0.8;

/** The outlook of a plan for which nothing was chosen. */
export function usualOutlook({ confidence }: Pick<PredictionBasis, 'confidence'>): PlanOutlook {
  return {
    start: 'model-level',
    yearEffect: 'last',
    confidence,
    bandConfidence: usualBandConfidence,
  };
}

/** How amounts come about that were typed, pasted or moved by hand. */
export const typedByHand: RegressorPlan = { rule: null, moves: [] };

/** What a new plan begins with: the last actual values held, every amount typed and certain. */
export function heldAsked(basis: PredictionBasis, years: number): AskedPlan {
  return {
    plan: heldPlan(basis, years),
    outlook: usualOutlook(basis),
    rules: basis.regressors.map(() => typedByHand),
    uncertainty: null,
  };
}

export function isSameAsked(left: AskedPlan, right: AskedPlan): boolean {
  return (
    isSamePlan(left.plan, right.plan) &&
    isSameOutlook(left.outlook, right.outlook) &&
    left.rules.length === right.rules.length &&
    left.rules.every((rule, k) => isSameRule(rule, right.rules[k])) &&
    isSameUncertainty(left.uncertainty, right.uncertainty)
  );
}

export function isSameOutlook(left: PlanOutlook, right: PlanOutlook): boolean {
  return (
    left.start === right.start &&
    left.confidence === right.confidence &&
    left.bandConfidence === right.bandConfidence &&
    isSameYearEffect(left.yearEffect, right.yearEffect)
  );
}

function isSameYearEffect(
  left: PlanOutlook['yearEffect'],
  right: PlanOutlook['yearEffect'],
): boolean {
  return typeof left === 'object' && typeof right === 'object'
    ? left.given === right.given
    : left === right;
}

export function isSameRule(left: RegressorPlan, right: RegressorPlan): boolean {
  return (
    ruleKey(left.rule) === ruleKey(right.rule) &&
    left.moves.length === right.moves.length &&
    left.moves.every(
      ({ year, amount }, index) =>
        year === right.moves[index].year && amount === right.moves[index].amount,
    )
  );
}

function ruleKey(rule: RegressorPlan['rule']): string {
  switch (rule?.kind) {
    case undefined:
      return '';
    case 'hold':
      return 'hold';
    case 'grow':
      return `grow ${rule.percent}`;
    case 'total':
      return `total ${rule.total} ${rule.spread}`;
    case 'share':
      return `share ${rule.percent} ${rule.of}`;
  }
}

function isSameUncertainty(left: PlanUncertainty | null, right: PlanUncertainty | null): boolean {
  if (left === null || right === null) return left === right;
  return (
    left.seed === right.seed &&
    left.ranges.length === right.ranges.length &&
    left.ranges.every((ofYear, index) =>
      ofYear.every((range, k) => isSameRange(range, right.ranges[index][k])),
    )
  );
}

type AmountRange = PlanUncertainty['ranges'][number][number];

export function isSameRange(left: AmountRange, right: AmountRange): boolean {
  return left?.low === right?.low && left?.high === right?.high;
}
