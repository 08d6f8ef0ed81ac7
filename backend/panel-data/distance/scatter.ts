import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import { medianAndSpread } from '../robust';

/** How companies scatter over the measures: a covariance matrix. */
export type Scatter = 'classical' | 'robust';

/** The sample covariance matrix, divisor n − 1. @param points  one row a company. */
export function classicalScatter(points: readonly (readonly number[])[]): Matrix {
  const data = new Matrix(points.map((point) => [...point]));
  const centred = data.subRowVector(data.mean('column'));
  return centred
    .transpose()
    .mmul(centred)
    .div(points.length - 1);
}

const orthogonalisations = 2;

/**
 * Orthogonalised Gnanadesikan–Kettenring scatter (Maronna & Zamar 2002), unweighted, with median and 1.4826 · MAD in
 * every direction and two orthogonalisations: half the companies may lie anywhere without moving it far.
 *
 * @param points  one row a company.
 * @returns where a measure, or a combination of them, is the same for half of the companies: a matrix with 0 in the
 *   diagonal for that measure, and only 0 for a combination.
 */
export function robustScatter(points: readonly (readonly number[])[]): Matrix {
  const size = points[0].length;
  let data = new Matrix(points.map((point) => [...point]));
  let back = Matrix.eye(size);
  for (let round = 0; round < orthogonalisations; round++) {
    const scales = spreadsOf(data);
    if (scales.some((scale) => !(scale > 0)))
      return round === 0
        ? Matrix.diag(scales.map((scale) => scale ** 2))
        : Matrix.zeros(size, size);
    const scaled = data.clone().divRowVector(scales);
    const { eigenvectorMatrix } = new EigenvalueDecomposition(pairwise(scaled), {
      assumeSymmetric: true,
    });
    back = back.mmul(Matrix.diag(scales)).mmul(eigenvectorMatrix);
    data = scaled.mmul(eigenvectorMatrix);
  }
  const variances = Matrix.diag(spreadsOf(data).map((scale) => scale ** 2));
  return back.mmul(variances).mmul(back.transpose());
}

function spreadsOf(data: Matrix): number[] {
  return Array.from(
    { length: data.columns },
    (_, column) => medianAndSpread(data.getColumn(column)).spread,
  );
}

/** Gnanadesikan–Kettenring: (σ(u + v)² − σ(u − v)²) / 4 for each pair of scaled measures. */
function pairwise(scaled: Matrix): Matrix {
  const columns = Array.from({ length: scaled.columns }, (_, column) => scaled.getColumn(column));
  return new Matrix(
    columns.map((one, row) =>
      columns.map((other, column) => {
        if (row === column) return 1;
        const spread = (sign: 1 | -1): number =>
          medianAndSpread(one.map((value, place) => value + sign * other[place])).spread;
        return (spread(1) ** 2 - spread(-1) ** 2) / 4;
      }),
    ),
  );
}
