import type { Evidence, FitResult } from '@contract';
import { type NumberFormat, headlineDigits } from '../../ui/number-format';
import { regressorWord } from '../fit-words';

/** Whether one line could serve all companies, and what each way explains. */
export function oneLineMeaning(
  {
    poolability,
    pooled,
    goodness,
    specification,
  }: Pick<FitResult, 'poolability' | 'pooled' | 'goodness' | 'specification'>,
  numbers: NumberFormat,
): string {
  const share = (value: number): string => numbers.headline(value, 'percent');
  const levels =
    specification.effects === 'company' ? 'company levels' : 'company levels and year effects';
  const shares = `One pooled line explains ${share(pooled.rSquared)}, ${levels} with common slopes ${share(goodness.rSquared)}.`;
  const { pValue, pValueReason } = poolability;
  if (pValue === null)
    return `Not decided: ${pValueReason ?? 'the test has no p value here'}. ${shares}`;
  return pValue < 1 - specification.confidence
    ? `No: company levels differ, so each company keeps its own. ${shares}`
    : `The data do not rule it out: company levels are not shown to differ. ${shares}`;
}

/** Title of the lines against one regressor. */
export function linesTitle(
  { slopes, pooled }: Pick<FitResult, 'slopes' | 'pooled'>,
  index: number,
  numbers: NumberFormat,
): string {
  const slope = slopes[index];
  const within = numbers.interval(slope, 'plain', headlineDigits);
  const head = `Against ${regressorWord(slope.name, index)} companies share a slope of ${within}`;
  if (!(slope.name in pooled.slopes)) return head;
  return `${head}, one line for all has ${numbers.headline(pooled.slopes[slope.name], 'plain')}`;
}

export interface ComparedSlope {
  readonly name: string;
  readonly pooled: string;
  readonly within: string;
}

/** Slopes of the pooled line beside those of company levels, with intervals. */
export function comparedSlopes(
  { estimators }: Pick<Evidence, 'estimators'>,
  { slopes }: Pick<FitResult, 'slopes'>,
  numbers: NumberFormat,
): readonly ComparedSlope[] {
  const pooled = estimators.find(({ code }) => code === 'pooled');
  return slopes.map((slope, index) => {
    const other = pooled?.slopes?.find(({ name }) => name === slope.name);
    return {
      name: regressorWord(slope.name, index),
      pooled: other === undefined ? (pooled?.reason ?? 'n/a') : numbers.interval(other, 'plain'),
      within: numbers.interval(slope, 'plain'),
    };
  });
}
