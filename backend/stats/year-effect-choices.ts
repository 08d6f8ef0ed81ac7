import { columnContrast, type Contrast } from './intervals/contrast';
import { dot } from './linear-algebra/square-matrix';
import type { YearEffectEstimates, yearEffectOrder } from './prediction';
import type { WithinFit } from './regression/within-fit';
import { yearWeights } from './regression/year-columns';

type YearEffectName = (typeof yearEffectOrder)[number];

/** The year effects that a prediction of one company may use. */
export interface YearEffectChoices {
  readonly estimates: YearEffectEstimates;
  readonly contrasts: Readonly<Record<YearEffectName, Contrast>>;
}

const recentYears = 3;

/**
 * Effects and contrasts of the years a prediction may stand on; null without year effects.
 *
 * @param own  index of the own company.
 */
export function yearEffectChoices(fit: WithinFit, own: number): YearEffectChoices | null {
  if (fit.yearColumns === 0) return null;
  const { sample } = fit;
  const total = sample.years.length;
  const ownPositions = sample.position.subarray(sample.starts[own], sample.starts[own + 1]);
  const lastThree = sample.years.map((_, position) => position).slice(-recentYears);
  const meanOver = (positions: ArrayLike<number>): Float64Array => {
    const weights = new Float64Array(fit.columns.length);
    for (const position of Array.from(positions)) {
      yearWeights(total, position).forEach(
        (weight, column) => (weights[column] += weight / positions.length),
      );
    }
    return weights;
  };
  const weights: Record<YearEffectName, Float64Array> = {
    ownMean: meanOver(ownPositions),
    last: meanOver([total - 1]),
    lastThree: meanOver(lastThree),
    ownLast: meanOver(ownPositions.subarray(-1)),
  };
  const effect = (name: YearEffectName): number => dot(weights[name], fit.coefficients);
  const contrast = (name: YearEffectName): Contrast => columnContrast(fit, weights[name]);
  return {
    estimates: {
      ownMean: effect('ownMean'),
      last: effect('last'),
      lastYear: sample.years[total - 1],
      lastThree: effect('lastThree'),
      ownLast: effect('ownLast'),
    },
    contrasts: {
      ownMean: contrast('ownMean'),
      last: contrast('last'),
      lastThree: contrast('lastThree'),
      ownLast: contrast('ownLast'),
    },
  };
}
