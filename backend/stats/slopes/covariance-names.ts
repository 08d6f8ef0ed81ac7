import type { SlopeCovarianceName } from '../fit-result';

/** Every covariance of the slopes that a specification can name, the default first. */
export const covarianceNames: readonly SlopeCovarianceName[] = [
  'cr2',
  'wild',
  'cr1',
  'cr0',
  'classical',
  'hc0',
  'hc1',
  'hc2',
  'hc3',
  'two-way',
  'driscoll-kraay',
];
