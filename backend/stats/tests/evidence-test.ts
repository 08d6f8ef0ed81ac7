import type { OpenFit } from '../fit-parts';

/** A test of §5 of the evidence: one file a test, one line in the table. */
export interface EvidenceTest {
  readonly code: string;
  readonly name: string;
  /** Its definition in a sentence. */
  readonly definition: string;
  /** Where it comes from. */
  readonly source: string;
  /** Block of the golden files that holds its outside result. */
  readonly reference: string;
  /** false: its p value is shown without verdict and left out of Holm's correction. */
  readonly inHolm: boolean;
  /** What has to be known before it is read. */
  readonly caution?: string;
  /** What each outcome means for the decision, a sentence each. */
  readonly readings: {
    readonly rejects: string;
    readonly keeps: string;
    readonly none: string;
  };
  compute(ground: TestGround): TestOutcome;
}

/** What a test may read of a fit. */
export type TestGround = Pick<
  OpenFit,
  'sample' | 'fit' | 'pooled' | 'ground' | 'context' | 'specification'
>;

export type TestOutcome = TestWithP | StatisticOnly | NoStatistic;

export interface TestWithP {
  readonly statistic: number;
  readonly distribution: 'F' | 'chi-squared' | 'normal' | 't';
  readonly degreesOfFreedom: readonly number[];
  readonly pValue: number;
}

/** A statistic without a p value. */
export interface StatisticOnly {
  readonly statistic: number;
  readonly distribution: null;
  readonly degreesOfFreedom: readonly [];
  readonly pValue: null;
  readonly reason?: string;
}

/** Not defined, and why in words. */
export interface NoStatistic {
  readonly statistic: null;
  readonly reason: string;
}
