import { conditionNumber } from './column-rank';
import { DoubleDouble } from './double-double';
import {
  applyQ,
  applyTransposedQ,
  type HouseholderFactors,
  householderQr,
  orthonormalColumns,
} from './householder';
import { invertUpper, solveUpper, solveUpperTransposed } from './triangular';

/** The least squares solution of n equations in K unknowns, with the factors that everything else is built from. */
export interface LeastSquares {
  readonly coefficients: Float64Array;
  readonly residuals: Float64Array;
  /** Orthonormal basis of the columns' span, K columns of n rows: columns = basis · R. */
  readonly basis: readonly Float64Array[];
  /** R of the columns as given, K × K, row-major. */
  readonly r: Float64Array;
}

/** Columns factored once: their rank is read off R, any number of outcomes is solved for. */
export interface FactoredColumns {
  readonly columns: readonly Float64Array[];
  /** Powers of two that the columns are divided by: that changes no digit. */
  readonly scales: readonly number[];
  /** Of the scaled columns. */
  readonly factors: HouseholderFactors;
  /** R of the columns as given, K × K, row-major. */
  readonly r: Float64Array;
}

const refinementSteps = 3;

/** Up to this condition number of the columns at unit length a solution without refinement keeps 12 digits. */
const easyConditionNumber = 1e3;

/** A residual below this share of the outcome's squares is mostly rounding unless it is refined. */
const easyResidualShare = 1e-12;

/** @param columns  K columns of n rows, n ≥ K; left unchanged, and kept. */
export function factorColumns(columns: readonly Float64Array[]): FactoredColumns {
  const scales = columns.map(powerOfTwoNearNorm);
  const factors = householderQr(columns, scales);
  const size = columns.length;
  return {
    columns,
    scales,
    factors,
    r: factors.r.map((value, index) => value * scales[index % size]),
  };
}

/**
 * Minimises |y − X·b| by Householder reflections, and where the columns are close to dependent or the residuals close
 * to nothing refines coefficients and residuals on the augmented system with residuals in twice the precision.
 *
 * @param factored  linearly independent columns: their rank is the caller's to check.
 * @param outcome  length n; left unchanged.
 * @see Golub & Van Loan (2013), Matrix Computations, 4th ed., §5.3; Björck (1967), BIT 7, 257–278.
 */
export function solveLeastSquares(factored: FactoredColumns, outcome: Float64Array): LeastSquares {
  const { columns, factors, r } = factored;
  const easy = isEasy(factored) ? solveOnce(factored, outcome) : null;
  const solution = easy ?? refine(factored, outcome);
  return {
    ...solution,
    basis: easy === null ? orthonormalColumns(factors, outcome.length) : easyBasis(columns, r),
    r,
  };
}

/** Factors and solves at once; arguments as for the two steps. */
export function leastSquares(
  columns: readonly Float64Array[],
  outcome: Float64Array,
): LeastSquares {
  return solveLeastSquares(factorColumns(columns), outcome);
}

interface Solution {
  readonly coefficients: Float64Array;
  readonly residuals: Float64Array;
}

function isEasy({ factors }: FactoredColumns): boolean {
  return conditionNumber(factors.r) <= easyConditionNumber;
}

/** Null where the residuals are too small to be had without refinement. */
function solveOnce(
  { columns, scales, factors }: FactoredColumns,
  outcome: Float64Array,
): Solution | null {
  const turned = Float64Array.from(outcome);
  applyTransposedQ(factors, turned);
  const solution = solveUpper(factors.r, turned.subarray(0, columns.length));
  const coefficients = solution.map((value, k) => value / scales[k]);
  const residuals = turned;
  residuals.set(outcome);
  columns.forEach((column, k) => {
    const coefficient = coefficients[k];
    for (let row = 0; row < column.length; row += 1) residuals[row] -= coefficient * column[row];
  });
  let rest = 0;
  let total = 0;
  for (let row = 0; row < outcome.length; row += 1) {
    rest += residuals[row] * residuals[row];
    total += outcome[row] * outcome[row];
  }
  return rest > easyResidualShare * total ? { coefficients, residuals } : null;
}

/** X·R⁻¹: orthonormal to about the condition number times the rounding of a double. */
function easyBasis(columns: readonly Float64Array[], r: Float64Array): Float64Array[] {
  const size = columns.length;
  const inverse = invertUpper(r, size);
  return columns.map((own, k) => {
    const factor = inverse[k * size + k];
    const result = new Float64Array(own.length);
    for (let row = 0; row < own.length; row += 1) result[row] = factor * own[row];
    for (let l = 0; l < k; l += 1) {
      const share = inverse[l * size + k];
      const column = columns[l];
      for (let row = 0; row < column.length; row += 1) result[row] += share * column[row];
    }
    return result;
  });
}

function refine(
  { columns: raw, scales, factors }: FactoredColumns,
  outcome: Float64Array,
): Solution {
  const columns = raw.map((column, k) => column.map((value) => value / scales[k]));
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
  return { coefficients: coefficients.map((value, k) => value / scales[k]), residuals };
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
  for (let row = 0; row < column.length; row += 1) {
    const size = Math.abs(column[row]);
    if (size > largest) largest = size;
  }
  return largest > 0 ? 2 ** Math.round(Math.log2(largest * Math.sqrt(column.length))) : 1;
}
