import { byCompany, companySandwich } from '../by-company';
import type { MatrixMethod } from '../covariance-method';

/** Clustered by company with the factor of nested effects: year columns count as parameters, company effects do not. */
export const cr1: MatrixMethod = {
  ...byCompany,
  code: 'cr1',
  name: 'By company, with factor',
  definition:
    'Clustered by company with the factor G/(G − 1) · (n − 1)/(n − K − 1), year effects counted in K and company effects not; t with G − 1 degrees of freedom.',
  source:
    'Arellano (1987), Oxford Bulletin of Economics and Statistics 49, 431–434; factor as in Cameron & Miller (2015), Journal of Human Resources 50, 317–372',
  reference: ['within_se.CR1_nested', 'twoway.CR1_nested'],
  covariance: (ground) => {
    const companies = ground.products.length;
    const rows = ground.fit.residuals.length;
    const parameters = ground.fit.coefficients.length;
    const factor = ((companies / (companies - 1)) * (rows - 1)) / (rows - parameters - 1);
    return companySandwich(ground, factor);
  },
};
