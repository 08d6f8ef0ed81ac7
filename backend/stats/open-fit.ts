import { canonicalFitText } from './canonical-fit-text';
import { checkSpecification } from './check-specification';
import type { FitResult, PanelColumns, Specification } from './fit-result';
import { fitResultOf } from './fit-result-of';
import { type IntervalContext, intervalContext } from './intervals/interval-context';
import type { PanelSample } from './panel/panel-sample';
import { selectSample } from './panel/select-sample';
import { type PooledFit, pooledFit } from './regression/pooled-fit';
import { type WithinFit, withinFit } from './regression/within-fit';
import { companyProducts } from './slopes/company-products';
import type { SlopeGround } from './slopes/slope-ground';
import { type SlopeInference, slopeInference } from './slopes/slope-inference';
import { withoutEachCompany } from './slopes/without-company';

/** What is to be fitted. */
export interface FitRequest {
  readonly data: PanelColumns;
  readonly specification: Specification;
  /** The own company; null for a fit without a standing. */
  readonly own: string | null;
  /** Names of the peer group, the own company is added; undefined means every company of the panel. */
  readonly members: readonly string[] | undefined;
}

/** What a fit needs from its surroundings. */
export interface FitOptions {
  /** SHA-256 of a text's UTF-8 bytes, in hex. */
  readonly sha256: (text: string) => string;
  /** Told the share done, 0 to 1, at each step. */
  readonly onProgress?: (share: number) => void;
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

/**
 * Fits the company effects model and keeps what it was made from.
 *
 * @throws {StatsError} for input the engine refuses, with what is concerned.
 */
export function openFit(
  request: FitRequest,
  { sha256, onProgress = () => undefined }: FitOptions,
): OpenFit {
  const { data, specification, own, members } = request;
  checkSpecification(specification);
  const sample = selectSample(data, own, members, specification);
  const hash = sha256(canonicalFitText(sample, specification, own));
  onProgress(0.2);
  const fit = withinFit(sample, specification.effects);
  const pooled = pooledFit(fit);
  onProgress(0.3);
  const products = companyProducts(fit);
  const ground: SlopeGround = { fit, products };
  const ownIndex = own === null ? -1 : sample.companies.indexOf(own);
  const withoutCompany = withoutEachCompany(fit, products, ownIndex);
  const context = intervalContext(fit, specification.confidence);
  onProgress(0.5);
  const inference = slopeInference(ground, specification.slopes, {
    confidence: specification.confidence,
    seed: specification.seed,
    onProgress: (share) => {
      onProgress(0.5 + 0.4 * share);
    },
  });
  onProgress(0.9);
  const parts: FitParts = {
    ...request,
    hash,
    sample,
    fit,
    pooled,
    ground,
    context,
    ownIndex,
    inference,
    withoutCompany,
  };
  const result = fitResultOf(parts);
  onProgress(1);
  return { ...parts, result };
}
