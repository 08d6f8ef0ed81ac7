import type { ObservedRange, PredictionBasis } from './fit-result';
import { quadraticForm } from './prediction';
import type { PanelSample } from './panel/panel-sample';
import type { WithinFit } from './regression/within-fit';

/** Bounds of each regressor over the own company's rows and over all peers' rows, in the panel's measure. */
export function observedRanges(
  sample: PanelSample,
  own: number,
): Pick<PredictionBasis, 'ownRange' | 'peerRange'> {
  const from = sample.starts[own];
  const to = sample.starts[own + 1];
  return {
    ownRange: sample.levels.regressors.map((column) => rangeOf(column.subarray(from, to))),
    peerRange: sample.levels.regressors.map((column) =>
      rangeOf(column.filter((_, row) => row < from || row >= to)),
    ),
  };
}

function rangeOf(values: Float64Array): ObservedRange {
  let low = Infinity;
  let high = -Infinity;
  for (const value of values) {
    low = Math.min(low, value);
    high = Math.max(high, value);
  }
  return { low, high };
}

/** x̃'Q⁻¹x̃ of the own company's rows, by the very sums that a plan's leverage is computed with. */
export function ownLeverages(
  sample: PanelSample,
  inverseCrossProduct: readonly (readonly number[])[],
  { own, ownMeans }: { readonly own: number; readonly ownMeans: readonly number[] },
): number[] {
  const from = sample.starts[own];
  return Array.from({ length: sample.starts[own + 1] - from }, (_, index) =>
    quadraticForm(
      inverseCrossProduct,
      sample.regressors.map((column, k) => column[from + index] - ownMeans[k]),
    ),
  );
}

/**
 * The largest x̃'Q⁻¹x̃ of any peer's row.
 *
 * @param basis  orthonormal basis of the company-demeaned regressors, K columns.
 */
export function peerLeverage(fit: WithinFit, basis: readonly Float64Array[], own: number): number {
  const from = fit.sample.starts[own];
  const to = fit.sample.starts[own + 1];
  let largest = 0;
  for (let row = 0; row < fit.sample.year.length; row += 1) {
    if (row >= from && row < to) continue;
    let leverage = 0;
    for (const column of basis) leverage += column[row] * column[row];
    largest = Math.max(largest, leverage);
  }
  return largest;
}
