import type { PredictionBasis } from '@prediction';

/** A prediction basis of two regressors, made up of round figures: 2 for capex, −0.5 for book equity. */
export const planBasis: PredictionBasis = {
  company: 'Velmara',
  regressors: ['capex', 'book_equity'],
  coefficients: [3000, 2, -0.5],
  ownLevel: 2700,
  ownMeans: [100, 1000],
  years: 12,
  lambdas: [
    [20, 1, 0.1],
    [-15, 0.5, -0.1],
    [10, -1, 0.05],
  ],
  a: [
    [1, 0, 0],
    [0, 0.01, 0],
    [0, 0, 0.0001],
  ],
  d: [
    [0.1, 0, 0],
    [0, 0.001, 0],
    [0, 0, 0.00001],
  ],
  quantile: 3.182446305284263,
  confidence: 0.95,
  slopeCovariance: [
    [0.04, 0],
    [0, 0.0025],
  ],
  slopeDegreesOfFreedom: { kind: 'fixed', value: 10 },
  last: {
    year: 2025,
    fileRow: 19,
    actual: 2750,
    fitted: 2720,
    residual: 30,
    regressors: [110, 1000],
  },
  inverseCrossProduct: [
    [0.0001, 0],
    [0, 0.000001],
  ],
  residualVariance: 400,
  // Leverage is (Δcapex/100)² + (Δequity/1000)²: the own company went 50 away from its mean, a peer 100.
  largestOwnLeverage: 0.25,
  largestLeverage: 1,
  ownRange: [
    { low: 60, high: 150 },
    { low: 800, high: 1200 },
  ],
  peerRange: [
    { low: 20, high: 300 },
    { low: 400, high: 2000 },
  ],
};

/** The same company in logs: 0.4 % for 1 % more capex, 0.2 % for 1 % more book equity; figures made up. */
export const logBasis: PredictionBasis = {
  ...planBasis,
  form: 'log',
  smear: 1.02,
  coefficients: [4, 0.4, 0.2],
  ownLevel: Math.log(2700),
  ownMeans: [Math.log(100), Math.log(1000)],
  lambdas: [
    [0.01, 0.001, 0.001],
    [-0.008, 0.001, -0.001],
    [0.005, -0.001, 0.001],
  ],
  slopeCovariance: [
    [0.0025, 0],
    [0, 0.0004],
  ],
  inverseCrossProduct: [
    [1, 0],
    [0, 1],
  ],
  residualVariance: 0.01,
  held: [110, 1000],
};

/** The plain one with regressors of the year before. */
export const lagBasis: PredictionBasis = { ...planBasis, lag: 1, held: [110, 1000] };

/** t(10) at 2.5 %, the only quantile that the basis asks for at 95 %. */
export function quantileOfTen(): number {
  return -2.2281388519649385;
}
