import type { PanelColumns, Specification } from './fit-result';

/**
 * The regressors of one company's year as the panel has them, not lagged; null where there is no such row, or one of them
 * is missing or, in log form, not above zero.
 */
export function heldValues(
  { data, form }: { readonly data: PanelColumns; readonly form: Specification['form'] },
  company: string,
  year: number,
): readonly number[] | null {
  for (let row = 0; row < data.year.length; row += 1) {
    if (data.year[row] !== year || data.companies[data.company[row]] !== company) continue;
    const values = data.regressors.map((column) => column.values[row]);
    const isReadable = values.every((value) => (form === 'log' ? value > 0 : !Number.isNaN(value)));
    return isReadable ? values : null;
  }
  return null;
}
