import type { Effects, IntervalEstimate, SlopeCovarianceName, Specification } from '../fit-result';

/** What speaks for and against a fit, beside its result. What is not defined is null with a reason beside it. */
export interface Evidence {
  readonly engine: string;
  /** The fit's hash: the same rows, members, specification and engine. */
  readonly hash: string;
  readonly verdict: Verdict;
  /** "Does one line for all do?": one picture a regressor. */
  readonly lines: readonly RegressorLines[];
  /** "Is the standing steady?": the standing without each year. */
  readonly withoutYear: readonly WithoutYear[];
  /** Why the list above is empty. */
  readonly withoutYearReason?: string;
  /** "Could it be only trends?" and the estimators that stand beside the fixed effects. */
  readonly estimators: readonly EstimatorSummary[];
  /** "Which intervals?": every covariance for the same slopes, in the table's order. */
  readonly covariances: readonly CovarianceSummary[];
  /** "What if the model were another?" */
  readonly alternatives: readonly Alternative[];
  readonly tests: TestSummary;
  readonly residuals: ResidualSummary;
}

export type VerdictGrade = 'carries' | 'carries-with-care' | 'does-not-carry';

/** Whether the fit can carry a board statement, and what speaks against it. */
export interface Verdict {
  readonly grade: VerdictGrade;
  /** One sentence for the CFO. */
  readonly sentence: string;
  readonly against: readonly Objection[];
}

export interface Objection {
  /** Name of the rule that raised it. */
  readonly code: string;
  /** A serious one alone keeps the fit from carrying a statement without care. */
  readonly weight: 'serious' | 'notable';
  readonly detail: string;
}

/** Straight lines of the outcome against one regressor, the others at each company's own mean; in the model's scale. */
export interface RegressorLines {
  readonly regressor: string;
  /** Over the company's observed range of the regressor; at most `mostCompanyLines`, the own company always kept. */
  readonly companies: readonly CompanyLine[];
  /** Companies that have a line. */
  readonly of: number;
  /** The pooled line over the range of all rows, the other regressors at their means. */
  readonly pooled: LineEnds;
}

export interface LineEnds {
  readonly from: readonly [x: number, y: number];
  readonly to: readonly [x: number, y: number];
}

export interface CompanyLine extends LineEnds {
  readonly company: string;
}

export interface WithoutYear {
  readonly year: number;
  readonly slopes: readonly number[] | null;
  readonly standing: number | null;
  readonly reason?: string;
  /** Companies that the year leaves with fewer than two rows, so that they drop out with it. */
  readonly leftOut?: readonly string[];
}

export type EstimatorCode =
  'fixed-effects' | 'pooled' | 'between' | 'random-effects' | 'first-differences';

export interface EstimatorSlope extends IntervalEstimate {
  readonly name: string;
}

/** An estimator's slopes with classical intervals (the fixed effects with the specification's covariance). */
export interface EstimatorSummary {
  readonly code: EstimatorCode;
  readonly slopes: readonly EstimatorSlope[] | null;
  readonly constant: number | null;
  readonly observations: number;
  /** Of t; null for the normal distribution. */
  readonly degreesOfFreedom: number | null;
  /** Standard deviations of the errors and of the company effects, and the smallest and largest θ; random effects only. */
  readonly components?: {
    readonly error: number;
    readonly company: number;
    readonly theta: readonly [number, number];
  };
  readonly reason?: string;
}

export interface CovarianceSlope {
  readonly name: string;
  readonly standardError: number | null;
  readonly degreesOfFreedom: number | null;
  readonly pValue: number | null;
  readonly low: number | null;
  readonly high: number | null;
  /** Which ends a bootstrap interval does not have. */
  readonly unbounded?: 'low' | 'high' | 'both';
  readonly reason?: string;
}

