import type { MatrixMethod } from '../covariance-method';
import { evenlyWeighted, heteroskedastic } from '../heteroskedastic';

/** `hc0` with a factor for the parameters used. */
export const hc1: MatrixMethod = {
  ...heteroskedastic,
  code: 'hc1',
  name: 'By row, with factor',
  definition:
    'As hc0, times n/(n − N − K), company and year effects counted; t with n − N − K degrees of freedom.',
  source: 'MacKinnon & White (1985), Journal of Econometrics 29, 305–325',
  reference: ['within_se.HC1_lsdv', 'twoway.HC1_lsdv2'],
  covariance: (ground) =>
    evenlyWeighted(ground, ground.fit.residuals.length / ground.fit.residualDegreesOfFreedom),
};
