import { drawWidth } from './draw-statistics';
import { polynomialAt, signChanges } from './sign-changes';
import type { SignDraws } from './sign-draws';

/** A draw's |t| counts as the data's own from this much below it: a draw that equals the data must not miss by rounding. */
const tieAllowance = 1e-9;

/** How far the set of accepted values is looked for, in standard errors. */
export const farthest = 1e6;

/** p counts as α from this share of it: both are ratios that rounding may put on either side. */
const levelShare = 1 - 1e-9;

/** Two stretches nearer than this, in standard errors, are one: draws that change together change within rounding. */
const narrowest = 1e-9;

/** A stretch of accepted values, by the data's t statistic of them. */
export interface Stretch {
  readonly from: number;
  readonly to: number;
}

/** The p value of the hypothesis with the data's own t statistic τ: the share of draws with |t*| ≥ |τ|(1 − 1e-9). */
export function bootstrapPValue(
  statistics: Float64Array,
  draws: Pick<SignDraws, 'pValue'>,
  tau: number,
): number {
  let count = 0;
  for (let at = 0; at < statistics.length; at += drawWidth) {
    const numerator = statistics[at] + tau * statistics[at + 1];
    const square = statistics[at + 2] + tau * (statistics[at + 3] + tau * statistics[at + 4]);
    if (numerator * numerator >= ((1 - tieAllowance) * tau) ** 2 * square) count += 1;
  }
  return draws.pValue(count);
}

/** Whether p ≥ α, rounding of either left aside. */
export function isAccepted(pValue: number, level: number): boolean {
  return pValue >= levelShare * level;
}

/**
 * Every τ within ±1e6 whose p value is at least α, as stretches in ascending order. Each draw is as far out as the data
 * where a polynomial of the fourth degree in τ is not negative, so it is bracketed and bisected by draw, and no hole and
 * no island is missed. The estimate itself is always among them, alone where nothing around it is accepted.
 *
 * @param tie  how far a draw's |t| may lie below the data's own and still count as it.
 */
export function acceptedStretches(
  statistics: Float64Array,
  draws: Pick<SignDraws, 'pValue'>,
  { level, tie = tieAllowance }: { readonly level: number; readonly tie?: number },
): Stretch[] {
  const { count, changes } = changesOf(statistics, tie);
  const stretches: Stretch[] = [];
  let outlying = count;
  let from = isAccepted(draws.pValue(outlying), level) ? -farthest : null;
  for (const { tau, step } of changes) {
    outlying += step;
    const accepted = isAccepted(draws.pValue(outlying), level);
    if (accepted && from === null) from = tau;
    if (!accepted && from !== null) {
      addStretch(stretches, { from, to: tau });
      from = null;
    }
  }
  if (from !== null) addStretch(stretches, { from, to: farthest });
  return withEstimate(stretches);
}

/** The stretches with the estimate itself, τ = 0, where every draw is as far out as the data: p = 1 at any level. */
function withEstimate(stretches: readonly Stretch[]): Stretch[] {
  const isNear = ({ from, to }: Stretch): boolean => from < narrowest && to > -narrowest;
  if (stretches.some(isNear)) {
    return stretches.map((one) =>
      isNear(one) ? { from: Math.min(0, one.from), to: Math.max(0, one.to) } : one,
    );
  }
  return [...stretches, { from: 0, to: 0 }].sort((left, right) => left.from - right.from);
}

function addStretch(stretches: Stretch[], next: Stretch): void {
  const last = stretches.at(-1);
  if (last !== undefined && next.from - last.to < narrowest) {
    stretches[stretches.length - 1] = { from: last.from, to: next.to };
  } else if (next.to - next.from >= narrowest) {
    stretches.push(next);
  }
}

interface Change {
  readonly tau: number;
  /** Draws that are as far out from here on, less those that no longer are. */
  readonly step: 1 | -1;
}

/** How many draws are as far out at the low end, and where that changes, ascending. */
function changesOf(statistics: Float64Array, tie: number): { count: number; changes: Change[] } {
  const changes: Change[] = [];
  let count = 0;
  for (let at = 0; at < statistics.length; at += drawWidth) {
    const excess = excessOf(statistics.subarray(at, at + drawWidth), tie);
    const places = signChanges(excess, -farthest, farthest);
    let isOut = polynomialAt(excess, -farthest) >= 0;
    if (isOut) count += 1;
    for (const tau of places) {
      isOut = !isOut;
      changes.push({ tau, step: isOut ? 1 : -1 });
    }
  }
  changes.sort((left, right) => left.tau - right.tau);
  return { count, changes };
}

/** (n₀ + n₁τ)² − (1 − tie)²τ²(c₀ + c₁τ + c₂τ²), as coefficients of 1, τ, … τ⁴. */
function excessOf([n0, n1, c0, c1, c2]: Float64Array, tie: number): number[] {
  const share = (1 - tie) * (1 - tie);
  return [n0 * n0, 2 * n0 * n1, n1 * n1 - share * c0, -share * c1, -share * c2];
}
