import type { Effects, ModelForm } from '@contract';
import type { FigureKind, NumberFormat } from './number-format';

export interface Bounded {
  readonly estimate: number;
  readonly low: number | null;
  readonly high: number | null;
  readonly intervalReason?: string;
}

/** What a level of the log form is in. */
export const logUnit = 'natural logs';
/** What a difference of logs is shown in. */
const shareUnit = 'percent';

/** Beyond this difference of logs, a factor of a thousand million million, a percentage says nothing. */
const largestLog = Math.log(1e15);
const beyondReason = 'Out of logs this interval leaves what a percentage can say.';

/** exp(d) − 1; null where that says nothing. */
function shareOf(difference: number | null): number | null {
  return difference === null || difference > largestLog ? null : Math.expm1(difference);
}

/** How a level is written: money, or a log that no unit switch changes. Fits of engines before 2 have no form: levels. */
export function levelKind(form: ModelForm | undefined): FigureKind {
  return form === 'log' ? 'plain' : 'money';
}

/** How a difference of two levels is written: money, or of two logs the share that `asDifference` makes of it. */
export function differenceKind(form: ModelForm | undefined): FigureKind {
  return form === 'log' ? 'percent' : 'money';
}

/** A difference as it is shown: exp(d) − 1 of a difference of logs, at its ends too; money as it is. */
export function asDifference(value: Bounded, form: ModelForm | undefined): Bounded {
  if (form !== 'log') return value;
  const { estimate, low, high, intervalReason } = value;
  const ends = { low: shareOf(low), high: shareOf(high) };
  const isBeyond = (low !== null && ends.low === null) || (high !== null && ends.high === null);
  const reason = intervalReason ?? (isBeyond ? beyondReason : undefined);
  return {
    estimate: Math.expm1(Math.min(estimate, largestLog)),
    ...(isBeyond ? { low: null, high: null } : ends),
    ...(reason === undefined ? {} : { intervalReason: reason }),
  };
}

/** A gap path as it is shown, each year as `asDifference` has it. */
export function asShownGaps<T extends { readonly gap: number | null }>(
  years: readonly T[] | null,
  form: ModelForm | undefined,
): readonly T[] | null {
  if (years === null || form !== 'log') return years;
  return years.map((year) => ({
    ...year,
    gap: shareOf(year.gap),
  }));
}

/** What levels stand in, once in a header. */
export function levelUnit(form: ModelForm | undefined, numbers: NumberFormat): string {
  return form === 'log' ? logUnit : numbers.unitLabel();
}

/** What differences stand in, once in a header. */
export function differenceUnit(form: ModelForm | undefined, numbers: NumberFormat): string {
  return form === 'log' ? shareUnit : numbers.unitLabel();
}

/** What of a model is said behind its regressors: `in logs`, `year effects taken out`; nothing of a plain one. */
export function modelNotes({
  effects,
  form,
}: {
  readonly effects: Effects;
  readonly form: ModelForm;
}): readonly string[] {
  return [
    ...(form === 'log' ? ['in logs'] : []),
    ...(effects === 'company,year' ? ['year effects taken out'] : []),
  ];
}
