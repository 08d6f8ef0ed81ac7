import type { MatrixMethod } from '../covariance-method';
import { heteroskedastic, leverageWeighted } from '../heteroskedastic';

/** Squared residuals over 1 − h. */
export const hc2: MatrixMethod = {
  ...heteroskedastic,
  code: 'hc2',
  name: 'By row, leverage-corrected',
  definition:
    'As hc0, each squared residual divided by 1 − h, h the row’s leverage in the regression with all dummies; a row of leverage 1 adds nothing; t with n − N − K degrees of freedom.',
  source: 'MacKinnon & White (1985), Journal of Econometrics 29, 305–325',
  reference: ['within_se.HC2_lsdv'],
  covariance: (ground) => leverageWeighted(ground, (rest) => 1 / rest),
};
