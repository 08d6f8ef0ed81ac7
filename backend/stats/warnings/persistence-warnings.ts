import type { FitWarning } from '../fit-result';
import type { IntervalContext } from '../intervals/interval-context';
import { largestPersistence } from '../intervals/persistence';
import { isPerfectFit } from '../regression/goodness';

const highPersistence = 0.8;
const ownExcess = 0.3;
const namesInWords = 5;

/** What the carry-over of errors from year to year does to the intervals. */
export function persistenceWarnings(context: IntervalContext, own: number): FitWarning[] {
  const { pooled, used } = context.persistence;
  if (pooled === null || isPerfectFit(context.fit)) return [];
  const companies = context.fit.sample.companies;
  const warnings: FitWarning[] = [];
  if (pooled > highPersistence) {
    const detail = `Errors carry over from year to year by ${pooled.toFixed(2)}: a company's distance from the model fades slowly, and intervals are wide for that reason.`;
    warnings.push({ code: 'persistent-errors', detail });
  }
  const capped = companies.filter((_, index) => used[index] >= largestPersistence);
  if (capped.length > 0) {
    const shown = capped.slice(0, namesInWords).join(', ');
    const more = capped.length > namesInWords ? ` and ${capped.length - namesInWords} more` : '';
    const detail = `${shown}${more}: errors carry over so strongly that the estimate stops at its bound of ${largestPersistence}; intervals that involve them can be too narrow.`;
    warnings.push({ code: 'persistence-capped', detail, subjects: capped });
  }
  const ownPersistence = own === -1 ? NaN : context.persistence.own[own];
  if (ownPersistence - pooled > ownExcess) {
    const detail = `${companies[own]}'s errors carry over by ${ownPersistence.toFixed(2)}, its peers' by ${pooled.toFixed(2)}: its interval can be too narrow.`;
    warnings.push({ code: 'own-persistence', detail, subjects: [companies[own]] });
  }
  return warnings;
}
