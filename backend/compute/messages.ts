import type { FitResult, PanelColumns, Specification, StatsErrorData } from '../stats';

/** What a fit's worker is given; the columns' buffers are transferred, not copied. */
export interface FitTask {
  readonly columns: PanelColumns;
  readonly specification: Specification;
  readonly own: string | null;
  readonly members: readonly string[];
  /** Shared with the caller: thousandths done, read while the worker runs. */
  readonly progress: Int32Array;
}

/** Classes do not survive a message port: a refusal crosses as its code, sentence and data. */
export type FitAnswer =
  | { readonly kind: 'done'; readonly result: FitResult }
  | {
      readonly kind: 'refused';
      readonly code: string;
      readonly detail: string;
      readonly data: StatsErrorData;
    };
