import type { Specification } from '../../backend/stats';

/** How one setting of the report makes its panels. */
export interface Setting {
  readonly name: string;
  /** Replication r draws from the generator seeded with `seed` + r. */
  readonly seed: number;
  readonly companies: number;
  readonly years: number;
  readonly regressors: 1 | 2;
  readonly persistence: Persistence;
  /** 'skewed': the largest company is about 20 times the smallest. */
  readonly sizes: 'equal' | 'skewed';
  /** 'each': every company in turn, replication by replication. */
  readonly own: 'each' | 'first' | 'largest' | 'smallest';
  /** Half the variance of errors, or of errors and regressors, is the same for all companies in a year. */
  readonly commonShock: 'none' | 'errors' | 'errors and regressors';
  readonly rows: 'all' | 'one in five missing' | LastOwnRows;
  /** Of the fit; with year effects nothing is planned, for the effects of years to come are not known. */
  readonly effects: Specification['effects'];
  /** Whether the wild bootstrap is tried too. */
  readonly hasWild: boolean;
}

/** The own company has its last rows alone, its peers all. */
export type LastOwnRows =
  'last 3 of the own' | 'last 5 of the own' | 'last 10 of the own' | 'last 14 of the own';

/** First-order autocorrelation of a company's errors and regressors. */
export type Persistence =
  | { readonly kind: 'like'; readonly rho: number }
  /** Drawn for each company from a uniform distribution. */
  | { readonly kind: 'varied'; readonly from: number; readonly to: number }
  | { readonly kind: 'own apart'; readonly own: number; readonly peers: number };

/** Seeds of two settings lie so far apart: more replications than this would draw the same numbers twice. */
export const mostReplications = 100_000;
