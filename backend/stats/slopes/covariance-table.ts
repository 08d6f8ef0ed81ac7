import type { SlopeCovarianceName } from '../fit-result';
import type { CovarianceMethod } from './covariance-method';
import { classical } from './covariances/classical';
import { cr0 } from './covariances/cr0';
import { cr1 } from './covariances/cr1';
import { cr2 } from './covariances/cr2';
import { driscollKraay } from './covariances/driscoll-kraay';
import { hc0 } from './covariances/hc0';
import { hc1 } from './covariances/hc1';
import { hc2 } from './covariances/hc2';
import { hc3 } from './covariances/hc3';
import { twoWay } from './covariances/two-way';
import { wild } from './covariances/wild';

/** Every covariance of the slopes that a specification can name, in the order of screens and exports. */
export const covarianceTable = {
  cr2,
  wild,
  cr1,
  cr0,
  classical,
  hc0,
  hc1,
  hc2,
  hc3,
  'two-way': twoWay,
  'driscoll-kraay': driscollKraay,
} satisfies Readonly<Record<SlopeCovarianceName, CovarianceMethod>>;

/** The one that a specification has unless it names another. */
export const defaultCovariance: SlopeCovarianceName = 'cr2';
