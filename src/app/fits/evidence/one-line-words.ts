import type { Evidence, FitResult } from '@contract';
import type { IntervalFigure } from '@figures';
import { type NumberFormat, headlineDigits } from '../../ui/number-format';
import { sentence } from '../../ui/phrases';
import { regressorWord } from '../fit-words';

/** Whether one line could serve all companies. */
export function oneLineAnswer({
  poolability,
  specification,
}: Pick<FitResult, 'poolability' | 'specification'>): string {
  const { pValue, pValueReason } = poolability;
  if (pValue === null)
    return `Not decided: ${sentence(pValueReason ?? 'the test has no p value here')}`;
  return pValue < 1 - specification.confidence
    ? 'No: company levels differ, so each company keeps its own.'
    : 'The data do not rule it out: company levels are not shown to differ.';
}

/** Whether one line could serve all companies, and what each way explains. */
export function oneLineMeaning(
  result: Pick<FitResult, 'poolability' | 'pooled' | 'goodness' | 'specification'>,
  numbers: NumberFormat,
): string {
  const { pooled, goodness, specification } = result;
  const share = (value: number): string => numbers.headline(value, 'percent');
  const levels =
    specification.effects === 'company' ? 'company levels' : 'company levels and year effects';
  const outcome = specification.form === 'log' ? 'the log of market value' : 'market value';
  const shares = `One pooled line explains ${share(pooled.rSquared)} of the variation in ${outcome}, ${levels} with common slopes ${share(goodness.rSquared)}.`;
  return `${oneLineAnswer(result)} ${shares}`;
}

/** Title of the lines against one regressor: the slope within companies, then that of the pooled line. */
export function linesTitle(
  { estimators }: Pick<Evidence, 'estimators'>,
  { slopes }: Pick<FitResult, 'slopes'>,
  { index, numbers }: { readonly index: number; readonly numbers: NumberFormat },
): string {
  const slope = slopes[index];
  const text = (figure: IntervalFigure): string =>
    numbers.interval(figure, 'plain', headlineDigits);
  const head = `Against ${regressorWord(slope.name, index)} companies share a slope of ${text(slope)}`;
  const pooled = pooledSlope({ estimators }, slope.name);
  return pooled === undefined ? head : `${head}, one line for all has ${text(pooled)}`;
}

function pooledSlope({ estimators }: Pick<Evidence, 'estimators'>, name: string) {
  const pooled = estimators.find(({ code }) => code === 'pooled');
  return pooled?.slopes?.find((slope) => slope.name === name);
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
    const other = pooledSlope({ estimators }, slope.name);
    return {
      name: regressorWord(slope.name, index),
      pooled: other === undefined ? (pooled?.reason ?? 'n/a') : numbers.interval(other, 'plain'),
      within: numbers.interval(slope, 'plain'),
    };
  });
}
