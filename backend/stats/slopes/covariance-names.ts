import type { SlopeCovarianceName } from '../fit-result';
import { covarianceTable } from './covariance-table';

/** Every covariance of the slopes that a specification can name, the default first. */
export const covarianceNames = Object.keys(covarianceTable) as readonly SlopeCovarianceName[];
