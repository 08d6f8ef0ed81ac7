import type { FitAnswer, Refusal } from '../../compute/messages';
import type { FitResult } from '../../stats';
import { failureOf } from '../fit-failure';
import type { FitFailure } from '../fit-view';

/** A figure with its interval, as the engine gives it; null with a reason where it has none. */
export interface TrialFigure {
  readonly estimate: number;
  readonly standardError: number | null;
  readonly low: number | null;
  readonly high: number | null;
  readonly intervalReason?: string | undefined;
}

/** What is kept of the fit of a group that is tried out. */
export interface TrialFigures {
  readonly hash: string;
  readonly companies: number;
  /** How many companies have a place. */
  readonly ranked: number;
  readonly slopes: readonly (TrialFigure & { readonly name: string })[];
  /** In the panel's currency unit, or in log form a difference of logs. */
  readonly standing: TrialFigure | null;
  readonly standingReason?: string | undefined;
  readonly rankSet: readonly [number, number] | null;
  readonly rankReason?: string | undefined;
}

export type TrialOutcome =
  | { readonly kind: 'fitted'; readonly figures: TrialFigures }
  | ({ readonly kind: 'refused' } & FitFailure);

export function toTrialOutcome(answer: FitAnswer): TrialOutcome {
  return answer.kind === 'refused'
    ? toRefusedOutcome(answer)
    : { kind: 'fitted', figures: toTrialFigures(answer.result) };
}

export function toRefusedOutcome(refusal: Refusal): TrialOutcome {
  return { ...failureOf(refusal), kind: 'refused' };
}

function toTrialFigures(result: FitResult): TrialFigures {
  const { hash, sample, slopes, intercepts, standing, standingReason } = result;
  return {
    hash,
    companies: sample.companies,
    ranked: intercepts.filter(({ deviation }) => deviation !== null).length,
    slopes: slopes.map((slope) => ({ name: slope.name, ...toFigure(slope) })),
    standing: standing === null ? null : toFigure(standing),
    standingReason,
    rankSet: standing?.rankSet ?? null,
    rankReason: standing?.rankReason,
  };
}

function toFigure({
  estimate,
  standardError,
  low,
  high,
  intervalReason,
}: TrialFigure): TrialFigure {
  return { estimate, standardError, low, high, intervalReason };
}
