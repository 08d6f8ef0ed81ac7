import type { IntervalEstimate, OwnYear, PredictionBasis } from './prediction';

export type {
  IntervalEstimate,
  ObservedRange,
  OwnYear,
  PredictionBasis,
  SlopeDegreesOfFreedom,
} from './prediction';

/** The specification of a fit: everything beside the rows, the members and the own company that decides its figures. */
export interface Specification {
  /** Effects taken out of every variable. */
  readonly effects: Effects;
  /** Natural logs of outcome and regressors, or their levels. */
  readonly form: 'levels' | 'log';
  /** 1: every regressor is replaced by its value one calendar year earlier. */
  readonly lag: 0 | 1;
  /** Covariance of the slopes, by the names of `slopes/covariance-table.ts`. */
  readonly slopes: SlopeCovarianceName;
  /** Confidence level of every interval of what the model estimates, strictly between 0 and 1. */
  readonly confidence: number;
  /** Seed of random draws; null where the specification draws none. */
  readonly seed: number | null;
}

export type Effects = 'company' | 'company,year';

export type SlopeCovarianceName =
  | 'cr2'
  | 'wild'
  | 'cr1'
  | 'cr0'
  | 'classical'
  | 'hc0'
  | 'hc1'
  | 'hc2'
  | 'hc3'
  | 'two-way'
  | 'driscoll-kraay';

/**
 * One row a company and fiscal year, by column. All arrays have the same length, NaN stands for a missing cell.
 * `company` holds codes into `companies`; rows need not be sorted.
 */
export interface PanelColumns {
  readonly companies: readonly string[];
  readonly company: Int32Array;
  readonly year: Int32Array;
  readonly outcome: NamedColumn;
  readonly regressors: readonly NamedColumn[];
  /** Line of the imported file that each row came from, the header being line 1. */
  readonly fileRow: Int32Array;
}

export interface NamedColumn {
  readonly name: string;
  readonly values: Float64Array;
}

/** An F statistic with its degrees of freedom; the p value is null for a perfect fit, with the reason. */
export interface FTest {
  readonly value: number | null;
  readonly df1: number;
  readonly df2: number;
  readonly pValue: number | null;
  readonly pValueReason?: string;
}

export interface SlopeEstimate extends IntervalEstimate {
  /** The regressor's name as the panel has it. */
  readonly name: string;
  readonly statistic: number | null;
  readonly degreesOfFreedom: number | null;
  readonly pValue: number | null;
  /** Which ends a bootstrap interval does not have. */
  readonly unbounded?: 'low' | 'high' | 'both';
}

export interface InterceptEstimate extends IntervalEstimate {
  readonly company: string;
  /** a_i minus the unweighted mean of all intercepts; null for a single-row company. */
  readonly deviation: number | null;
  readonly rows: number;
}

export interface Standing extends IntervalEstimate {
  readonly company: string;
  readonly calibration: number | null;
  readonly cosines: number;
  readonly persistence: number | null;
  readonly ownPersistence: number | null;
  /** Place by estimate, 1 = highest intercept; for records only, never shown without its rank set. */
  readonly rank: number | null;
  /** First and last place that the data cannot rule out; null with `rankReason`. */
  readonly rankSet: readonly [number, number] | null;
  readonly rankReason?: string;
  /** In log form: the standing and its ends as percent, 100 · (exp(·) − 1). */
  readonly percent?: IntervalPercent;
}

/** Null where a double cannot hold the percent, with `intervalReason`. */
export interface IntervalPercent {
  readonly estimate: number | null;
  readonly low: number | null;
  readonly high: number | null;
  readonly intervalReason?: string;
}

/** A year's effect; with year effects they sum to zero over the sample's years. */
export interface YearEffect {
  readonly year: number;
  readonly estimate: number;
}

/** Duan's smearing factor of a log form: mean of exp(e), over all rows and over the own company's. */
export interface Smearing {
  /** Null where a double cannot hold it, with `reason`. */
  readonly factor: number | null;
  /** Null without an own company, and where a double cannot hold it. */
  readonly own: number | null;
  readonly reason?: string;
}

