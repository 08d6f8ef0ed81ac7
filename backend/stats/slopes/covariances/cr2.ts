import { timesVector } from '../../linear-algebra/square-matrix';
import { type MatrixMethod, noCompanyVarianceReason } from '../covariance-method';
import { scoreProducts } from '../score-products';
import { slopeSandwich } from '../slope-block';

/** Bias-reduced by company, working identity. */
export const cr2: MatrixMethod = {
  kind: 'matrix',
  code: 'cr2',
  name: 'By company, bias-reduced',
  definition:
    'Clustered by company, each company’s residuals corrected for its own pull on the fit under equal variances; t with Satterthwaite degrees of freedom of each slope.',
  source:
    'Bell & McCaffrey (2002), Survey Methodology 28, 169–181; Pustejovsky & Tipton (2018), Journal of Business & Economic Statistics 36, 672–683',
  reference: ['within_se.CR2_satterthwaite', 'twoway.CR2_satterthwaite'],
  degreesOfFreedom: 'satterthwaite',
  noVarianceReason: noCompanyVarianceReason,
  covariance: ({ fit, products }) => {
    const size = fit.slopes.length;
    const scores = new Float64Array(products.length * size);
    products.forEach(({ adjustment, score }, company) => {
      scores.set(timesVector(adjustment, score).subarray(fit.yearColumns), company * size);
    });
    return { matrix: slopeSandwich(fit, scoreProducts(scores, size)), notes: [] };
  },
};
