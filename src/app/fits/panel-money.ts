import type { ModelForm } from '@contract';
import { type MoneyUnit, unitRatio } from '@figures';
import { asDifference } from '../ui/model-form';
import { type NumberFormat, tableDigits } from '../ui/number-format';

interface Bounded {
  readonly estimate: number;
  readonly low: number | null;
  readonly high: number | null;
}

/** The estimate of one panel in the unit of another, so that both can be written by the same unit switch. */
export function inUnit<T extends Bounded>(value: T, from: MoneyUnit, to: MoneyUnit): T {
  const ratio = unitRatio(from, to);
  return {
    ...value,
    estimate: value.estimate * ratio,
    low: value.low === null ? null : value.low * ratio,
    high: value.high === null ? null : value.high * ratio,
  };
}

/** An estimate of any panel as a table writes it; another currency than the page's is named. */
export function moneyOf(
  value: Bounded,
  panel: { readonly currency: string; readonly unit: MoneyUnit },
  numbers: NumberFormat,
  significant = tableDigits,
): string {
  const shown = inUnit(value, panel.unit, numbers.panelUnit());
  const text = numbers.interval(shown, 'money', significant);
  return panel.currency === numbers.currency() ? text : `${panel.currency} ${text}`;
}

/** A standing of any fit as a table writes it: money of its panel, or a percentage where the fit is in logs. */
export function standingOf(
  standing: Bounded,
  fit: {
    readonly form: ModelForm;
    readonly panel: { readonly currency: string; readonly unit: MoneyUnit };
  },
  numbers: NumberFormat,
  significant = tableDigits,
): string {
  const { form, panel } = fit;
  return form === 'log'
    ? numbers.interval(asDifference(standing, form), 'percent', significant)
    : moneyOf(standing, panel, numbers, significant);
}