/** The difference a_own − a_peer with the standard error of the rank set's steps (its own number of cosines). */
export interface PairComparison extends IntervalEstimate {
  readonly company: string;
  /** +1 shown to be higher than the own company, −1 shown to be lower, 0 not told apart (Holm over all one-sided hypotheses). */
  readonly shown: -1 | 0 | 1;
}

export interface GapYear {
  readonly year: number;
  /** How far the own company lay above its peers once the slopes are taken out; null in a year without any peer, which `peers` says. */
  readonly gap: number | null;
  /** Peers with a row in that year. */
  readonly peers: number;
}

export interface Drift extends IntervalEstimate {
  readonly pValue: number | null;
}

export interface FitWarning {
  readonly code: WarningCode;
  readonly detail: string;
  /** Companies, regressors or years concerned. */
  readonly subjects?: readonly string[];
}

export type WarningCode =
  | 'few-companies'
  | 'few-years'
  | 'small-degrees-of-freedom'
  | 'persistent-errors'
  | 'persistence-capped'
  | 'own-persistence'
  | 'dominated'
  | 'single-row'
  | 'perfect-fit'
  | 'ill-conditioned'
  | 'spelling'
  | 'wild-set-disconnected'
  | 'negative-eigenvalues'
  | 'smear-differs';

/** A cell that a row lacks, which keeps the row out of a fit. Company and year tell rows apart; lines need not. */
export interface DroppedRow {
  readonly company: string;
  readonly year: number;
  /** Line of the imported file, the header being line 1; 0 for a row that came by a correction. */
  readonly row: number;
  readonly column: string;
  readonly reason: 'missing';
}

export interface Sample {
  readonly companies: number;
  readonly years: number;
  readonly observations: number;
  readonly balanced: boolean;
  readonly firstYear: number;
  readonly lastYear: number;
  readonly dropped: readonly DroppedRow[];
  readonly singleRow: readonly string[];
}

/**
 * What one fit says. Numbers at full precision; what is not defined is null with a reason beside it. Where no own company
 * was named, all that is said of one is null without further words.
 */
export interface FitResult {
  readonly engine: string;
  /**
   * SHA-256, hex, of the canonical JSON of rows used, members, own company, specification and engine version; see
   * `canonicalFitText`.
   */
  readonly hash: string;
  readonly specification: Specification;
  readonly outcome: string;
  readonly members: readonly string[];
  readonly sample: Sample;
  readonly slopes: readonly SlopeEstimate[];
  /** Null for the bootstrap, which has none. */
  readonly slopeCovariance: readonly (readonly number[])[] | null;
  readonly slopeCovarianceReason?: string;
  readonly intercepts: readonly InterceptEstimate[];
  /** Null without year effects. */
  readonly yearEffects: readonly YearEffect[] | null;
  /** Null in levels. */
  readonly smearing: Smearing | null;
  readonly standing: Standing | null;
  /** Why there is no standing, where an own company was named. */
  readonly standingReason?: string;
  /** Null where there is no standing, for the same reason. */
  readonly pairs: readonly PairComparison[] | null;
  /** Null where there is no standing, for the same reason. */
  readonly gapPath: readonly GapYear[] | null;
  readonly drift: Drift | null;
  readonly driftReason?: string;
  readonly goodness: {
    /** Null where the effects leave nothing to explain. */
    readonly withinRSquared: number | null;
    readonly withinRSquaredReason?: string;
    readonly rSquared: number;
    readonly adjustedRSquared: number;
    readonly residualStandardError: number;
    readonly f: FTest;
    readonly fSlopes: FTest;
  };
  readonly pooled: {
    readonly constant: number;
    readonly slopes: Readonly<Record<string, number>>;
    readonly rSquared: number;
    readonly f: FTest;
  };
  readonly poolability: FTest;
  /** Slopes and standing without each company in turn. */
  readonly withoutCompany: readonly {
    readonly company: string;
    readonly slopes: readonly number[] | null;
    readonly standing: number | null;
    readonly reason?: string;
  }[];
  /** The own company's years, oldest first; null where there is no standing, for the same reason, or as `predictionReason` says. */
  readonly ownYears: readonly OwnYear[] | null;
  readonly prediction: PredictionBasis | null;
  readonly predictionReason?: string;
  readonly warnings: readonly FitWarning[];
}
