import { canonicalFitText } from './canonical-fit-text';
import { checkSpecification } from './check-specification';
import type { FitParts, FitRequest, OpenFit } from './fit-parts';
import { fitResultOf } from './fit-result-of';
import { intervalContext } from './intervals/interval-context';
import { selectSample } from './panel/select-sample';
import { pooledFit } from './regression/pooled-fit';
import { withinFit } from './regression/within-fit';
import { companyProducts } from './slopes/company-products';
import type { SlopeGround } from './slopes/slope-ground';
import { slopeInference } from './slopes/slope-inference';
import { withoutEachCompany } from './slopes/without-company';

/** What a fit needs from its surroundings. */
export interface FitOptions {
  /** SHA-256 of a text's UTF-8 bytes, in hex. */
  readonly sha256: (text: string) => string;
  /** Told the share done, 0 to 1, at each step. */
  readonly onProgress?: (share: number) => void;
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
  const hash = sha256(canonicalFitText(sample, request));
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
