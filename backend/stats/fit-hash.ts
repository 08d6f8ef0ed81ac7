import { canonicalFitText } from './canonical-fit-text';
import { checkSpecification } from './check-specification';
import type { FitRequest } from './fit-parts';
import type { FitOptions } from './open-fit';
import { selectSample } from './panel/select-sample';

/**
 * The digest that the fit of a request would have, without fitting.
 *
 * @throws {StatsError} where the request has no sample that could be fitted; what only fitting shows is not looked at.
 */
export function fitHash(request: FitRequest, { sha256 }: Pick<FitOptions, 'sha256'>): string {
  const { data, specification, own, members } = request;
  checkSpecification(specification);
  return sha256(canonicalFitText(selectSample(data, own, members, specification), request));
}
