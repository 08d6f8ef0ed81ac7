import type { SlopeCovarianceName, SlopeEstimate } from '../fit-result';
import type { SquareMatrix } from '../linear-algebra/square-matrix';
import type { SlopeDegreesOfFreedom } from '../prediction';
import type { SlopeGround } from './slope-ground';

/** What a slope's standard error, interval and p value are made by: an entry of the table of covariances. */
export type CovarianceMethod = MatrixMethod | BootstrapMethod;

export interface MethodWords {
  readonly code: SlopeCovarianceName;
  readonly name: string;
  /** What it is, in a sentence. */
  readonly definition: string;
  /** The paper it comes from. */
  readonly source: string;
  /** Blocks of `backend/stats/golden/*.json` that hold its outside results. */
  readonly reference: readonly string[];
}

/** A method that gives the slopes a covariance matrix, and t its degrees of freedom. */
export interface MatrixMethod extends MethodWords {
  readonly kind: 'matrix';
  covariance(ground: SlopeGround): SlopeCovariance;
  /** Of t: one figure for all, or Satterthwaite's of each contrast. */
  readonly degreesOfFreedom: 'satterthwaite' | ((ground: SlopeGround) => number);
  /** Why a slope has no interval where the matrix gives it no variance. */
  noVarianceReason(ground: SlopeGround): string;
}

/** A method that gives intervals without a matrix, by draws. */
export interface BootstrapMethod extends MethodWords {
  readonly kind: 'bootstrap';
  /** Why there is no covariance matrix. */
  readonly covarianceReason: string;
  bootstrap(ground: SlopeGround, options: InferenceOptions): BootstrapSlopes;
}

export interface BootstrapSlopes {
  readonly slopes: readonly SlopeEstimate[];
  readonly notes: readonly SlopeNote[];
}

export interface SlopeCovariance {
  /** K × K, row-major. */
  readonly matrix: SquareMatrix;
  readonly notes: readonly SlopeNote[];
}

export interface SlopeNote {
  readonly code: 'wild-set-disconnected' | 'negative-eigenvalues';
  readonly detail: string;
  /** Regressors concerned. */
  readonly subjects?: readonly string[];
}

export interface SlopeInference {
  readonly slopes: readonly SlopeEstimate[];
  /** K × K; null with a reason where the method has none. */
  readonly covariance: SquareMatrix | null;
  readonly covarianceReason?: string;
  /** Degrees of freedom of every contrast of slopes, for prediction; null without a covariance. */
  readonly degrees: SlopeDegreesOfFreedom | null;
  /** Why a contrast of slopes has no interval where it has no variance; undefined without a covariance. */
  readonly noVarianceReason?: string;
  /** What has to be said beside the figures. */
  readonly notes: readonly SlopeNote[];
}

export interface InferenceOptions {
  readonly confidence: number;
  /** Of the bootstrap's draws; null for the others. */
  readonly seed: number | null;
  /** Told the share done, 0 to 1, about a hundred times at most; only draws take long. */
  readonly onProgress?: (share: number) => void;
}

const oneCompanyReason = 'No variance is left to judge it by: one company alone determines it.';

const twoCompaniesReason =
  'No variance is left to judge it by: with two companies and year effects the residuals of one mirror those of the other, so what companies add to the variance is zero by construction.';

/**
 * Why clustering by company gives a slope no variance. With two companies and year effects regressors and residuals of
 * one are those of the other turned round, so both companies' scores are equal, and they sum to zero.
 */
export function noCompanyVarianceReason({ fit }: SlopeGround): string {
  return fit.sample.companies.length === 2 && fit.yearColumns > 0
    ? twoCompaniesReason
    : oneCompanyReason;
}

/** Why clustering by row, or none, gives a slope no variance. */
export function exactRowsReason(): string {
  return 'No variance is left to judge it by: the rows that determine it are fitted exactly.';
}
