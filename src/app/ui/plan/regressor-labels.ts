import type { ColumnRole } from '@contract';
import type { FigureKind } from '../number-format';

const moneyRoles: readonly ColumnRole[] = ['capex', 'bookEquity'];

/** What each regressor of a fit is: capex comes first, book equity second, further ones after them. */
export function rolesByOrder(regressors: readonly string[]): readonly ColumnRole[] {
  return regressors.map((_, index) => moneyRoles[index] ?? 'other');
}

/** How a regressor's amounts are written: capex and book equity are money, a further one is a number of its own unit. */
export function regressorKind(index: number): FigureKind {
  return index < moneyRoles.length ? 'money' : 'plain';
}

/** The regressors in words: capex and book equity by what they are, others by their name in the panel. */
export function regressorLabels(
  regressors: readonly string[],
  roles: readonly ColumnRole[] = rolesByOrder(regressors),
): readonly string[] {
  return regressors.map((name, index) => {
    if (roles[index] === 'capex') return 'capex';
    return roles[index] === 'bookEquity' ? 'book equity' : name;
  });
}
