export { canonicalFitText } from './canonical-fit-text';
export { tQuantile } from './distributions/t-distribution';
export { engineVersion } from './engine-version';
export { fitPanel } from './fit-panel';
export { type FitOptions, type FitRequest, openFit } from './open-fit';
export type * from './fit-result';
export { type RowPlace, StatsError, type StatsErrorCode, type StatsErrorData } from './stats-error';
