/** What the engine refuses. Clients switch on these codes, never on the words. */
export type StatsErrorCode =
  | 'shape'
  | 'specification'
  | 'non-finite'
  | 'duplicate-rows'
  | 'unknown-company'
  | 'too-many-years'
  | 'too-few-companies'
  | 'outcome-constant'
  | 'constant-within-companies'
  | 'collinear-regressors'
  | 'same-for-all-companies'
  | 'not-positive'
  | 'disconnected-years'
  | 'no-residual-degrees-of-freedom';

/** A row of the imported file that a refusal concerns; the header is line 1. */
export interface RowPlace {
  readonly row: number;
  readonly company?: string;
  readonly year?: number;
  readonly column?: string;
}

/** What a refusal concerns; plain data, so that it survives a worker's message port. */
export interface StatsErrorData {
  readonly rows?: readonly RowPlace[];
  readonly columns?: readonly string[];
  readonly companies?: readonly string[];
  /** Weights of a linear combination of the demeaned regressors that is zero. */
  readonly combination?: readonly { readonly column: string; readonly weight: number }[];
}

/** The engine's refusal: a code, a sentence for a person, and what it concerns. */
export class StatsError extends Error {
  override readonly name = 'StatsError';

  constructor(
    readonly code: StatsErrorCode,
    message: string,
    readonly data: StatsErrorData = {},
  ) {
    super(message);
  }
}
