import type { PlanOutlookChoice, PlanUncertaintyRanges, RegressorRule } from './plan-types';
import type { PredictionBasis } from '../stats/prediction';
import type { PlannedYear } from './evaluate-plan';

/** All that a plan is read by, beside its name. */
export interface PlanReading {
  readonly plan: readonly PlannedYear[];
  readonly outlook: PlanOutlookChoice;
  /** One a regressor of the fit, in its order. */
  readonly rules: readonly RegressorRule[];
  readonly uncertainty: PlanUncertaintyRanges | null;
}

/** The same where it may be left out: none given, or stored before there was a choice. */
export interface AskedReading {
  readonly plan: readonly PlannedYear[];
  readonly outlook?: PlanOutlookChoice | null;
  readonly rules?: readonly RegressorRule[] | null;
  readonly uncertainty?: PlanUncertaintyRanges | null;
}

const usualBandConfidence = 0.8;

/** The outlook of a plan for which nothing was chosen. */
export function usualOutlook(basis: Pick<PredictionBasis, 'confidence'>): PlanOutlookChoice {
  return {
    start: 'model-level',
    yearEffect: 'last',
    confidence: basis.confidence,
    bandConfidence: usualBandConfidence,
  };
}

/** A plan's reading with what was left out filled: the usual outlook, every amount typed, none uncertain. */
export function wholeReading(
  basis: Pick<PredictionBasis, 'confidence' | 'regressors'>,
  asked: AskedReading,
): PlanReading {
  const { plan, outlook, rules, uncertainty } = asked;
  return {
    plan,
    outlook: outlook ?? usualOutlook(basis),
    rules:
      rules === undefined || rules === null || rules.length === 0
        ? basis.regressors.map(() => typedByHand)
        : rules,
    uncertainty: uncertainty ?? null,
  };
}

/** Amounts typed, pasted or moved by hand. */
export const typedByHand: RegressorRule = { rule: null, moves: [] };
