import { uncalibratedReason } from './basis-error';
import { shownFactor } from './expected-value';
import { type Fan, fanOf, meanOf } from './fan';
import { bandErrors, bandVariance } from './market-value-band';
import { inModelScale } from './model-scale';
import type { Outlook } from './outlook';
import { plannedContrast } from './planned-contrast';
import type { PredictionBasis } from './prediction-basis';
import { studentDraw } from './student-draw';
import { varianceAlong } from './variance-along';

/** Where the market value itself may lie, or why that cannot be said. */
export type MarketFan = Fan | { readonly percentiles: null; readonly reason: string };

/** What is drawn for one planned year. */
export interface DrawnYear {
  /** What the model reads at the likeliest values, in the panel's measure. */
  readonly regressors: readonly number[];
  /** One column a regressor, one value a draw, in the panel's measure. */
  readonly inputs: readonly Float64Array[];
  /** Two columns of uniform numbers, one of each a draw. */
  readonly uniform: readonly [Float64Array, Float64Array];
}

/** The fans of one planned year; what is drawn is said at `uncertainPlan`. */
export function drawYear(
  basis: PredictionBasis,
  { regressors, inputs, uniform }: DrawnYear,
  outlook: Outlook,
): { readonly expected: Fan; readonly market: MarketFan } {
  const start = inModelScale(basis, regressors);
  const { estimate, weights } = plannedContrast(basis, start, outlook);
  const moves = inputs.map((column, k) => movesOf(basis, column, start[k]));
  const points = pointsOf(estimate, basis.coefficients.slice(1), moves);
  const factor = shownFactor(basis, outlook);
  const shown =
    basis.form === 'log' ? points.map((point) => Math.exp(point) * factor) : points.slice();
  const mean = meanOf(shown);
  const expected = fanOf(shown, mean);
  const market = marketFan(basis, { points, moves, weights, uniform, mean }, outlook);
  return { expected, market };
}

interface MarketDraws extends Pick<DrawnYear, 'uniform'> {
  /** The model's point of each draw, in its scale; the market value's draws afterwards. */
  readonly points: Float64Array;
  /** One column a slope; what the contrast moves by from `weights`. */
  readonly moves: readonly Float64Array[];
  readonly weights: readonly number[];
  /** Of the expected values. */
  readonly mean: number;
}

function marketFan(
  basis: PredictionBasis,
  { points, moves, weights, uniform, mean }: MarketDraws,
  outlook: Outlook,
): MarketFan {
  const none = (reason: string): MarketFan => ({ percentiles: null, reason });
  const errors = bandErrors(basis, outlook);
  if (errors.reason !== undefined) return none(errors.reason);
  if (basis.intervalReason !== undefined) return none(basis.intervalReason);
  const varianceOfMean = varianceAlong(basis, weights);
  const [first, second] = uniform;
  const move = new Float64Array(moves.length);
  for (let draw = 0; draw < points.length; draw += 1) {
    for (let k = 0; k < moves.length; k += 1) move[k] = moves[k][draw];
    const ofMean = varianceOfMean(move);
    if (ofMean === null) return none(uncalibratedReason);
    const student = studentDraw(errors.degreesOfFreedom, first[draw], second[draw]);
    points[draw] += Math.sqrt(bandVariance(errors, ofMean)) * student;
  }
  return basis.form === 'log' ? fanOf(points.map(Math.exp), null) : fanOf(points, mean);
}

/** How far each draw lies from where the contrast starts, in the model's scale. */
function movesOf(basis: PredictionBasis, column: Float64Array, start: number): Float64Array {
  return basis.form === 'log'
    ? column.map((value) => Math.log(value) - start)
    : column.map((value) => value - start);
}

function pointsOf(
  estimate: number,
  slopes: readonly number[],
  moves: readonly Float64Array[],
): Float64Array {
  const points = new Float64Array(moves[0].length).fill(estimate);
  slopes.forEach((slope, k) => {
    const column = moves[k];
    for (let draw = 0; draw < points.length; draw += 1) points[draw] += slope * column[draw];
  });
  return points;
}
