import type { ColumnRole } from '@contract';

/** What each regressor of a fit is: capex comes first, book equity second, further ones after them. */
export function rolesByOrder(regressors: readonly string[]): readonly ColumnRole[] {
  const first: readonly ColumnRole[] = ['capex', 'bookEquity'];
  return regressors.map((_, index) => first[index] ?? 'other');
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
