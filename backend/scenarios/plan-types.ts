/** How a plan is looked at. */
export interface PlanOutlookChoice {
  readonly start: 'model-level' | 'carry-the-gap';
  /** A given one is in the model's scale and taken as known. */
  readonly yearEffect: 'last' | 'mean-of-last-three' | { readonly given: number };
  readonly confidence: number;
  readonly bandConfidence: number;
}

/** What fills one regressor over the years of a plan. */
export type PlanRule =
  | { readonly kind: 'hold' }
  | { readonly kind: 'grow'; readonly percent: number }
  | {
      readonly kind: 'total';
      readonly total: number;
      readonly spread: 'even' | 'rising' | 'falling';
    }
  | { readonly kind: 'share'; readonly percent: number; readonly of: number };

/** How one regressor came to its planned amounts. */
export interface RegressorRule {
  /** Null where they were typed. */
  readonly rule: PlanRule | null;
  readonly moves: readonly { readonly year: number; readonly amount: number }[];
}

/** How far planned amounts may miss, by year and regressor; null for one taken as certain. */
export interface PlanUncertaintyRanges {
  readonly seed: number;
  readonly ranges: readonly (readonly ({ readonly low: number; readonly high: number } | null)[])[];
}
