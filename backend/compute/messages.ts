import type {
  CovarianceSummary,
  Evidence,
  FitResult,
  PanelColumns,
  Specification,
  StatsErrorData,
} from '../stats';

/** What is to be fitted; the columns' buffers are transferred, not copied. */
export interface FitSubject {
  readonly columns: PanelColumns;
  readonly specification: Specification;
  readonly own: string | null;
  readonly members: readonly string[];
}

/** What a fit's worker is given. */
export interface FitTask extends FitSubject {
  /** Shared with the caller: thousandths done, read while the worker runs. */
  readonly progress: Int32Array;
}

/** Has the evidence of a fit computed. */
export interface EvidenceTask extends FitSubject {
  readonly wanted: 'evidence';
}

/** Has the slopes of a fit bootstrapped. */
export interface BootstrapTask extends FitSubject {
  readonly wanted: 'bootstrap';
  readonly seed: number;
  readonly progress: Int32Array;
}

/** Has the digest computed that a fit would have. */
export interface HashTask extends FitSubject {
  readonly wanted: 'hash';
}

/** Has a group fitted that nobody saved. */
export interface TrialTask extends FitSubject {
  readonly wanted: 'trial';
}

export type BackgroundTask = EvidenceTask | BootstrapTask | HashTask | TrialTask;

/** Classes do not survive a message port: a refusal crosses as its code, sentence and data. */
export interface Refusal {
  readonly kind: 'refused';
  readonly code: string;
  readonly detail: string;
  readonly data: StatsErrorData;
}

export type FitAnswer = { readonly kind: 'done'; readonly result: FitResult } | Refusal;

export type EvidenceAnswer = { readonly kind: 'done'; readonly evidence: Evidence } | Refusal;

export type BootstrapAnswer =
  { readonly kind: 'done'; readonly summary: CovarianceSummary } | Refusal;

export type HashAnswer = { readonly kind: 'done'; readonly hash: string } | Refusal;

export type BackgroundAnswer = EvidenceAnswer | BootstrapAnswer | HashAnswer | FitAnswer;
