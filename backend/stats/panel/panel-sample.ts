import type { DroppedRow } from '../fit-result';

/**
 * The rows a fit is estimated from, sorted by company name and year: every company has two rows or more.
 * n rows, N companies; company i holds rows starts[i] … starts[i + 1] − 1.
 */
export interface PanelSample {
  readonly companies: readonly string[];
  readonly starts: Int32Array;
  readonly year: Int32Array;
  /** Position of the row's year among the sample's years, 0 … T − 1. */
  readonly position: Int32Array;
  /** The T different years, ascending. */
  readonly years: readonly number[];
  /** In the model's scale: natural logs in log form. */
  readonly outcome: Float64Array;
  /** In the model's scale; with a lag, of the calendar year before. */
  readonly regressors: readonly Float64Array[];
  /** The same in the panel's measure; the same arrays in levels. */
  readonly levels: ModelLevels;
  readonly fileRow: Int32Array;
  readonly outcomeName: string;
  readonly regressorNames: readonly string[];
  /** Companies with one row: listed, but part of no count, mean or ranking. */
  readonly singles: readonly SingleRow[];
  readonly dropped: readonly DroppedRow[];
  /** Everyone who was asked for, sorted by name. */
  readonly members: readonly string[];
}

export interface ModelLevels {
  readonly outcome: Float64Array;
  readonly regressors: readonly Float64Array[];
}

/** A row in the model's scale. */
export interface SingleRow {
  readonly company: string;
  readonly year: number;
  readonly fileRow: number;
  readonly outcome: number;
  readonly regressors: readonly number[];
  readonly levels: { readonly outcome: number; readonly regressors: readonly number[] };
}
