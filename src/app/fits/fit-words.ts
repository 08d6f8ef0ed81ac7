import type { Effects, FitResult, FitSummary, Lag } from '@contract';
import type { NumberFormat } from '../ui/number-format';
import { modelNotes } from '../ui/model-form';
import { covarianceShort } from '../ui/covariance-words';
import { confidenceText, lagText, listed } from '../ui/phrases';

/** Regressors in the reader's words: a fit's first two are always capex and book equity. */
export function regressorWord(name: string, index: number): string {
  return index === 0 ? 'capex' : index === 1 ? 'book equity' : name;
}

/** A regressor as the model read it: `capex`, or `capex of the year before`. */
export function readRegressor(name: string, index: number, lag: Lag): string {
  return regressorWord(name, index) + lagText(lag);
}

/** What company levels are net of: `capex, book equity and employees`, with a lag `… of the year before`. */
export function regressorsText({
  slopes,
  specification,
}: Pick<FitResult, 'slopes' | 'specification'>): string {
  return (
    listed(slopes.map(({ name }, index) => regressorWord(name, index))) + lagText(specification.lag)
  );
}

/** What the company levels come from: `market value on capex and book equity, in logs, year effects taken out`. */
export function modelText(result: Pick<FitResult, 'slopes' | 'specification'>): string {
  return [`market value on ${regressorsText(result)}`, ...modelNotes(result.specification)].join(
    ', ',
  );
}

/** The name of the R² that the slopes have for themselves. */
export function withinName(effects: Effects): string {
  return effects === 'company' ? 'R² within companies' : 'R² within, both effects taken out';
}

/** `place 2 to 5 of 13`, or `place 1 of 11`. */
export function placesText(rankSet: readonly [number, number], ranked: number | null): string {
  const [first, last] = rankSet;
  const places = first === last ? `place ${first}` : `place ${first} to ${last}`;
  return ranked === null ? places : `${places} of ${ranked}`;
}

/** `p < 0.001`, or `p 0.034`. */
export function pText(pValue: number | null): string {
  if (pValue === null) return 'p n/a';
  return pValue < 0.001 ? 'p < 0.001' : `p ${pValue.toFixed(3)}`;
}

/** `on 10 and 207, p < 0.001`: what stands beside a statistic. */
export function testText(
  test: { readonly df1: number; readonly df2: number; readonly pValue: number | null },
  numbers: NumberFormat,
): string {
  const [first, second] = [test.df1, test.df2].map((df) => numbers.headline(df, 'count'));
  return `on ${first} and ${second}, ${pText(test.pValue)}`;
}

/** What of a specification is not the default, and always slopes and confidence: `CR2 · 95 % · with employees`. */
export function specificationText(
  fit: Pick<FitSummary, 'effects' | 'form' | 'lag' | 'slopes' | 'confidence' | 'regressors'>,
): string {
  const further = fit.regressors.slice(2);
  return [
    covarianceShort(fit.slopes),
    confidenceText(fit.confidence),
    ...(fit.effects === 'company' ? [] : ['year effects']),
    ...(fit.form === 'levels' ? [] : ['logs']),
    ...(fit.lag === 0 ? [] : ['year before']),
    ...(further.length === 0 ? [] : [`with ${listed(further)}`]),
  ].join(' · ');
}
