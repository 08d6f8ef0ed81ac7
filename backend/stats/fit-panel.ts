import type { FitResult, PanelColumns, Specification } from './fit-result';
import { type FitOptions, openFit } from './open-fit';

/**
 * Fits the company effects model and reads off all that is shown of it.
 *
 * @param own  the own company; null for a fit without a standing.
 * @param members  names of the peer group, the own company is added; undefined means every company of the panel.
 * @throws {StatsError} for input the engine refuses, with what is concerned.
 */
export function fitPanel(
  data: PanelColumns,
  specification: Specification,
  own: string | null,
  members: readonly string[] | undefined,
  options: FitOptions,
): FitResult {
  return openFit({ data, specification, own, members }, options).result;
}
