import type { FitSummary } from '@contract';
import type { NumberFormat } from '../ui/number-format';

/** `1 company`, `14 companies`. */
export function counted(count: number, one: string, many = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`;
}

/** `FY2008–FY2025`, or `FY2008` for one year. */
export function yearsText(firstYear: number, lastYear: number): string {
  return firstYear === lastYear ? `FY${firstYear}` : `FY${firstYear}–FY${lastYear}`;
}

/** The first characters of a hash, for the eye. */
export function shortHash(hash: string | null): string {
  return hash === null ? 'n/a' : hash.slice(0, 6);
}

/** `95 %`. */
export function confidenceText(confidence: number): string {
  return `${Number((confidence * 100).toPrecision(4))} %`;
}

/** Regressors in the reader's words: a fit's first two are always capex and book equity. */
export function regressorWord(name: string, index: number): string {
  return index === 0 ? 'capex' : index === 1 ? 'book equity' : name;
}

/** `capex, book equity and employees`. */
export function listed(words: readonly string[]): string {
  return words.length < 2
    ? words.join('')
    : `${words.slice(0, -1).join(', ')} and ${words[words.length - 1]}`;
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
  fit: Pick<FitSummary, 'slopes' | 'confidence' | 'regressors'>,
): string {
  const further = fit.regressors.slice(2);
  return [
    fit.slopes === 'classical' ? 'classical' : fit.slopes.toUpperCase(),
    confidenceText(fit.confidence),
    ...(further.length === 0 ? [] : [`with ${listed(further)}`]),
  ].join(' · ');
}
