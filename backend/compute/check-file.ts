import { panelDifferences } from '../panel-data';
import { type FileRecipe, numericColumns, panelColumns } from './file-recipe';
import type { FileCheck, PanelBlock } from './parse-messages';
import { FindingList } from './parsing/finding-list';
import { findFormulas } from './parsing/formula-findings';
import { panelOfTable, type TablePanel } from './parsing/panel-of-table';
import { reviewRows } from './parsing/review-rows';
import { similarCompanies } from './parsing/spelling/similar-companies';
import { findSpellings } from './parsing/spelling/spelling-findings';
import { findSums } from './parsing/sum-findings';
import type { Table } from './parsing/table';

const mostFindings = 500;
const mostChanges = 500;
const mostSpellings = 500;
const firstRowCount = 20;

/**
 * What a panel made of a file would hold, what stands in its way and what it would change; the answer to `check`.
 *
 * @param current  the newest version of the panel that this would become the next of.
 * @throws {TableError} 'missing-column' or 'ambiguous-column' with the headers concerned.
 */
export function checkFile(
  file: { readonly table: Table; readonly formulaCells: number },
  recipe: FileRecipe,
  current: PanelBlock | null,
): FileCheck {
  const findings = new FindingList(mostFindings);
  const panel = panelOfTable(file.table, recipe, findings);
  const { table } = panel.mended;
  const similar = similarCompanies(panel, current?.companies);
  const companyIndex = table.header.indexOf(recipe.company);
  findSums(table, panel, companyIndex, findings);
  findSpellings(table, panel, companyIndex, similar, findings);
  if (file.formulaCells > 0) findFormulas(table, mappedHeaders(recipe), findings);
  const listed = findings.first();
  return {
    ...countsOf(panel),
    leftOutRows: file.table.rows.length - panel.year.length,
    findings: listed,
    findingCount: findings.count,
    blockingCount: findings.blockingCount,
    reviewRows: reviewRows(panel, recipe.mending, listed),
    spellings: similar
      .slice(0, mostSpellings)
      .map(({ names }) => names.map(({ company, rows }) => ({ company, rows }))),
    missingRates: panel.missingRates,
    formulaCells: file.formulaCells,
    firstRows: firstRows(panel),
    changes:
      current &&
      panelDifferences(current, { ...panel, columns: panelColumns(recipe) }, mostChanges),
  };
}

function countsOf(
  panel: TablePanel,
): Pick<FileCheck, 'companies' | 'years' | 'firstYear' | 'lastYear' | 'rows' | 'completeRows'> {
  const years = [...new Set(panel.year)].sort((left, right) => left - right);
  const rows = panel.year.length;
  let completeRows = 0;
  for (let row = 0; row < rows; row++) {
    if (panel.values.every((column) => !Number.isNaN(column[row]))) completeRows += 1;
  }
  return {
    companies: panel.companies.length,
    years: years.length,
    firstYear: years[0] ?? null,
    lastYear: years[years.length - 1] ?? null,
    rows,
    completeRows,
  };
}

function firstRows(panel: TablePanel): FileCheck['firstRows'] {
  return Array.from(panel.year.subarray(0, firstRowCount), (year, row) => ({
    row: panel.fileRow[row],
    company: panel.companies[panel.company[row]],
    year,
    values: panel.values.map((column) => (Number.isNaN(column[row]) ? null : column[row])),
  }));
}

/** Headers of all columns that the panel is made of. */
function mappedHeaders(recipe: FileRecipe): readonly string[] {
  const { currencies } = recipe.conversion;
  const texts = currencies === null ? [] : [currencies.column];
  return [
    ...new Set([
      recipe.company,
      recipe.year,
      ...numericColumns(recipe),
      ...recipe.attributes,
      ...texts,
    ]),
  ];
}
