import type { SlopeCovariance } from '@contract';

/** One way to put intervals around slopes, in words. */
export interface CovarianceWords {
  readonly value: SlopeCovariance;
  readonly name: string;
  /** As short as a table wants it. */
  readonly short: string;
  readonly detail: string;
}

export interface CovarianceGroup {
  readonly name: string;
  readonly covariances: readonly CovarianceWords[];
}

/** In the order in which they are offered: the default first. */
export const covarianceGroups: readonly CovarianceGroup[] = [
  {
    name: 'Fit for a small peer group',
    covariances: [
      {
        value: 'cr2',
        name: 'By company, bias-reduced (CR2)',
        short: 'CR2',
        detail:
          'Allows errors of one company to hang together over the years, and corrects for few companies. The default.',
      },
      {
        value: 'wild',
        name: 'Wild cluster bootstrap, by company',
        short: 'wild bootstrap',
        detail:
          'Turns each company’s errors over at random and asks how often chance alone reaches this far. Gives intervals of slopes, none of plans.',
      },
    ],
  },
  {
    name: 'By company, for comparison',
    covariances: [
      {
        value: 'cr1',
        name: 'By company, one factor (CR1)',
        short: 'CR1',
        detail: 'One correction factor for all companies; too narrow with few of them.',
      },
      {
        value: 'cr0',
        name: 'By company, uncorrected (CR0)',
        short: 'CR0',
        detail: 'Without any correction; narrower still.',
      },
    ],
  },
  {
    name: 'Row by row',
    covariances: [
      {
        value: 'classical',
        name: 'Classical',
        short: 'classical',
        detail:
          'Takes every row’s error as independent and equally large; too narrow where errors persist.',
      },
      {
        value: 'hc0',
        name: 'Heteroskedasticity-robust (HC0)',
        short: 'HC0',
        detail: 'Errors may differ in size; too narrow where they persist.',
      },
      {
        value: 'hc1',
        name: 'Heteroskedasticity-robust (HC1)',
        short: 'HC1',
        detail: 'As HC0, with one factor for the rows that the effects use up.',
      },
      {
        value: 'hc2',
        name: 'Heteroskedasticity-robust (HC2)',
        short: 'HC2',
        detail: 'As HC0, corrected by each row’s leverage.',
      },
      {
        value: 'hc3',
        name: 'Heteroskedasticity-robust (HC3)',
        short: 'HC3',
        detail: 'As HC2, on the wide side.',
      },
    ],
  },
  {
    name: 'Shocks that hit all peers',
    covariances: [
      {
        value: 'two-way',
        name: 'By company and by year',
        short: 'two-way',
        detail: 'Errors may hang together within a company and within a year; wants many of both.',
      },
      {
        value: 'driscoll-kraay',
        name: 'Driscoll–Kraay',
        short: 'Driscoll–Kraay',
        detail: 'Shocks may be shared by all and fade over time; wants many years.',
      },
    ],
  },
];

const words = covarianceGroups.flatMap(({ covariances }) => covariances);

export function covarianceName(value: SlopeCovariance): string {
  return words.find((known) => known.value === value)?.name ?? value;
}

export function covarianceShort(value: SlopeCovariance): string {
  return words.find((known) => known.value === value)?.short ?? value;
}

export function covarianceDetail(value: SlopeCovariance): string {
  return words.find((known) => known.value === value)?.detail ?? '';
}
