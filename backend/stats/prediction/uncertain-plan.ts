import { drawYear, type MarketFan } from './draw-year';
import type { Fan } from './fan';
import { unreadableReason } from './model-scale';
import { carryingReason, type Outlook } from './outlook';
import { heldRegressors, planRegressors } from './plan-regressors';
import type { PredictionBasis } from './prediction-basis';
import { type Triangle, triangularQuantile } from './triangular';
import { uniformDraws } from './uniform-draws';

export interface UncertainPlanYear {
  readonly year: number;
  /** One a regressor, in the order of the basis and the panel's measure. */
  readonly inputs: readonly Triangle[];
}

export interface UncertainPlanRequest extends Omit<Outlook, 'year'> {
  readonly years: readonly UncertainPlanYear[];
  /** A whole number from 0: the same draws for the same seed. */
  readonly seed: number;
  /** 10,000 unless told otherwise. */
  readonly draws?: number;
}

/** What an uncertain plan says about one year, or why it says nothing. */
export type UncertainYear =
  | {
      readonly year: number;
      /** The year whose inputs these are: with a lag the one before. */
      readonly of: number;
      /** Of the expected value, through the plan's spread alone: level, slopes and year effect as estimated. */
      readonly expected: Fan;
      /** Of the market value: the plan's spread, the error of the estimates and the band together. */
      readonly market: MarketFan;
    }
  | { readonly year: number; readonly expected: null; readonly reason: string };

const usualDraws = 10_000;
const mostDraws = 1_000_000;

/**
 * A plan whose inputs are uncertain, drawn many times.
 *
 * One draw holds a triangular value of every planned input, all independent, and one t for all years. At its inputs x
 * the expected value is that of `expectedValue`, with level, slopes and year effect as estimated: in log form a mean or,
 * where the gap is carried, a median. The market value is the model's point at x + s(x)·τ: s(x) is the standard error of
 * `marketValueBand` at x, in which the calibrated error of the expected value at x stands beside the own company's errors;
 * τ is Student's t with the band's degrees of freedom, independent of the inputs. So a plan without spread has the
 * band's own ends as its percentiles. In log form both are of logs, and the market value is exp of them, without smearing.
 *
 * Means: in levels the market value's is the expected value's, since τ has mean 0; in log form it has none, since exp of
 * a t has none, and is null. Errors of the drawing, with n draws: √(variance/n) of a mean, √(p(1 − p)/n)/density of
 * a percentile.
 *
 * From xoshiro128** (`random-words.ts`): first the t's 2n uniform numbers, then n an input, year by year and regressor by
 * regressor; so neither a further year nor another value of one input changes the draws of the others.
 *
 * @returns one entry a planned year, in the order of the plan; with a lag the first reads the last observed values, which
 *   are no draws.
 */
export function uncertainPlan(
  basis: PredictionBasis,
  { years, seed, draws = usualDraws, ...outlook }: UncertainPlanRequest,
): readonly UncertainYear[] {
  const refusal =
    drawingReason(seed, draws) ??
    (outlook.start === 'carry-the-gap' ? carryingReason(basis) : undefined);
  if (refusal !== undefined) {
    return years.map(({ year }) => ({ year, expected: null, reason: refusal }));
  }
  const next = uniformDraws(seed);
  const column = (): Float64Array => new Float64Array(draws).map(next);
  const uniform = [column(), column()] as const;
  const drawn = new Map(
    years.map(({ year, inputs }) => [
      year,
      {
        reason: inputsReason(basis, year, inputs),
        columns: inputs.map((input) => column().map((share) => triangularQuantile(input, share))),
      },
    ]),
  );
  const held = heldRegressors(basis).map((value) => new Float64Array(draws).fill(value));
  const likeliest = years.map(({ year, inputs }) => ({
    year,
    regressors: inputs.map(({ likely }) => likely),
  }));
  return planRegressors(basis, likeliest).map((readable): UncertainYear => {
    const { year } = readable;
    const none = (reason: string): UncertainYear => ({ year, expected: null, reason });
    if (readable.regressors === null) return none(readable.reason);
    const { of, regressors } = readable;
    const read = drawn.get(of);
    if (read?.reason !== undefined) return none(read.reason);
    const inputs = read?.columns ?? held;
    return { year, of, ...drawYear(basis, { regressors, inputs, uniform }, { ...outlook, year }) };
  });
}

function drawingReason(seed: number, draws: number): string | undefined {
  if (!Number.isSafeInteger(seed) || seed < 0) return 'A seed is a whole number from 0.';
  return Number.isInteger(draws) && draws >= 1 && draws <= mostDraws
    ? undefined
    : `Draws are a whole number from 1 to ${mostDraws}.`;
}

/** Why the inputs of one year cannot be drawn; undefined where they can. */
function inputsReason(
  basis: PredictionBasis,
  year: number,
  inputs: readonly Triangle[],
): string | undefined {
  const ends = ['low', 'likely', 'high'] as const;
  for (const end of ends) {
    const reason = unreadableReason(
      basis,
      inputs.map((input) => input[end]),
    );
    if (reason !== undefined) return reason;
  }
  const odd = basis.regressors.filter(
    (_, k) => !(inputs[k].low <= inputs[k].likely && inputs[k].likely <= inputs[k].high),
  );
  return odd.length === 0
    ? undefined
    : `Low, likely and high of ${odd.join(', ')} do not rise in that order in FY${year}.`;
}
