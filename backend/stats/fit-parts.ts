import type { FitResult, PanelColumns, Specification } from './fit-result';
import type { IntervalContext } from './intervals/interval-context';
import type { PanelSample } from './panel/panel-sample';
import type { PooledFit } from './regression/pooled-fit';
import type { WithinFit } from './regression/within-fit';
import type { SlopeGround } from './slopes/slope-ground';
import type { SlopeInference } from './slopes/slope-inference';

/** What is to be fitted. */
export interface FitRequest {
  readonly data: PanelColumns;
  readonly specification: Specification;
  /** The own company; null for a fit without a standing. */
  readonly own: string | null;
  /** Names of the peer group, the own company is added; undefined means every company of the panel. */
  readonly members: readonly string[] | undefined;
}

/** A fit with everything it was made from: its result and its evidence are read off it. */
export interface OpenFit extends FitParts {
  readonly result: FitResult;
}

export interface FitParts extends FitRequest {
  readonly hash: string;
  readonly sample: PanelSample;
  readonly fit: WithinFit;
  readonly pooled: PooledFit;
  readonly ground: SlopeGround;
  readonly context: IntervalContext;
  /** Index of the own company among the sample's; −1 without one of two rows or more. */
  readonly ownIndex: number;
  readonly inference: SlopeInference;
  readonly withoutCompany: FitResult['withoutCompany'];
}
