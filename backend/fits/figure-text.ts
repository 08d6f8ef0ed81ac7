import type { FitResult } from '../stats';

/** What a figure is: its value, its formula in words, and what went into it. */
export interface FigureAccount {
  readonly label: string;
  readonly value: {
    readonly estimate: number;
    readonly standardError: number | null;
    readonly low: number | null;
    readonly high: number | null;
    readonly intervalReason?: string;
  } | null;
  /** For what is no single amount. */
  readonly text: string | null;
  readonly isMoney: boolean;
  readonly formula: string;
  readonly inputs: readonly FigureInput[];
  /** Whose rows of the panel went in; undefined for every row of the sample. */
  readonly cells?: { readonly company?: string; readonly year?: number };
}

export interface FigureInput {
  readonly label: string;
  readonly value: number | null;
  readonly isMoney: boolean;
  /** The figure that this input is, where it is one. */
  readonly figure: string | null;
}

/** Accounts for one kind of figure; undefined when the fit has no such figure. */
export type FigureWriter = (result: FitResult, index: number) => FigureAccount | undefined;

export const bare = (estimate: number): NonNullable<FigureAccount['value']> => ({
  estimate,
  standardError: null,
  low: null,
  high: null,
});

export const slopeInputs = (result: FitResult): FigureInput[] =>
  result.slopes.map((slope, index) => ({
    label: `slope of ${slope.name}`,
    value: slope.estimate,
    isMoney: false,
    figure: `slope.${index}`,
  }));
