import type { MatrixMethod } from '../covariance-method';
import { evenlyWeighted, heteroskedastic } from '../heteroskedastic';

/** Rows of unequal variance, no correction. */
export const hc0: MatrixMethod = {
  ...heteroskedastic,
  code: 'hc0',
  name: 'By row, plain',
  definition:
    'Errors of unequal variance, independent of each other: each row’s own squared residual; t with n − N − K degrees of freedom.',
  source: 'White (1980), Econometrica 48, 817–838',
  reference: ['within_se.HC0_lsdv', 'twoway.white_HC0'],
  covariance: (ground) => evenlyWeighted(ground, 1),
};
