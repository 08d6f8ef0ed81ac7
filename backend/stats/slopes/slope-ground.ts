import type { WithinFit } from '../regression/within-fit';
import type { CompanyProduct } from './company-products';

/** What every covariance of the slopes is computed from: one factorisation of the demeaned design. */
export interface SlopeGround {
  readonly fit: WithinFit;
  /** One a company, P × P. */
  readonly products: readonly CompanyProduct[];
}
