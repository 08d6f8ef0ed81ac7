import { byCompany, companySandwich } from '../by-company';
import type { MatrixMethod } from '../covariance-method';

/** Clustered by company, without a factor. */
export const cr0: MatrixMethod = {
  ...byCompany,
  code: 'cr0',
  name: 'By company, plain',
  definition:
    'Clustered by company without a factor for few companies; t with G − 1 degrees of freedom, G the number of companies.',
  source: 'Arellano (1987), Oxford Bulletin of Economics and Statistics 49, 431–434',
  reference: ['within_se.CR0_company', 'twoway.CR0_company'],
  covariance: (ground) => companySandwich(ground, 1),
};
