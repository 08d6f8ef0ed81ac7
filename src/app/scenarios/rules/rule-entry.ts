import type { PlanRule } from '@contract';

/** A rule as it stands in the form, texts and all. */
export interface RuleEntry {
  readonly kind: 'none' | PlanRule['kind'];
  readonly percent: number | undefined;
  /** Panel's unit. */
  readonly total: number | undefined;
  readonly spread: 'even' | 'rising' | 'falling';
  /** The regressor that it is a share of. */
  readonly of: number;
}

export type ReadRule =
  | { readonly kind: 'rule'; readonly rule: PlanRule | null }
  | { readonly kind: 'refused'; readonly reason: string };

/** The rule that a form says, or what it lacks. */
export function readRule({ kind, percent, total, spread, of }: RuleEntry): ReadRule {
  switch (kind) {
    case 'none':
      return { kind: 'rule', rule: null };
    case 'hold':
      return { kind: 'rule', rule: { kind } };
    case 'grow':
      return percent === undefined
        ? { kind: 'refused', reason: 'Expected a rate, as 5 for 5 % a year.' }
        : { kind: 'rule', rule: { kind, percent } };
    case 'total':
      return total === undefined
        ? { kind: 'refused', reason: 'Expected a total over the planned years.' }
        : { kind: 'rule', rule: { kind, total, spread } };
    case 'share':
      return percent === undefined
        ? { kind: 'refused', reason: 'Expected a share, as 12 for 12 %.' }
        : { kind: 'rule', rule: { kind, percent, of } };
  }
}
