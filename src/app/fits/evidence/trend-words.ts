import type { Evidence, FitResult } from '@contract';
import type { IntervalRow } from '@figures';
import { type NumberFormat, headlineDigits } from '../../ui/number-format';
import { listed } from '../../ui/phrases';
import { regressorWord } from '../fit-words';

type Trends = Pick<Evidence, 'estimators'>;
type Fitted = Pick<FitResult, 'slopes' | 'warnings'>;
type Estimator = Evidence['estimators'][number];

function differences({ estimators }: Trends): Estimator | undefined {
  return estimators.find(({ code }) => code === 'first-differences');
}

function sameSlope(estimator: Estimator | undefined, name: string) {
  return estimator?.slopes?.find((slope) => slope.name === name);
}

/** One slope read off levels, and off changes from one year to the next. */
export function trendRows(
  evidence: Trends,
  { slopes }: Pick<FitResult, 'slopes'>,
  index: number,
): readonly IntervalRow[] {
  const slope = slopes[index];
  const estimator = differences(evidence);
  const other = sameSlope(estimator, slope.name);
  const name = 'First differences';
  return [
    { name: 'Fixed effects', note: 'this fit', figure: slope, isMarked: true },
    other === undefined
      ? { name, figure: null, reason: estimator?.reason ?? 'n/a' }
      : { name, note: 'classical interval', figure: other },
  ];
}

export function trendTitle(
  evidence: Trends,
  { slopes }: Pick<FitResult, 'slopes'>,
  { index, numbers }: { readonly index: number; readonly numbers: NumberFormat },
): string {
  const slope = slopes[index];
  const other = sameSlope(differences(evidence), slope.name);
  const text = (value: typeof slope | NonNullable<typeof other>): string =>
    numbers.interval(value, 'plain', headlineDigits);
  const head = `Slope on ${regressorWord(slope.name, index)} ${text(slope)}`;
  return other === undefined ? head : `${head}, in changes from year to year ${text(other)}`;
}

interface TrendWords {
  /** Whether companies that merely grow together could have made the slopes. */
  readonly answer: string;
  /** What to do about it. */
  readonly advice: string;
}

function trendWords(evidence: Trends, { slopes, warnings }: Fitted): TrendWords {
  const estimator = differences(evidence);
  if (!estimator?.slopes)
    return only(
      `First differences cannot be taken: ${estimator?.reason ?? 'they were not looked at'}`,
    );
  const doubtful = slopes.flatMap((slope, index) => {
    const other = sameSlope(estimator, slope.name);
    return other === undefined || isInside(other.estimate, slope)
      ? []
      : [regressorWord(slope.name, index)];
  });
  if (slopes.every(({ low, high }) => low === null && high === null))
    return only(
      'The slopes of this fit have no interval to hold changes from year to year against: compare both figures.',
    );
  const persist = warnings.some(({ code }) => code === 'persistent-errors');
  if (doubtful.length === 0)
    return {
      answer:
        'Changes from year to year give slopes inside the intervals of this fit, so trends alone do not make them.',
      advice: persist
        ? 'Errors still persist from year to year: keep intervals that allow for it.'
        : '',
    };
  const what =
    doubtful.length === 1
      ? `the slope on ${doubtful[0]} lies outside this fit’s interval`
      : `the slopes on ${listed(doubtful)} lie outside this fit’s intervals`;
  return {
    answer: `In changes from year to year ${what}, so common trends may make part of it.`,
    advice: 'State both figures, and compare year effects below.',
  };
}

function only(answer: string): TrendWords {
  return { answer, advice: '' };
}

/** Whether companies that merely grow together could have made the slopes. */
export function trendAnswer(evidence: Trends, result: Fitted): string {
  return trendWords(evidence, result).answer;
}

/** Whether companies that merely grow together could have made the slopes, and what to do about it. */
export function trendMeaning(evidence: Trends, result: Fitted): string {
  const { answer, advice } = trendWords(evidence, result);
  return advice === '' ? answer : `${answer} ${advice}`;
}

function isInside(value: number, { low, high }: FitResult['slopes'][number]): boolean {
  return (low === null || value >= low) && (high === null || value <= high);
}
