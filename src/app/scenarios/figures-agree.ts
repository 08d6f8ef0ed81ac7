import type { IntervalEstimate, ScenarioYear } from '@contract';
import type { ReadYear } from '../ui/plan/read-plan';

const relativeTolerance = 1e-9;

/** The planned years whose figures from the server differ from those on the screen by more than rounding. */
export function yearsThatDiffer(
  shown: readonly ReadYear[],
  confirmed: readonly ScenarioYear[],
): readonly number[] {
  const years = new Set([...shown, ...confirmed].map(({ year }) => year));
  return [...years].filter((year) => {
    const mine = shown.find((candidate) => candidate.year === year);
    const theirs = confirmed.find((candidate) => candidate.year === year);
    if (mine === undefined || theirs === undefined) return true;
    return (
      mine.familiar.kind !== theirs.familiar ||
      !isSameEstimate(mine.expected, theirs.expected) ||
      !isSameEstimate(mine.difference, theirs.difference)
    );
  });
}

type Bounds = Pick<IntervalEstimate, 'estimate' | 'low' | 'high'>;

function isSameEstimate(left: Bounds, right: Bounds): boolean {
  const scale = Math.max(
    ...[left.estimate, left.low, left.high].map((value) => Math.abs(value ?? 0)),
  );
  return (
    isClose(left.estimate, right.estimate, scale) &&
    isClose(left.low, right.low, scale) &&
    isClose(left.high, right.high, scale)
  );
}

function isClose(left: number | null, right: number | null, scale: number): boolean {
  if (left === null || right === null) return left === right;
  return Math.abs(left - right) <= relativeTolerance * scale;
}
