import type { FiscalYearRule } from '../../file-recipe';
import type { FiscalYear } from '../parse-year';

/** A fiscal year that ends in this month or before has most of its months in the year before. */
const lastMonthOfYearBefore = 5;

/**
 * The calendar year that a fiscal year belongs to: the one it ends in, or the one that holds most of its months. One
 * that ends in June has six months in each and belongs to the year of its end.
 *
 * @param usualEndMonth  when a fiscal year ends whose text does not say, 1 to 12.
 */
export function calendarYear(
  { endYear, endMonth }: FiscalYear,
  rule: FiscalYearRule['rule'],
  usualEndMonth: number,
): number {
  if (rule === 'year-of-end') return endYear;
  return (endMonth ?? usualEndMonth) <= lastMonthOfYearBefore ? endYear - 1 : endYear;
}
