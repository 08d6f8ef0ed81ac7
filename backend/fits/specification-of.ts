import type { PanelVersionRow } from '../../db/repositories/panels-repository';
import { Invalid } from '../errors/app-error';
import type { Specification } from '../stats';
import type { StoredSpecification } from './fit-view';

export interface AskedSpecification extends Omit<Specification, 'seed'> {
  /** Of the wild bootstrap, 1 where it is not named; the other covariances draw nothing. */
  readonly seed?: number | undefined;
  readonly furtherRegressors: readonly string[];
}

/**
 * What is asked for in the columns of a panel.
 *
 * @param at  JSON pointer to the specification within the request.
 * @throws {Invalid} for a column that the panel does not have.
 */
export function specificationOf(
  asked: AskedSpecification,
  version: PanelVersionRow,
  at = '',
): StoredSpecification {
  const named = (role: string): string =>
    version.columns.find((column) => column.role === role)?.name ?? '';
  const others = version.columns.filter((column) => column.role === 'other');
  const errors = asked.furtherRegressors.flatMap((name, index) =>
    others.some((column) => column.name === name)
      ? []
      : [
          {
            pointer: `${at}/furtherRegressors/${index}`,
            detail: `expected a further column of the panel; found “${name}”`,
          },
        ],
  );
  if (errors.length > 0) throw new Invalid('The specification does not fit the panel.', errors);
  return {
    effects: asked.effects,
    form: asked.form,
    lag: asked.lag,
    slopes: asked.slopes,
    confidence: asked.confidence,
    seed: asked.slopes === 'wild' ? (asked.seed ?? 1) : null,
    outcome: named('marketValue'),
    regressors: [named('capex'), named('bookEquity'), ...new Set(asked.furtherRegressors)],
  };
}
