import {
  type FamiliarRange,
  type PredictionBasis,
  familiarRange,
  heldRegressors,
} from '@prediction';
import type { PlannedYear } from './planned-year';

export interface SliderRange {
  readonly min: number;
  readonly max: number;
  readonly step: number;
  /** What the own company and its peers have shown. */
  readonly familiar: { readonly low: number; readonly high: number };
}

const stepsWanted = 200;

/**
 * Where a regressor's slider ends: half the own company's observed span below it and twice that above, never below
 * zero where nothing was, above zero in log form, and as far as the plan itself reaches where an amount was typed beyond. The steps are counted
 * from the held amount, so that as many steps back as forth lead to it again.
 */
export function sliderRange(
  basis: PredictionBasis,
  regressor: number,
  plan: readonly PlannedYear[],
): SliderRange {
  const own = basis.ownRange[regressor];
  const peers = basis.peerRange[regressor];
  const held = heldRegressors(basis)[regressor];
  const span = Math.max(own.high - own.low, Math.abs(held) / 2) || 1;
  const planned = plan.map(({ values }) => values[regressor]);
  const floor = own.low >= 0 ? Math.max(0, own.low - span / 2) : own.low - span / 2;
  const low = Math.min(floor, ...planned);
  const high = Math.max(own.high + span, ...planned);
  const step = roundStep((high - low) / stepsWanted);
  const start = startOfSteps(held, low, step, planned);
  const min = basis.form === 'log' ? Math.min(start > 0 ? start : start + step, ...planned) : start;
  return {
    min,
    max: min + Math.ceil((high - min) / step) * step,
    step,
    familiar: { low: Math.min(own.low, peers.low), high: Math.max(own.high, peers.high) },
  };
}

/** The lowest amount a whole number of steps from the held one that reaches `low`, and zero at the lowest if `low` is not below. */
function startOfSteps(held: number, low: number, step: number, planned: readonly number[]): number {
  const start = held - Math.ceil((held - low) / step) * step;
  if (start >= 0 || low < 0) return start;
  return planned.some((value) => value < start + step) ? low : start + step;
}

/** The next of 1, 2, 5 · 10ⁿ. */
function roundStep(wanted: number): number {
  const power = 10 ** Math.floor(Math.log10(wanted));
  const factor = [1, 2, 5, 10].find((candidate) => candidate * power >= wanted) ?? 10;
  return factor * power;
}

/**
 * The nearest plan inside on the slider's own steps, each amount rounded towards the last actual one; the exact one
 * where the rounded amounts together are not inside.
 */
export function steppedInside(
  basis: PredictionBasis,
  familiar: FamiliarRange,
  plan: readonly PlannedYear[],
): readonly number[] {
  const rounded = familiar.nearestInside.map((value, k) => {
    const { step } = sliderRange(basis, k, plan);
    const held = heldRegressors(basis)[k];
    return held + Math.trunc((value - held) / step) * step;
  });
  return familiarRange(basis, rounded).kind === 'inside' ? rounded : familiar.nearestInside;
}
