import type { FitResult } from '../../contract';
import type { FigureKind, ShownEstimate } from './sentence';

type Form = FitResult['specification']['form'];

/** Beyond this difference of logs, a factor of a thousand million million, a percentage says nothing. */
const largestLog = Math.log(1e15);

/** How a difference of two levels is written: money, or of two logs a share. */
export function differenceKind(form: Form): FigureKind {
  return form === 'log' ? 'percent' : 'money';
}

/** A difference as it is shown: exp(d) − 1 of a difference of logs, at its ends too; money as it is. */
export function shownDifference({ estimate, low, high }: ShownEstimate, form: Form): ShownEstimate {
  if (form !== 'log') return { estimate, low, high };
  const isBeyond = (low ?? 0) > largestLog || (high ?? 0) > largestLog;
  const share = (value: number | null): number | null =>
    value === null || isBeyond ? null : Math.expm1(value);
  return {
    estimate: Math.expm1(Math.min(estimate, largestLog)),
    low: share(low),
    high: share(high),
  };
}
