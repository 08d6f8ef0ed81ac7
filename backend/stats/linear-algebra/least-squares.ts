import { DoubleDouble } from './double-double';
import {
  applyQ,
  applyTransposedQ,
  type HouseholderFactors,
  householderQr,
  orthonormalColumns,
} from './householder';
import { solveUpper, solveUpperTransposed } from './triangular';

/** The least squares solution of n equations in K unknowns, with the factors that everything else is built from. */
export interface LeastSquares {
  readonly coefficients: Float64Array;
  readonly residuals: Float64Array;
  /** Orthonormal basis of the columns' span, K columns of n rows: columns = basis · R. */
  readonly basis: readonly Float64Array[];
  /** R of the columns as given, K × K, row-major. */
  readonly r: Float64Array;
}

const refinementSteps = 3;

/**
 * Minimises |y − X·b| by Householder reflections of the columns scaled by powers of two, then refines coefficients
 * and residuals on the augmented system with residuals kept in twice the precision.
 *
 * @param columns  K linearly independent columns of n rows, n ≥ K; left unchanged. Their rank is the caller's to check.
 * @param outcome  length n; left unchanged.
 * @see Björck (1967), BIT 7, 257–278.
 */
export function leastSquares(
  columns: readonly Float64Array[],
  outcome: Float64Array,
): LeastSquares {
  const size = columns.length;
  const scales = columns.map(powerOfTwoNearNorm);
  const scaled = columns.map((column, k) => column.map((value) => value / scales[k]));
  const factors = householderQr(scaled);
  const solution = refine(factors, scaled, outcome);
  const r = factors.r.map((value, index) => value * scales[index % size]);
  return {
    coefficients: solution.coefficients.map((value, k) => value / scales[k]),
    residuals: solution.residuals,
    basis: orthonormalColumns(factors, outcome.length),
    r,
  };
}

function refine(
  factors: HouseholderFactors,
  columns: readonly Float64Array[],
  outcome: Float64Array,
): { coefficients: Float64Array; residuals: Float64Array } {
  const size = columns.length;
  const coefficients = new Float64Array(size);
  const residuals = new Float64Array(outcome.length);
  let rowGap = Float64Array.from(outcome);
  let columnGap = new Float64Array(size);
  for (let step = 0; step <= refinementSteps; step += 1) {
    // Solves dr + X·db = rowGap, X'·dr = columnGap.
    applyTransposedQ(factors, rowGap);
    const head = solveUpperTransposed(factors.r, columnGap);
    const step1 = solveUpper(
      factors.r,
      head.map((value, k) => rowGap[k] - value),
    );
    rowGap.set(head);
    applyQ(factors, rowGap);
    for (let k = 0; k < size; k += 1) coefficients[k] += step1[k];
    for (let row = 0; row < residuals.length; row += 1) residuals[row] += rowGap[row];
    rowGap = rowResidual(columns, outcome, coefficients, residuals);
    columnGap = columnResidual(columns, residuals);
  }
  return { coefficients, residuals };
}

/** y − r − X·b, in twice the precision before its last rounding. */
function rowResidual(
  columns: readonly Float64Array[],
  outcome: Float64Array,
  coefficients: Float64Array,
  residuals: Float64Array,
): Float64Array<ArrayBuffer> {
  const sum = new DoubleDouble();
  return Float64Array.from(outcome, (value, row) => {
    sum.reset(value);
    sum.add(-residuals[row]);
    for (let k = 0; k < columns.length; k += 1) sum.addProduct(-coefficients[k], columns[k][row]);
    return sum.value;
  });
}

/** −X'·r, in twice the precision before its last rounding. */
function columnResidual(
  columns: readonly Float64Array[],
  residuals: Float64Array,
): Float64Array<ArrayBuffer> {
  const sum = new DoubleDouble();
  return Float64Array.from(columns, (column) => {
    sum.reset(0);
    for (let row = 0; row < column.length; row += 1) sum.addProduct(-column[row], residuals[row]);
    return sum.value;
  });
}

/** Scaling by a power of two changes no digit. */
function powerOfTwoNearNorm(column: Float64Array): number {
  let largest = 0;
  for (const value of column) largest = Math.max(largest, Math.abs(value));
  return largest > 0 ? 2 ** Math.round(Math.log2(largest * Math.sqrt(column.length))) : 1;
}
