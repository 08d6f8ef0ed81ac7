import type { FitResult } from '@contract';
import { type MoneyUnit, unitText } from '@figures';
import type { FigureKind, NumberFormat } from '../../ui/number-format';
import { readRegressor } from '../fit-words';

export interface AxisWords {
  /** What it measures and in what: `capex, EUR m`. */
  readonly title: string;
  readonly kind: FigureKind;
}

interface Panel {
  readonly currency: string;
  readonly unit: MoneyUnit;
}

function amount(
  word: string,
  { specification }: Pick<FitResult, 'specification'>,
  { panel, numbers }: { readonly panel: Panel; readonly numbers: NumberFormat },
): AxisWords {
  return specification.form === 'log'
    ? { title: `log of ${word} in ${unitText(panel.currency, panel.unit)}`, kind: 'plain' }
    : { title: `${word}, ${numbers.unitLabel()}`, kind: 'money' };
}

/** Market value in the model's scale: money, or its natural log. */
export function outcomeAxis(
  result: Pick<FitResult, 'specification'>,
  panel: Panel,
  numbers: NumberFormat,
): AxisWords {
  return amount('market value', result, { panel, numbers });
}

/** A regressor in the model's scale; a further one has no unit that we know. */
export function regressorAxis(
  result: Pick<FitResult, 'specification' | 'slopes'>,
  index: number,
  words: { readonly panel: Panel; readonly numbers: NumberFormat },
): AxisWords {
  const { form, lag } = result.specification;
  const named = readRegressor(result.slopes[index].name, index, lag);
  if (index < 2) return amount(named, result, words);
  return { title: form === 'log' ? `log of ${named}` : named, kind: 'plain' };
}
