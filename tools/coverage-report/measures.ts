import { covarianceNames } from '../../backend/stats';
import type { SlopeCovarianceName } from '../../backend/stats';
import type { StartingPoint } from '../../backend/stats/prediction';
import { horizons } from './simulate-panel';

/** Covariances that give intervals without draws, the default first. */
export const matrixCovariances = covarianceNames.filter((name) => name !== 'wild');

export const startingPoints: readonly StartingPoint[] = ['model-level', 'carry-the-gap'];

/** Confidence of every interval that is held to a promise. */
export const nominal = 0.95;

/** Confidence of the market value's band as it first stands on screen. */
export const usualBand = 0.8;

/** Names of what is measured. */
export const standingMeasure = 'standing';
export const rankSetMeasure = 'rank set';
export const driftMeasure = 'drift';
export const wildMeasure = 'slope, wild';

export function slopeMeasure(name: SlopeCovarianceName): string {
  return `slope, ${name}`;
}

export function expectedMeasure(steps: number): string {
  return `expected value, ${steps} ahead`;
}

export function valueMeasure(start: StartingPoint, steps: number, confidence: number): string {
  return `market value, ${start}, ${steps} ahead, ${confidence}`;
}

export const expectedMeasures = horizons.map(expectedMeasure);

export function valueMeasures(confidence: number): string[] {
  return startingPoints.flatMap((start) =>
    horizons.map((steps) => valueMeasure(start, steps, confidence)),
  );
}
