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
  return {
    estimate: Math.expm1(estimate),
    low: low === null ? null : Math.expm1(low),
    high: high === null ? null : Math.expm1(high),
    ...(intervalReason === undefined ? {} : { intervalReason }),
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
    gap: year.gap === null ? null : Math.expm1(year.gap),
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
