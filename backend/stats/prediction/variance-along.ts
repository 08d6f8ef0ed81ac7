import { calibrationOf } from './basis-error';
import type { PredictionBasis } from './prediction-basis';
import { quadraticForm, weightedSum } from './quadratic-form';

/**
 * se² of a contrast as its slope weights move, for many moves: what does not move is summed up once.
 *
 * @param weights  w over the centred basis; see `PredictionBasis`.
 * @returns se² at slope weights w_k + δ_k, from δ, K numbers; null where the calibration has no denominator. As
 *   `basisError`, which has the reasons, up to rounding; K² + B·K multiplications a call.
 */
export function varianceAlong(
  basis: PredictionBasis,
  weights: readonly number[],
): (moves: Float64Array) => number | null {
  const slopes = basis.regressors.length;
  const numeratorAt = formAlong(basis.a, weights, slopes);
  const denominatorAt = formAlong(basis.d, weights, slopes);
  const cosines = basis.lambdas.length;
  const starts = Float64Array.from(basis.lambdas, (lambda) => weightedSum(lambda, weights));
  const ofSlopes = Float64Array.from(
    basis.lambdas.flatMap((lambda) => lambda.slice(1, slopes + 1)),
  );
  return (moves) => {
    const calibration = calibrationOf(numeratorAt(moves), basis.years * denominatorAt(moves));
    if (calibration === null) return null;
    let squares = 0;
    for (let j = 0; j < cosines; j += 1) {
      let lambda = starts[j];
      for (let k = 0; k < slopes; k += 1) lambda += moves[k] * ofSlopes[j * slopes + k];
      squares += lambda * lambda;
    }
    return (basis.years * squares * calibration) / cosines;
  };
}

/** (w + δ)'M(w + δ) as w'Mw + 2·(Mw)'δ + δ'Mδ, δ in the slopes alone. */
function formAlong(
  matrix: readonly (readonly number[])[],
  weights: readonly number[],
  slopes: number,
): (moves: Float64Array) => number {
  const start = quadraticForm(matrix, weights);
  const ofSlopes = matrix.slice(1, slopes + 1);
  const linear = Float64Array.from(ofSlopes, (row) => 2 * weightedSum(row, weights));
  const square = Float64Array.from(ofSlopes.flatMap((row) => row.slice(1, slopes + 1)));
  return (moves) => {
    let sum = start;
    for (let k = 0; k < slopes; k += 1) {
      let row = linear[k];
      for (let l = 0; l < slopes; l += 1) row += square[k * slopes + l] * moves[l];
      sum += moves[k] * row;
    }
    return sum;
  };
}
