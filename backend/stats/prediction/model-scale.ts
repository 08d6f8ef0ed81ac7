import type { PredictionBasis } from './prediction-basis';

/**
 * Planned values as the model reads them: logs in log form.
 *
 * @param regressors  in the order of `basis.regressors` and the panel's measure.
 * @throws {RangeError} where `unreadableReason` gives one.
 */
export function inModelScale(
  basis: PredictionBasis,
  regressors: readonly number[],
): readonly number[] {
  const reason = unreadableReason(basis, regressors);
  if (reason !== undefined) throw new RangeError(reason);
  return basis.form === 'log' ? regressors.map(Math.log) : regressors;
}

/** Values of the model's scale in the panel's measure. */
export function inPanelMeasure(
  basis: PredictionBasis,
  values: readonly number[],
): readonly number[] {
  return basis.form === 'log' ? values.map(Math.exp) : values;
}

/** Why the model cannot read these values; undefined where it can. */
export function unreadableReason(
  basis: PredictionBasis,
  regressors: readonly number[],
): string | undefined {
  const size = basis.regressors.length;
  if (regressors.length !== size) {
    return `Expected ${size} values, for ${basis.regressors.join(', ')}; found ${regressors.length}.`;
  }
  const missing = basis.regressors.filter((_, k) => !Number.isFinite(regressors[k]));
  if (missing.length > 0) return `No value is given for ${missing.join(', ')}.`;
  if (basis.form !== 'log') return undefined;
  const odd = basis.regressors.filter((_, k) => !(regressors[k] > 0));
  if (odd.length === 0) return undefined;
  return `The log form needs values above zero; ${odd.join(', ')} ${odd.length === 1 ? 'is' : 'are'} not.`;
}