export interface CovarianceSummary {
  readonly code: SlopeCovarianceName;
  /** Its definition in a sentence, and where it comes from. */
  readonly definition: string;
  readonly source: string;
  readonly isChosen: boolean;
  readonly isDefault: boolean;
  /** Null where it has not been run (the bootstrap by draws) or cannot serve, with the reason. */
  readonly slopes: readonly CovarianceSlope[] | null;
  readonly reason?: string;
  /** Of the bootstrap by random draws, once it has been run: its seed and how many sign vectors it drew. */
  readonly seed?: number;
  readonly draws?: number;
  /** What has to be said beside the figures. */
  readonly notes: readonly string[];
}

/** 'this-fit': the specification itself, listed where it combines several of the others and equals none of them. */
export type AlternativeCode =
  'this-fit' | 'pooled' | 'fixed-effects' | 'year-effects' | 'log-form' | 'lag' | 'random-effects';

/** The question asked of another model: the same members and rows where the model allows. */
export interface Alternative {
  readonly code: AlternativeCode;
  readonly isThisFit: boolean;
  /** Effects taken out of every variable; null for one constant or effects drawn from one distribution. */
  readonly effects: Effects | null;
  readonly form: Specification['form'];
  readonly lag: Specification['lag'];
  readonly observations: number | null;
  readonly slopes: readonly EstimatorSlope[] | null;
  /** Which covariance the slopes' intervals come from, where it is not the specification's. */
  readonly slopesNote?: string;
  /** In the outcome's unit, or in percent (100 · (exp(·) − 1)) in log form. */
  readonly standing: IntervalEstimate | null;
  readonly standingUnit: 'level' | 'percent';
  readonly standingReason?: string;
  readonly rankSet: readonly [number, number] | null;
  /** Why there is no rank set, where there is a standing. */
  readonly rankReason?: string;
  readonly reason?: string;
}

export interface TestSummary {
  /** How many tests were looked at, and how many have a p value that Holm's correction runs over. */
  readonly lookedAt: number;
  readonly inHolm: number;
  /** Level of the family: 1 − confidence. */
  readonly level: number;
  readonly list: readonly TestResult[];
}

export interface TestResult {
  readonly code: string;
  readonly name: string;
  readonly definition: string;
  readonly source: string;
  readonly statistic: number | null;
  /** Distribution of the statistic where there is a p value. */
  readonly distribution: 'F' | 'chi-squared' | 'normal' | 't' | null;
  readonly degreesOfFreedom: readonly number[];
  readonly pValue: number | null;
  /** Why there is no statistic or no p value. */
  readonly reason?: string;
  /** 'shown-only': a p value that the correction leaves out, without verdict. */
  readonly holm: 'rejects' | 'keeps' | 'shown-only' | 'none';
  /** What it means for this decision, in a sentence. */
  readonly reading: string;
  readonly caution?: string;
}

export interface ResidualSummary {
  readonly byCompany: readonly ResidualGroup[];
  readonly byYear: readonly (ResidualGroup & { readonly mean: number })[];
  /** At most `mostResidualPoints`, the largest studentised kept; `of` says how many there are. */
  readonly points: readonly ResidualPoint[];
  readonly of: number;
  /** The largest by |studentised residual|, largest first; at most 20. */
  readonly largest: readonly ResidualPoint[];
  readonly varianceInflation: readonly { readonly name: string; readonly value: number }[];
}

export interface ResidualGroup {
  readonly label: string;
  readonly count: number;
  readonly standardDeviation: number;
  /** The residual that lies farthest from zero, with its sign. */
  readonly largest: number;
}

/** One row of the sample; `actual`, `fitted`, `residual` and `regressors` in the model's scale. */
export interface ResidualPoint {
  readonly company: string;
  readonly year: number;
  readonly fileRow: number;
  readonly regressors: readonly number[];
  readonly actual: number;
  readonly fitted: number;
  readonly residual: number;
  /** Leverage in the full dummy regression, own 1/T_i included. */
  readonly leverage: number;
  /** Externally studentised; null where the row determines itself. */
  readonly studentised: number | null;
  readonly cook: number | null;
}
