/** Planned regressors of one year, in the fit's order and the panel's unit. */
export interface PlannedYear {
  readonly year: number;
  readonly values: readonly number[];
}
