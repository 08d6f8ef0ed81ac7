export * from './coverage-window';
export * from './distance/company-measures';
export * from './distance/peer-distances';
export type { Scatter } from './distance/scatter';
export type { Flag, FlagCode, FlagFacts } from './flags/flag';
export { flagCodes, flagsOf } from './flags/flags-of';
export * from './panel-cells';
export * from './panel-differences';
