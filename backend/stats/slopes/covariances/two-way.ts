import type { SquareMatrix } from '../../linear-algebra/square-matrix';
import { symmetricPower } from '../../linear-algebra/symmetric-power';
import { companyScores } from '../company-scores';
import type { MatrixMethod, SlopeCovariance } from '../covariance-method';
import { groupScores, rowProducts, scoreProducts } from '../score-products';
import { slopeBlock, slopeSandwich } from '../slope-block';

/** An eigenvalue this share of the largest entry below 0 is rounding. */
const roundingShare = 1e-12;

/** The three terms of a covariance clustered two ways, K × K each. */
export interface TwoWayTerms {
  readonly company: SquareMatrix;
  readonly year: SquareMatrix;
  /** Of the rows, which are the companies' and years' intersections. */
  readonly row: SquareMatrix;
}

/** Clustered by company and by year at once. */
export const twoWay: MatrixMethod = {
  kind: 'matrix',
  code: 'two-way',
  name: 'By company and year',
  definition:
    'Clustered by company and by year: the covariance by company plus that by year less that by row, without factors, negative eigenvalues set to 0; t with min(G, T) − 1 degrees of freedom.',
  source:
    'Cameron, Gelbach & Miller (2011), Journal of Business & Economic Statistics 29, 238–249; Thompson (2011), Journal of Financial Economics 99, 1–10',
  reference: ['within_se.twoway_cluster_plm', 'petersen cluster_both'],
  degreesOfFreedom: ({ fit }) => Math.min(fit.sample.companies.length, fit.sample.years.length) - 1,
  noVarianceReason: () =>
    'No variance is left to judge it by: what companies and years add is no more than what the rows take off.',
  covariance: (ground) => {
    const { fit } = ground;
    const { position, years } = fit.sample;
    const size = fit.slopes.length;
    const design = { basis: slopeBlock(fit).basis, residuals: fit.residuals };
    const middle = twoWayMiddle({
      company: scoreProducts(companyScores(ground), size),
      year: scoreProducts(groupScores(design, position, years.length), size),
      row: rowProducts(design),
    });
    return withoutNegative(slopeSandwich(fit, middle), middle, size);
  },
};

/** company + year − row, each times its factor. */
export function twoWayMiddle(
  { company, year, row }: TwoWayTerms,
  factors = { company: 1, year: 1, row: 1 },
): SquareMatrix {
  return company.map(
    (value, index) =>
      factors.company * value + factors.year * year[index] - factors.row * row[index],
  );
}

/**
 * The covariance with its negative eigenvalues set to 0, as published: a step that depends on the units of the regressors.
 * Whether there are any does not, and is read from the middle matrix, whose rows are all of one size.
 */
function withoutNegative(
  matrix: SquareMatrix,
  middle: SquareMatrix,
  size: number,
): SlopeCovariance {
  const largest = middle.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
  const opposite = middle.map((value) => -value);
  const negative = size - symmetricPower(opposite, size, 1, roundingShare * largest).dropped;
  if (negative === 0) return { matrix, notes: [] };
  const part = symmetricPower(
    matrix.map((value) => -value),
    size,
    1,
    0,
  ).matrix;
  const detail = `Clustered by company and year the covariance of the slopes has ${negative === 1 ? 'a negative eigenvalue' : `${negative} negative eigenvalues`}, set to 0: the standard errors may be too small.`;
  return {
    matrix: matrix.map((value, index) => value + part[index]),
    notes: [{ code: 'negative-eigenvalues', detail }],
  };
}
