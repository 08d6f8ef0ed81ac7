import type { FitResult, FitWarning, IntervalEstimate, WarningCode } from '../fit-result';
import type { Evidence, Objection } from './evidence';

/** All that a verdict is passed on: the fit's result and the evidence beside it. */
export interface VerdictInput extends Pick<
  Evidence,
  'withoutYear' | 'estimators' | 'covariances' | 'alternatives' | 'tests'
> {
  readonly result: FitResult;
}

/** One thing that can speak against a fit. */
export interface VerdictRule {
  readonly code: string;
  readonly weight: Objection['weight'];
  /** true where it alone leaves nothing that could be stated. */
  readonly leavesNothing?: true;
  /** What is found, in a sentence; null where the rule does not apply. */
  when(input: VerdictInput): string | null;
}

/** An interval that is wholly on one side of zero. */
export function excludesZero({ low, high }: Pick<IntervalEstimate, 'low' | 'high'>): boolean {
  return (low !== null && low > 0) || (high !== null && high < 0);
}

/** Two values on different sides of zero. */
export function areOpposite(left: number, right: number): boolean {
  return Math.sign(left) * Math.sign(right) < 0;
}

/** Intervals that share no value; false where one of them has no bounds. */
export function areDisjoint(left: IntervalEstimate, right: IntervalEstimate): boolean {
  const isAbove = (upper: IntervalEstimate, lower: IntervalEstimate): boolean =>
    upper.low !== null && lower.high !== null && upper.low > lower.high;
  return isAbove(left, right) || isAbove(right, left);
}

export function isInside(value: number, { low, high }: IntervalEstimate): boolean {
  return low !== null && high !== null && value >= low && value <= high;
}

export function warningsOfCode({ result }: VerdictInput, code: WarningCode): FitWarning[] {
  return result.warnings.filter((warning) => warning.code === code);
}

/** A rule that repeats a warning of the fit. */
export function warningRule(code: WarningCode, weight: Objection['weight']): VerdictRule {
  return {
    code,
    weight,
    when: (input) => {
      const details = warningsOfCode(input, code).map(({ detail }) => detail);
      return details.length === 0 ? null : details.join(' ');
    },
  };
}
