export * from './company-lines-layout';
export * from './company-multiples-layout';
export type { CompanySeries, MultiplesLine, MultiplesPoint } from './company-multiples-lines';
export * from './company-plane-layout';
export * from './coverage-map-layout';
export {
  type CoverageCell,
  type CoverageData,
  type CoverageEntry,
  type CoverageState,
  type CoverageTable,
  coverageTable,
} from './coverage-map-table';
export * from './difference-bars-layout';
export * from './expected-path-layout';
export type { EndLabel } from './expected-path-labels';
export * from './figure-types';
export * from './gap-path-layout';
export * from './interval-rows-layout';
export * from './leave-one-out-layout';
export { diamondPath, planMarkPath } from './mark-paths';
export * from './number-text';
export * from './number-writer';
export * from './plan-fan-layout';
export type { PlaneAxisWords } from './plane-axis';
export * from './residual-groups-layout';
export * from './residual-scatter-layout';
export * from './sensitivity-layout';
export * from './sentence-text';
export * from './slope-intervals-layout';
export * from './standing-chart-layout';
export { sumsAsShown } from './sums-as-shown';
export { wrappedWords } from './text-width';
