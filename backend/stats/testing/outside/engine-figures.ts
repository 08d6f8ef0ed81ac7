import type { OpenFit } from '../../fit-parts';
import { evidenceFigures } from './evidence-figures';
import type { FigureValues } from './figure-values';
import { predictionFigures } from './prediction-figures';
import { resultFigures } from './result-figures';

/**
 * Every figure of a fit that has an outside value, by the names and in the order of `golden/outside.json`.
 *
 * @param plans  what the model reads in each plan, in the panel's measure.
 */
export function engineFigures(open: OpenFit, plans: readonly (readonly number[])[]): FigureValues {
  const { prediction } = open.result;
  return {
    ...resultFigures(open.result),
    ...evidenceFigures(open),
    ...(prediction !== null && predictionFigures(prediction, plans)),
  };
}
