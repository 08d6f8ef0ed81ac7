import { blockedQr } from './blocked-qr';
import { columnNorms, conditionNumber } from './column-rank';
import { DoubleDouble } from './double-double';
import {
  applyQ,
  applyTransposedQ,
  type HouseholderFactors,
  householderQr,
  orthonormalColumns,
} from './householder';
import { addOverRows, productOverRows } from './row-range';
import { dot, transpose } from './square-matrix';
import { invertUpper, solveUpper, solveUpperTransposed } from './triangular';

/** The least squares solution of n equations in K unknowns, with the factors that everything else is built from. */
export interface LeastSquares {
  readonly coefficients: Float64Array;
  readonly residuals: Float64Array;
  /** Σ residuals². */
  readonly residualSquares: number;
  /** Orthonormal basis of the columns' span, K columns of n rows: columns = basis · R. */
  readonly basis: readonly Float64Array[];
  /** R of the columns as given, K × K, row-major. */
  readonly r: Float64Array;
}

/** Columns and an outcome, factored once: the columns' rank is read off R before the solution is asked for. */
export interface FactoredColumns {
  readonly columns: readonly Float64Array[];
  readonly outcome: Float64Array;
  /** R of the columns, K × K, row-major. */
  readonly r: Float64Array;
  /** The first K numbers of Q'y. */
  readonly head: Float64Array;
  /** Σ residuals², up to the rounding of y. */
  readonly restSquares: number;
}

const refinementSteps = 3;

/** Up to this condition number of the columns at unit length a solution without refinement keeps 12 digits. */
const easyConditionNumber = 1e3;

/** A residual below this share of the outcome's squares is mostly rounding unless it is refined. */
const easyResidualShare = 1e-12;

/** So many rows of every column are worked on at a time, while they are near. */
const blockRows = 512;

/**
 * @param columns  K columns of n rows, n ≥ K; left unchanged, and kept.
 * @param outcome  length n; left unchanged, and kept.
 */
export function factorColumns(
  columns: readonly Float64Array[],
  outcome: Float64Array,
): FactoredColumns {
  const plain = blockedQr(columns, outcome);
  if (areInRange(plain.r, columns.length)) return { columns, outcome, ...plain };
  const scales = columns.map(powerOfTwoNearNorm);
  const scaled = blockedQr(divided(columns, scales), outcome);
  return { columns, outcome, ...scaled, r: timesScales(scaled.r, scales) };
}

/**
 * Minimises |y − X·b| by Householder reflections, and where the columns are close to dependent or the residuals close
 * to nothing refines coefficients and residuals on the augmented system with residuals in twice the precision.
 *
 * @param factored  linearly independent columns: their rank is the caller's to check.
 * @see Golub & Van Loan (2013), Matrix Computations, 4th ed., §5.3; Björck (1967), BIT 7, 257–278.
 */
export function solveLeastSquares(factored: FactoredColumns): LeastSquares {
  return isEasy(factored) ? solveOnce(factored) : solveRefined(factored);
}

/** Factors and solves at once; arguments as for the two steps. */
export function leastSquares(
  columns: readonly Float64Array[],
  outcome: Float64Array,
): LeastSquares {
  return solveLeastSquares(factorColumns(columns, outcome));
}

function isEasy({ r, head, restSquares }: FactoredColumns): boolean {
  const totalSquares = restSquares + dot(head, head);
  return (
    restSquares > easyResidualShare * totalSquares && conditionNumber(r) <= easyConditionNumber
  );
}

/** Residuals y − X·b, and the basis X·R⁻¹: orthonormal to about the condition number times the rounding of a double. */
function solveOnce({ columns, outcome, r, head }: FactoredColumns): LeastSquares {
  const size = columns.length;
  const coefficients = solveUpper(r, head);
  const inverse = transpose(invertUpper(r, size), size);
  const residuals = outcome.slice();
  const basis = columns.map((column) => new Float64Array(column.length));
  const taken = coefficients.map((value) => -value);
  const spans = basis.map((_, k) => ({
    columns: columns.slice(0, k + 1),
    weights: inverse.subarray(k * size, k * size + k + 1),
  }));
  let residualSquares = 0;
  for (let from = 0; from < outcome.length; from += blockRows) {
    const rows = { from, to: Math.min(outcome.length, from + blockRows) };
    addOverRows(residuals, columns, taken, rows);
    residualSquares += productOverRows(residuals, residuals, rows);
    for (let k = 0; k < size; k += 1) {
      addOverRows(basis[k], spans[k].columns, spans[k].weights, rows);
    }
  }
  return { coefficients, residuals, residualSquares, basis, r };
}

function solveRefined({ columns, outcome }: FactoredColumns): LeastSquares {
  const scales = columns.map(powerOfTwoNearNorm);
  const scaled = divided(columns, scales);
  const factors = householderQr(scaled);
  const { coefficients, residuals } = refine(scaled, factors, outcome);
  return {
    coefficients: coefficients.map((value, k) => value / scales[k]),
    residuals,
    residualSquares: productOverRows(residuals, residuals, { from: 0, to: residuals.length }),
    basis: orthonormalColumns(factors, outcome.length),
    r: timesScales(factors.r, scales),
  };
}

function refine(
  columns: readonly Float64Array[],
  factors: HouseholderFactors,
  outcome: Float64Array,
): Pick<LeastSquares, 'coefficients' | 'residuals'> {
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

/** Whether squares of the columns, whose lengths are those of R's, are far from the ends of a double's range. */
function areInRange(r: Float64Array, size: number): boolean {
  return columnNorms(r, size).every((norm) => norm > 1e-100 && norm < 1e100);
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

function divided(columns: readonly Float64Array[], scales: readonly number[]): Float64Array[] {
  return columns.map((column, k) => column.map((value) => value / scales[k]));
}

/** R of the columns as given from that of the scaled ones. */
function timesScales(r: Float64Array, scales: readonly number[]): Float64Array {
  return r.map((value, index) => value * scales[index % scales.length]);
}
