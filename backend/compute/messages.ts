import type { MessagePort } from 'node:worker_threads';
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
  /** Takes the `FitAnswer` as soon as there is one, before the evidence is computed. */
  readonly answerTo: MessagePort;
}

/** What the worker of a bootstrap is given. */
export interface BootstrapTask extends FitSubject {
  readonly seed: number;
  readonly progress: Int32Array;
}

/** Classes do not survive a message port: a refusal crosses as its code, sentence and data. */
export interface Refusal {
  readonly kind: 'refused';
  readonly code: string;
  readonly detail: string;
  readonly data: StatsErrorData;
}

export type FitAnswer = { readonly kind: 'done'; readonly result: FitResult } | Refusal;

/** What a fit's worker ends with; of a refused fit there is no evidence either. */
export type EvidenceAnswer = { readonly kind: 'done'; readonly evidence: Evidence } | Refusal;

export type BootstrapAnswer =
  { readonly kind: 'done'; readonly summary: CovarianceSummary } | Refusal;
