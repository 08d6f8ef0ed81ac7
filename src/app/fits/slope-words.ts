import type { FitResult } from '@contract';
import { type MoneyUnit, unitText } from '@figures';
import { type NumberFormat, headlineDigits } from '../ui/number-format';
import { regressorWord } from './fit-words';

type Slope = FitResult['slopes'][number];

const fewDegrees = 4;

/** `Each extra 1 of capex goes with 2.03 more market value (1.22 to 2.84)`. */
export function slopeSentence(slope: Slope, index: number, numbers: NumberFormat): string {
  const { estimate, low, high } = slope;
  const amount = (value: number): string =>
    numbers.headline(Math.abs(value), 'plain', headlineDigits);
  const side = (value: number): string => (value < 0 ? 'less' : 'more');
  const head = `Each extra 1 of ${regressorWord(slope.name, index)} goes with ${amount(estimate)} ${side(estimate)} market value`;
  if (low === null || high === null) return `${head} (no interval)`;
  if (low > 0) return `${head} (${amount(low)} to ${amount(high)})`;
  if (high < 0) return `${head} (${amount(high)} to ${amount(low)})`;
  return `${head} (${amount(low)} ${side(low)} to ${amount(high)} ${side(high)})`;
}

/** What a reader has to add to the sentence: whether anything is shown at all, and on how little it rests. */
export function slopeRemark(
  slope: Slope,
  index: number,
  panel: { readonly currency: string; readonly unit: MoneyUnit },
): string {
  const remarks: string[] = [];
  const { low, high, degreesOfFreedom, intervalReason } = slope;
  if (low === null || high === null) remarks.push(intervalReason ?? 'There is no interval.');
  else if (low <= 0 && high >= 0) remarks.push('Not clearly different from none.');
  if (degreesOfFreedom !== null && degreesOfFreedom < fewDegrees)
    remarks.push(
      `Rests on ${degreesOfFreedom.toFixed(2)} degrees of freedom: one large company drives it.`,
    );
  if (index > 1)
    remarks.push(
      `Market value in ${unitText(panel.currency, panel.unit)}, ${slope.name} as it stands in the panel.`,
    );
  return remarks.join(' ');
}
