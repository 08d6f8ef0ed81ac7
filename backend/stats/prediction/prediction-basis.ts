/** The bounds of one regressor over rows of the sample. */
export interface ObservedRange {
  readonly low: number;
  readonly high: number;
}

/** A year of the own company: actual market value and what the model expects. */
export interface OwnYear {
  readonly year: number;
  readonly fileRow: number;
  readonly actual: number;
  readonly fitted: number;
  readonly residual: number;
  readonly regressors: readonly number[];
}

/**
 * All that prediction needs, on the server and in the browser.
 *
 * An expected value at regressors x is the contrast w = [1, x₁ − x̄₁ … x_K − x̄_K] over [the own company's level at its
 * own means, slope 1 … slope K], x̄ the own company's means. Centring there keeps the digits of large figures. In that
 * basis se² = T · mean_j(w'λ_j)² · max(1, w'Aw / (T · w'Dw)).
 */
export interface PredictionBasis {
  readonly company: string;
  readonly regressors: readonly string[];
  /** [own intercept, slopes …]. */
  readonly coefficients: readonly number[];
  /** The own company's mean outcome: its expected value at `ownMeans`. */
  readonly ownLevel: number;
  readonly ownMeans: readonly number[];
  /** Number of years T in the sample. */
  readonly years: number;
  /** λ_1 … λ_B, each over the centred basis. */
  readonly lambdas: readonly (readonly number[])[];
  /** A and D over the centred basis. */
  readonly a: readonly (readonly number[])[];
  readonly d: readonly (readonly number[])[];
  /** t_B(1 − α/2). */
  readonly quantile: number;
  /** Why no calibrated interval exists, where none does. */
  readonly intervalReason?: string;
  readonly confidence: number;
  /** Covariance of the slopes as chosen in the specification, K × K. */
  readonly slopeCovariance: readonly (readonly number[])[];
  /** Degrees of freedom of a contrast of slopes. */
  readonly slopeDegreesOfFreedom: SlopeDegreesOfFreedom;
  /** Why contrasts of slopes have no interval, where they have none. */
  readonly slopeIntervalReason?: string;
  /** The own company's last observed year and its values. */
  readonly last: OwnYear;
  /** Q⁻¹ of the company-demeaned regressors, K × K. */
  readonly inverseCrossProduct: readonly (readonly number[])[];
  /** σ² = Σe²/(n − N − K): σ²·Q⁻¹ is the classical covariance of the slopes, whichever was chosen. */
  readonly residualVariance: number;
  /** Largest leverage x̃'Q⁻¹x̃ of the own company, and of any company. */
  readonly largestOwnLeverage: number;
  readonly largestLeverage: number;
  readonly ownRange: readonly ObservedRange[];
  readonly peerRange: readonly ObservedRange[];
}

/**
 * Fixed degrees of freedom, or Satterthwaite's for a contrast w of slopes: (w'Sw)² / z'·quartic·z with
 * z = [w_k·w_l for k ≤ l, twice that for k < l], row by row; `quartic` is P × P, row-major, P = K(K + 1)/2.
 */
export type SlopeDegreesOfFreedom =
  | { readonly kind: 'fixed'; readonly value: number }
  | {
      readonly kind: 'satterthwaite';
      readonly s: readonly (readonly number[])[];
      readonly quartic: readonly number[];
    };
