import type { ObservedRange, PredictionBasis } from './fit-result';
import { percentile, quadraticForm } from './prediction';
import type { PanelSample } from './panel/panel-sample';
import type { WithinFit } from './regression/within-fit';

/** Bounds of each regressor over the own company's rows and over all peers' rows, in the panel's measure. */
export function observedRanges(
  sample: PanelSample,
  own: number,
): Pick<PredictionBasis, 'ownRange' | 'peerRange'> {
  const from = sample.starts[own];
  const to = sample.starts[own + 1];
  const everything = sample.year.length;
  return {
    ownRange: sample.levels.regressors.map((column) => rangeOf(column, [[from, to]])),
    peerRange: sample.levels.regressors.map((column) =>
      rangeOf(column, [
        [0, from],
        [to, everything],
      ]),
    ),
  };
}

/** The shares of the peers' rows below the ends of their usual spread. */
const spreadShares = { low: 0.1, high: 0.9 };

/** 10th and 90th percentile of each regressor over all peers' rows, in the panel's measure. */
export function peerSpread(sample: PanelSample, own: number): ObservedRange[] {
  const from = sample.starts[own];
  const to = sample.starts[own + 1];
  return sample.levels.regressors.map((column) => {
    const sorted = column.filter((_, row) => row < from || row >= to).sort();
    return {
      low: percentile(sorted, spreadShares.low),
      high: percentile(sorted, spreadShares.high),
    };
  });
}

/** Bounds over stretches of rows, each from its first row to before its last. */
function rangeOf(
  values: Float64Array,
  stretches: readonly (readonly [number, number])[],
): ObservedRange {
  let low = Infinity;
  let high = -Infinity;
  for (const [from, to] of stretches) {
    for (let row = from; row < to; row += 1) {
      if (values[row] < low) low = values[row];
      if (values[row] > high) high = values[row];
    }
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
    if (leverage > largest) largest = leverage;
  }
  return largest;
}
