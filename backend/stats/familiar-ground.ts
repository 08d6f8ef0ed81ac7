import type { PredictionBasis } from './fit-result';
import { leastSquares } from './linear-algebra/least-squares';
import { congruence, type SquareMatrix, toRows } from './linear-algebra/square-matrix';
import { invertUpper } from './linear-algebra/triangular';
import { observedRanges, ownLeverages, peerLeverage, peerSpread } from './observed-range';
import type { WithinFit } from './regression/within-fit';

/** What a plan's familiar range, and a contrast of slopes, are judged by. */
export type FamiliarGround = Pick<
  PredictionBasis,
  | 'inverseCrossProduct'
  | 'slopeInverse'
  | 'largestOwnLeverage'
  | 'largestLeverage'
  | 'ownRange'
  | 'peerRange'
  | 'peerSpread'
>;

/** Familiar is what companies have shown around their own means: year effects, where there are any, are left in. */
export function familiarGroundOf(
  fit: WithinFit,
  own: number,
  ownMeans: readonly number[],
): FamiliarGround {
  const { basis, inverseR } = companyDemeaned(fit);
  const size = fit.slopes.length;
  const inverseCrossProduct = toRows(outerProduct(inverseR, size), size);
  const largestOwnLeverage = Math.max(
    ...ownLeverages(fit.sample, inverseCrossProduct, { own, ownMeans }),
  );
  return {
    inverseCrossProduct,
    slopeInverse:
      fit.yearColumns === 0 ? undefined : toRows(outerProduct(slopeBlock(fit), size), size),
    largestOwnLeverage,
    largestLeverage: Math.max(largestOwnLeverage, peerLeverage(fit, basis, own)),
    ...observedRanges(fit.sample, own),
    peerSpread: peerSpread(fit.sample, own),
  };
}

/** Orthonormal basis and R⁻¹ of the regressors less company effects alone. */
function companyDemeaned(fit: WithinFit): Pick<WithinFit, 'basis' | 'inverseR'> {
  if (fit.yearColumns === 0) return fit;
  const columns = fit.regressors.map(({ values }) => values);
  const { basis, r } = leastSquares(columns, fit.outcome.values);
  return { basis, inverseR: invertUpper(r, columns.length) };
}

/** R⁻¹ of the regressors less company and year effects: as the last columns, theirs is the last block. */
function slopeBlock({ inverseR, yearColumns, slopes }: WithinFit): SquareMatrix {
  const size = slopes.length;
  const all = yearColumns + size;
  return Float64Array.from(
    { length: size * size },
    (_, index) =>
      inverseR[(yearColumns + Math.floor(index / size)) * all + yearColumns + (index % size)],
  );
}

/** M·M'. */
function outerProduct(matrix: SquareMatrix, size: number): SquareMatrix {
  const unit = Float64Array.from({ length: size * size }, (_, index) =>
    index % (size + 1) === 0 ? 1 : 0,
  );
  return congruence(matrix, unit, size);
}
