import type { FileRecipe } from '../../file-recipe';
import type { FileCheck } from '../../parse-messages';
import { type CellRemark, findingAt, type FindingList } from '../finding-list';
import type { PanelReading } from '../read-panel';
import type { Table } from '../table';
import { applyRates } from './apply-rates';
import { changeUnit } from './change-unit';
import { findLackingIndices, findLackingRates, missingRates } from './conversion-findings';
import { type MoneyColumn, moneyColumns } from './money-columns';
import { toRealTerms } from './real-terms';
import { type RowCurrencies, rowCurrencies } from './row-currencies';

/** Figures in the panel's own terms. */
export interface ConvertedPanel {
  /** values[column][placed row], columns in the order of `numericColumns`. */
  readonly values: readonly Float64Array[];
  /** Currency of each placed row in the file; null where the file has none by row. */
  readonly currency: readonly string[] | null;
  readonly missingRates: FileCheck['missingRates'];
}

/**
 * Converts the money of a panel, in this order and with one rounding a step: the column's unit into the panel's, the
 * row's currency by the rate of its calendar year, that year's prices into the base year's. A factor of 1 leaves a
 * figure as it is, to the last bit.
 *
 * @param reading  as read from `table` for the recipe's columns; its numbers are changed in place.
 * @param findings  is told of currencies that cannot be read and of rates and price indices that are not there.
 */
export function convertPanel(
  table: Table,
  reading: PanelReading,
  recipe: FileRecipe,
  findings: FindingList,
): ConvertedPanel {
  const columns = moneyColumns(recipe);
  const values = reading.numbers.map((column) => column.values);
  columns.forEach(({ powerOfTen }, k) => {
    changeUnit(values[k], powerOfTen);
  });
  const currencies = currenciesOf(table, reading, recipe, columns, findings);
  const lackingRates = currencies === null ? [] : applyRates(values, columns, currencies);
  const { prices } = recipe.conversion;
  if (prices !== null) {
    const lacking = toRealTerms(values, columns, reading.year, prices);
    const column = table.header.indexOf(recipe.year);
    findLackingIndices(table, reading.tableRow, column, lacking, findings);
  }
  if (recipe.conversion.currencies !== null) {
    const column = table.header.indexOf(recipe.conversion.currencies.column);
    findLackingRates(table, column, lackingRates, findings);
  }
  findTooLarge(table, reading, findings);
  return {
    values,
    currency: currencies?.texts ?? null,
    missingRates: missingRates(lackingRates),
  };
}

/** A figure beyond the largest double becomes NaN and is found. */
function findTooLarge(
  table: Table,
  { numbers, tableRow }: PanelReading,
  findings: FindingList,
): void {
  for (const { name, values } of numbers) {
    for (let row = 0; row < values.length; row++) {
      if (Math.abs(values[row]) !== Infinity) continue;
      const column = table.header.indexOf(name);
      findings.add(findingAt(table, tableRow[row], column, tooLarge));
      values[row] = NaN;
    }
  }
}

const tooLarge: CellRemark = {
  code: 'not-a-number',
  detail: 'Converted into the panel’s currency and unit this is too large for a number.',
  isBlocking: true,
};

function currenciesOf(
  table: Table,
  reading: PanelReading,
  recipe: FileRecipe,
  columns: readonly MoneyColumn[],
  findings: FindingList,
): RowCurrencies | null {
  const { currencies } = recipe.conversion;
  if (currencies === null) return null;
  const money = reading.numbers.filter((_, k) => columns[k].measure !== 'no-money');
  const { tableRow, year } = reading;
  const hasMoney = (row: number): boolean => money.some(({ values }) => !Number.isNaN(values[row]));
  return rowCurrencies(
    table,
    { tableRow, year, hasMoney },
    table.header.indexOf(currencies.column),
    { own: recipe.currency, rates: currencies.rates },
    findings,
  );
}
