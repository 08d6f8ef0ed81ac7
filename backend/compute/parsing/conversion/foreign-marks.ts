import { currencyMark, isPercent, mayStandFor } from '../../../panel-data/numbers/currency-mark';
import type { FileRecipe } from '../../file-recipe';
import { type CellRemark, findingAt, type FindingList } from '../finding-list';
import type { PanelReading } from '../read-panel';
import type { Table } from '../table';
import { moneyColumns } from './money-columns';

const code = /^[A-Z]{3}$/u;
/** Most cells: nothing stands at the number. */
const plainNumber = /^[-\d.,\s]*$/u;

/**
 * Finds every figure with a sign or code of another currency than its row's, or the panel's where rows have none, and
 * every share in per cent in a column of money. Such a figure is not taken for what the column holds: it becomes NaN.
 * A sign that several currencies share passes where it may be the right one.
 *
 * @param reading  as read from `table` for the recipe's columns; its numbers are changed in place.
 */
export function findForeignMarks(
  table: Table,
  { tableRow, numbers }: PanelReading,
  recipe: FileRecipe,
  findings: FindingList,
): void {
  const { currencies } = recipe.conversion;
  const currencyIndex = currencies === null ? null : table.header.indexOf(currencies.column);
  const known = new Map<string, boolean>();
  const passes = (mark: string, currency: string): boolean => {
    const key = `${mark} ${currency}`;
    const isKnown = known.get(key) ?? mayStandFor(mark, currency);
    known.set(key, isKnown);
    return isKnown;
  };
  moneyColumns(recipe).forEach(({ measure }, k) => {
    const { name, values } = numbers[k];
    const column = table.header.indexOf(name);
    for (let row = 0; row < values.length; row++) {
      if (Number.isNaN(values[row])) continue;
      const cells = table.rows[tableRow[row]];
      const text = cells[column];
      if (plainNumber.test(text) || table.isNumber?.(tableRow[row], column) === true) continue;
      const currency = currencyIndex === null ? recipe.currency : cells[currencyIndex].trim();
      const mark = currencyMark(text);
      // What is no code is found where the row's currency is read.
      const isForeign = mark !== null && code.test(currency) && !passes(mark, currency);
      const remark = isForeign
        ? otherCurrency(mark, currency, currencyIndex === null)
        : measure !== 'no-money' && isPercent(text)
          ? shareOfMoney
          : null;
      if (remark === null) continue;
      findings.add(findingAt(table, tableRow[row], column, remark));
      values[row] = NaN;
    }
  });
}

function otherCurrency(mark: string, currency: string, isOfPanel: boolean): CellRemark {
  return {
    code: 'other-currency',
    detail: `Found ${mark} in a ${isOfPanel ? 'column' : 'row'} of ${currency}: say what it is. Write the figure in ${currency} without ${mark}, or leave the line out.`,
    isBlocking: true,
  };
}

const shareOfMoney: CellRemark = {
  code: 'not-a-number',
  detail: 'Expected an amount of money; found a share in per cent.',
  isBlocking: true,
};
