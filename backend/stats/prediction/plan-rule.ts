/** How a total is spread over n planned years; year i of 1 … n gets the share named. */
export type TotalSpread =
  /** 1/n. */
  | 'even'
  /** 2i/(n(n + 1)). */
  | 'rising'
  /** 2(n + 1 − i)/(n(n + 1)). */
  | 'falling';

/** What fills one regressor over the planned years; last is its last observed value, h the calendar years after it. */
export type PlanRule =
  /** last. */
  | { readonly kind: 'hold' }
  /** last·(1 + percent/100)^h. */
  | { readonly kind: 'grow'; readonly percent: number }
  /** Shares of a total over the planned years, whatever was last. Panel's measure. */
  | { readonly kind: 'total'; readonly total: number; readonly spread: TotalSpread }
  /** percent/100 of another regressor's planned value of the same year, moves included; `of` is its index. */
  | { readonly kind: 'share'; readonly percent: number; readonly of: number };

/** Lifts or lowers a regressor's level from one year on: an equity raise is positive, a buyback negative. */
export interface PlanMove {
  readonly year: number;
  /** Index in `basis.regressors`. */
  readonly regressor: number;
  /** Panel's measure. */
  readonly amount: number;
}

/** The part of a total that year i of 1 … n gets; see `TotalSpread`. Over all years they add up to 1. */
export function totalShare(spread: TotalSpread, i: number, n: number): number {
  if (spread === 'even') return 1 / n;
  return (2 * (spread === 'rising' ? i : n + 1 - i)) / (n * (n + 1));
}

/** Why a rule cannot be followed; undefined where it can. */
export function ruleReason(
  rule: PlanRule,
  index: number,
  { names, last, lastYear }: RuleGround,
): string | undefined {
  const name = names[index];
  if (rule.kind === 'hold') return undefined;
  if (rule.kind === 'total') {
    return Number.isFinite(rule.total) ? undefined : `No total is given for ${name}.`;
  }
  if (rule.kind === 'grow') {
    if (!Number.isFinite(rule.percent)) return `No rate of growth is given for ${name}.`;
    if (rule.percent < -100) return `${name} cannot shrink by more than 100 % a year.`;
    return last[index] < 0
      ? `${name} was below zero in FY${lastYear}: from there a rate of growth has no meaning.`
      : undefined;
  }
  if (!Number.isFinite(rule.percent)) return `No share is given for ${name}.`;
  return names[rule.of] === undefined ? `There is no regressor ${rule.of}.` : undefined;
}

/** What rules start from. */
export interface RuleGround {
  readonly names: readonly string[];
  /** The last observed values, in the panel's measure. */
  readonly last: readonly number[];
  readonly lastYear: number;
}
