import type { FitResult, WithoutYear } from '@contract';
import type { IntervalFigure, LeftOut } from '@figures';
import { asDifference } from '../../ui/model-form';
import type { FigureChoice } from './figure-choice';

type Left = Pick<WithoutYear, 'slopes' | 'standing' | 'reason'>;

function estimateOf(
  { slopes, standing }: Left,
  choice: FigureChoice,
  { specification }: Pick<FitResult, 'specification'>,
): number | null {
  if (choice !== 'standing') return slopes?.at(choice) ?? null;
  if (standing === null) return null;
  return asDifference({ estimate: standing, low: null, high: null }, specification.form).estimate;
}

function leftOut(name: string, left: Left, estimate: number | null): LeftOut {
  return estimate === null
    ? { name, estimate, reason: left.reason ?? 'none without it' }
    : { name, estimate };
}

/** The figure without each company, the one that moves it most first; a standing without the own company is none. */
export function withoutEachCompany(
  result: FitResult,
  choice: FigureChoice,
  full: IntervalFigure,
): readonly LeftOut[] {
  const own = result.standing?.company;
  return result.withoutCompany
    .filter(({ company }) => choice !== 'standing' || company !== own)
    .map((one) => leftOut(one.company, one, estimateOf(one, choice, result)))
    .sort((a, b) => shiftOf(b, full) - shiftOf(a, full));
}

/** The figure without each year, in the order of years. */
export function withoutEachYear(
  result: FitResult,
  years: readonly WithoutYear[],
  choice: FigureChoice,
): readonly LeftOut[] {
  return years.map((one) => leftOut(String(one.year), one, estimateOf(one, choice, result)));
}

/** How far the figure moves; −1 where it is none. */
export function shiftOf({ estimate }: LeftOut, full: IntervalFigure): number {
  return estimate === null ? -1 : Math.abs(estimate - full.estimate);
}

/** The one without which the figure moves most; null where none can be left out. */
export function mostMoving(
  left: readonly LeftOut[],
  full: IntervalFigure,
): (LeftOut & { readonly estimate: number }) | null {
  let most: (LeftOut & { readonly estimate: number }) | null = null;
  for (const each of left) {
    const { estimate } = each;
    if (estimate === null) continue;
    if (most === null || shiftOf(each, full) > shiftOf(most, full)) most = { ...each, estimate };
  }
  return most;
}

/** Those without which the figure lies on the other side of zero. */
export function turning(left: readonly LeftOut[], full: IntervalFigure): readonly LeftOut[] {
  return left.filter(
    ({ estimate }) => estimate !== null && Math.sign(estimate) * Math.sign(full.estimate) < 0,
  );
}

/** Those without which the figure leaves the interval that it has with all; of an open one, its end. */
export function leaving(left: readonly LeftOut[], full: IntervalFigure): readonly LeftOut[] {
  const { low, high } = full;
  return left.filter(
    ({ estimate }) =>
      estimate !== null && ((low !== null && estimate < low) || (high !== null && estimate > high)),
  );
}

/** The least and the greatest of what comes out; null where nothing does. */
export function rangeOf(left: readonly LeftOut[]): readonly [number, number] | null {
  let range: readonly [number, number] | null = null;
  for (const { estimate } of left) {
    if (estimate === null) continue;
    range =
      range === null
        ? [estimate, estimate]
        : [Math.min(range[0], estimate), Math.max(range[1], estimate)];
  }
  return range;
}
