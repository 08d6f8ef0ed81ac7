import type { SlopeCovariance } from '@contract';

/** One way to put intervals around slopes, in words. */
export interface CovarianceWords {
  readonly value: SlopeCovariance;
  readonly name: string;
  readonly detail: string;
}

/** In the order in which they are offered: the default first. */
export const covarianceWords: readonly CovarianceWords[] = [
  {
    value: 'cr2',
    name: 'By company, bias-reduced (CR2)',
    detail:
      'Allows errors of one company to hang together over the years, and corrects for few companies. The default.',
  },
  {
    value: 'cr1',
    name: 'By company, one factor (CR1)',
    detail: 'The same idea with a single correction factor; too narrow with few companies.',
  },
  {
    value: 'cr0',
    name: 'By company, uncorrected (CR0)',
    detail: 'The same idea without any correction; narrower still. For comparison with other work.',
  },
  {
    value: 'classical',
    name: 'Classical',
    detail:
      'Takes every row’s error as independent and equally large; too narrow where errors persist.',
  },
];

export function covarianceName(value: SlopeCovariance): string {
  return covarianceWords.find((words) => words.value === value)?.name ?? value;
}
