import type { EditionContent } from '@contract';
import type { ExpectedPathData } from '@figures';
import { expectedValue, heldRegressors } from '@prediction';
import { expectedPathData } from '../ui/plan/plan-data';
import { shareText } from './edition-words';

/** Of an edition that did not freeze how its plans are looked at. */
const usualBand = 0.8;

/**
 * Actual against expected over the years with the plans of an edition; null without a prediction. The base is the one
 * that the differences of the leading plan were taken against, so that chart and table agree in every outlook.
 */
export function editionPath({ fit, scenarios }: EditionContent): ExpectedPathData | null {
  if (fit.prediction === null || fit.ownYears === null) return null;
  const isLog = fit.specification.form === 'log';
  const held = expectedValue(fit.prediction, heldRegressors(fit.prediction));
  const bases = new Map<number, number>();
  for (const { years } of scenarios)
    for (const { year, expected, difference } of years)
      if (!bases.has(year))
        bases.set(
          year,
          isLog
            ? expected.estimate * Math.exp(-difference.estimate)
            : expected.estimate - difference.estimate,
        );
  const base = [...bases].sort(([a], [b]) => a - b).map(([year, estimate]) => ({ year, estimate }));
  return expectedPathData(fit.ownYears, scenarios.length === 0 ? held : base, scenarios);
}

/** `80 % band of the market value`, as the leading plan has it. */
export function editionBandName({ scenarios }: EditionContent): string {
  const share = scenarios.at(0)?.outlook?.bandConfidence ?? usualBand;
  return `${shareText(share)} band of the market value`;
}
