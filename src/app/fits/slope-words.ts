import type { FitResult, Lag, ModelForm } from '@contract';
import { type MoneyUnit, unitText } from '@figures';
import { type NumberFormat, headlineDigits } from '../ui/number-format';
import { readRegressor } from './fit-words';

type Slope = FitResult['slopes'][number];

/** What decides how a slope is read: which regressor's it is, and of what specification. */
export interface SlopeReading {
  readonly index: number;
  readonly form: ModelForm;
  readonly lag: Lag;
}

const fewDegrees = 4;

/** What is changed by one: `1 more of capex`, in log form `1 % more capex`. */
export function slopeChange({ name }: Slope, { index, form, lag }: SlopeReading): string {
  const regressor = readRegressor(name, index, lag);
  return form === 'log' ? `1 % more ${regressor}` : `1 more of ${regressor}`;
}

/**
 * `Each extra 1 of capex goes with 2.03 more market value (1.22 to 2.84)`; in log form
 * `1 % more capex goes with 0.420 % more market value (0.100 to 0.700)`.
 */
export function slopeSentence(slope: Slope, reading: SlopeReading, numbers: NumberFormat): string {
  const { estimate } = slope;
  const isLog = reading.form === 'log';
  const change = isLog
    ? slopeChange(slope, reading)
    : `Each extra 1 of ${readRegressor(slope.name, reading.index, reading.lag)}`;
  const head = `${change} goes with ${amount(estimate, numbers)}${isLog ? ' %' : ''} ${side(estimate)} market value`;
  return `${head} (${boundsWords(slope, numbers)})`;
}

function boundsWords({ low, high, unbounded }: Slope, numbers: NumberFormat): string {
  const sided = (value: number): string => `${amount(value, numbers)} ${side(value)}`;
  if (unbounded === 'high' && low !== null) return `${sided(low)} and up, no upper end`;
  if (unbounded === 'low' && high !== null) return `${sided(high)} and down, no lower end`;
  if (low === null || high === null) return 'no interval';
  if (low > 0) return `${amount(low, numbers)} to ${amount(high, numbers)}`;
  if (high < 0) return `${amount(high, numbers)} to ${amount(low, numbers)}`;
  return `${sided(low)} to ${sided(high)}`;
}

function amount(value: number, numbers: NumberFormat): string {
  return numbers.headline(Math.abs(value), 'plain', headlineDigits);
}

function side(value: number): string {
  return value < 0 ? 'less' : 'more';
}

/** What a reader has to add to the sentence: whether anything is shown at all, and on how little it rests. */
export function slopeRemark(
  slope: Slope,
  { index, form }: Pick<SlopeReading, 'index' | 'form'>,
  panel: { readonly currency: string; readonly unit: MoneyUnit },
): string {
  const remarks: string[] = [];
  const { degreesOfFreedom } = slope;
  const doubt = intervalRemark(slope);
  if (doubt !== '') remarks.push(doubt);
  if (degreesOfFreedom !== null && degreesOfFreedom < fewDegrees)
    remarks.push(
      `Rests on ${degreesOfFreedom.toFixed(2)} degrees of freedom: one large company drives it.`,
    );
  // A ratio of percents has no unit; a slope on anything but money has that of market value.
  if (index > 1 && form === 'levels')
    remarks.push(
      `Market value in ${unitText(panel.currency, panel.unit)}, ${slope.name} as it stands in the panel.`,
    );
  return remarks.join(' ');
}

function intervalRemark({ low, high, unbounded, intervalReason }: Slope): string {
  const isOpen = unbounded === 'low' || unbounded === 'high';
  if (!isOpen && (low === null || high === null)) return intervalReason ?? 'There is no interval.';
  const open = isOpen ? ` The draws rule out no value on the ${unbounded} side.` : '';
  const holdsZero = (low ?? -Infinity) <= 0 && (high ?? Infinity) >= 0;
  return `${holdsZero ? 'Not clearly different from none.' : ''}${open}`.trim();
}
