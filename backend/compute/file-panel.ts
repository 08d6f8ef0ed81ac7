import { type FileRecipe, panelColumns } from './file-recipe';
import type { FilePanel } from './parse-messages';
import { textIndices } from './parsing/column-indices';
import { FindingList } from './parsing/finding-list';
import { isMissing } from '../panel-data/numbers/missing-cell';
import { panelOfTable, type TablePanel } from './parsing/panel-of-table';
import type { Table } from './parsing/table';

/**
 * The rows that a file becomes; the answer to `read`. Companies stand in the order of their first appearance, rows in
 * the order of the file. What the check finds to be blocking is NaN here.
 *
 * @throws {TableError} 'missing-column' or 'ambiguous-column' with the headers concerned.
 */
export function filePanel(table: Table, recipe: FileRecipe): FilePanel {
  const panel = panelOfTable(table, recipe, new FindingList(0));
  const { companies, company, year, fileRow, values, currency } = panel;
  return {
    companies,
    company,
    year,
    columns: panelColumns(recipe),
    values,
    fileRow,
    currency,
    attributes: attributesOf(panel, recipe.attributes),
  };
}

/** The last text of each kind that is given for a company, in the order of the file. */
function attributesOf(
  { companies, company, tableRow, mended: { table } }: TablePanel,
  headers: readonly string[],
): Record<string, string>[] {
  const attributes = companies.map((): Record<string, string> => ({}));
  const indices = textIndices(table, headers);
  company.forEach((code, row) => {
    const cells = table.rows[tableRow[row]];
    indices.forEach((index, k) => {
      if (!isMissing(cells[index])) attributes[code][headers[k]] = cells[index].trim();
    });
  });
  return attributes;
}
