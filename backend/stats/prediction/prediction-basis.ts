/** The bounds of one regressor over rows of the sample. */
export interface ObservedRange {
  readonly low: number;
  readonly high: number;
}

/** A year of the own company: actual market value and what the model expects. */
export interface OwnYear {
  readonly year: number;
  readonly fileRow: number;
  /** In the panel's measure, as `fitted`; in log form that is the mean, exp(·)·smear. */
  readonly actual: number;
  readonly fitted: number;
  /** In the model's scale: logs in log form. */
  readonly residual: number;
  /** What the model read that year, in the panel's measure; with a lag, the values of the year before. */
  readonly regressors: readonly number[];
}

/** The year effects that a prediction may use; they sum to zero over the sample's years. Model's scale. */
export interface YearEffectEstimates {
  /** Mean of the effects of the own company's years. */
  readonly ownMean: number;
  /** Of the sample's last year, `lastYear`. */
  readonly last: number;
  readonly lastYear: number;
  /** Mean over the sample's last three years. */
  readonly lastThree: number;
  /** Of the own company's last year. */
  readonly ownLast: number;
}

/** Their order behind the slopes in every vector and matrix of the basis. */
export const yearEffectOrder = ['ownMean', 'last', 'lastThree', 'ownLast'] as const;

/** The own company's errors, for what lies around the expected value. Model's scale. */
export interface OwnErrors {
  /** ρ of the own company as its intervals use it; null where it is not known, for `persistenceReason`. */
  readonly persistence: number | null;
  readonly persistenceReason?: string;
  /** The years of its rows, ascending. */
  readonly years: readonly number[];
  /** s² = Σe²/(T_own − f), f = ΣΣρ^|year − year'|/T_own. */
  readonly variance: number;
}

/** A peer's row in the own company's last year. */
export interface PeerYear {
  readonly company: string;
  /** a_own − a_peer, in the model's scale. */
  readonly interceptGap: number;
  /** In the panel's measure. */
  readonly regressors: readonly number[];
  /** In the model's scale. */
  readonly residual: number;
}

/**
 * All that prediction needs, on the server and in the browser. The model's scale is the panel's measure or, in log form,
 * its natural logs; with a lag the model reads every regressor one year late.
 *
 * An expected value at regressors x is the contrast w = [1, x₁ − x̄₁ … x_K − x̄_K] over [the own company's level at its
 * own means, slope 1 … slope K], x̄ the own company's means; with year effects, four weights more in `yearEffectOrder`,
 * the own mean's among them, for the level holds it. Centring there keeps the digits of large figures. In that basis
 * se² = T · mean_j(w'λ_j)² · max(1, w'Aw / (T · w'Dw)).
 *
 * What is optional is missing in fits of earlier engines, which were in levels, without lag and without year effects.
 */
export interface PredictionBasis {
  readonly company: string;
  readonly regressors: readonly string[];
  readonly form?: 'levels' | 'log';
  readonly lag?: 0 | 1;
  /** Duan's factor in log form; null in levels. */
  readonly smear?: number | null;
  /** [own intercept, slopes …]. */
  readonly coefficients: readonly number[];
  /** The own company's mean outcome: its expected value at `ownMeans`. Model's scale, as these. */
  readonly ownLevel: number;
  readonly ownMeans: readonly number[];
  /** Null without year effects. */
  readonly yearEffects?: YearEffectEstimates | null;
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
  /** Covariance of the slopes as chosen in the specification, K × K; null where the method has none. */
  readonly slopeCovariance: readonly (readonly number[])[] | null;
  /** Degrees of freedom of a contrast of slopes; null without a covariance. */
  readonly slopeDegreesOfFreedom: SlopeDegreesOfFreedom | null;
  /** Why contrasts of slopes have no interval, where they have none. */
  readonly slopeIntervalReason?: string;
  /** Why one of them has none where the covariance gives it no variance. */
  readonly slopeNoVarianceReason?: string;
  /** The own company's last observed year and its values. */
  readonly last: OwnYear;
  /**
   * The regressors of that year itself, in the panel's measure: with a lag not yet what the model read. Null where one of
   * them is missing or, in log form, not above zero.
   */
  readonly held?: readonly number[] | null;
  readonly ownErrors?: OwnErrors;
  /** The peers with a row in the own company's last year. */
  readonly peers?: readonly PeerYear[];
  /** Q⁻¹ of the company-demeaned regressors, K × K; with year effects too, these are not taken out. */
  readonly inverseCrossProduct: readonly (readonly number[])[];
  /** With year effects: the inverse cross product of the regressors less company and year effects, K × K. */
  readonly slopeInverse?: readonly (readonly number[])[];
  /**
   * σ² = Σe²/(residual degrees of freedom): times `slopeInverse`, or else Q⁻¹, it is the classical covariance of the
   * slopes, whichever was chosen.
   */
  readonly residualVariance: number;
  /** Largest leverage x̃'Q⁻¹x̃ of the own company, and of any company. */
  readonly largestOwnLeverage: number;
  readonly largestLeverage: number;
  /** In the panel's measure, as the peers'. */
  readonly ownRange: readonly ObservedRange[];
  readonly peerRange: readonly ObservedRange[];
  /**
   * From the 10th to the 90th percentile (Hyndman & Fan 1996, type 7) of what the model read over the peers' rows, in
   * the panel's measure. Missing in fits of engines before 2.2.
   */
  readonly peerSpread?: readonly ObservedRange[];
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
