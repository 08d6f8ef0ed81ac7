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
  const row = data.company.findIndex(
    (code, index) => data.year[index] === year && data.companies[code] === company,
  );
  if (row === -1) return null;
  const values = data.regressors.map((column) => column.values[row]);
  const isReadable = values.every((value) => (form === 'log' ? value > 0 : !Number.isNaN(value)));
  return isReadable ? values : null;
}
