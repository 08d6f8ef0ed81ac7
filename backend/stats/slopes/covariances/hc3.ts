import type { MatrixMethod } from '../covariance-method';
import { heteroskedastic, leverageWeighted } from '../heteroskedastic';

/** Squared residuals over (1 − h)². */
export const hc3: MatrixMethod = {
  ...heteroskedastic,
  code: 'hc3',
  name: 'By row, jackknife-like',
  definition:
    'As hc0, each squared residual divided by (1 − h)², h the row’s leverage in the regression with all dummies; a row of leverage 1 adds nothing; t with n − N − K degrees of freedom.',
  source: 'MacKinnon & White (1985), Journal of Econometrics 29, 305–325',
  reference: ['within_se.HC3_lsdv', 'twoway.HC3_lsdv2'],
  covariance: (ground) => leverageWeighted(ground, (rest) => 1 / (rest * rest)),
};
