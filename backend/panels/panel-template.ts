import type { PanelTable } from './panel-table';
import type { NotedTable } from './table-workbook';

/** Headers of an empty panel, each with what its column holds. */
const columns = [
  ['company', 'The name of the company, spelled the same in every row.'],
  ['fiscal_year', 'The fiscal year as four digits; one row a company and year.'],
  ['market_value', 'Value of all shares on the market at the end of the fiscal year.'],
  ['capex', 'Capital expenditure of the fiscal year, as a positive number.'],
  ['book_equity', 'Book value of equity at the end of the fiscal year; may be negative.'],
  [
    'industry',
    'What the company makes, to choose peers by; the same in each of its rows, or empty.',
  ],
  ['country', 'Where the company has its seat, likewise.'],
] as const;

const advice = [
  [
    'Amounts',
    'All in one currency and one unit, which you say when you bring the file in. Leave a cell empty where a figure is missing: nothing is filled in for you.',
  ],
  [
    'Further columns',
    'Add columns to the right as you need them: numbers for further figures, or text that describes the company.',
  ],
] as const;

const noRows: PanelTable['parts'] = {
  async *[Symbol.asyncIterator]() {
    // Nothing to give.
  },
};

/** An empty panel to fill in. */
export const panelTemplate: NotedTable = {
  name: 'Panel',
  table: { headers: columns.map(([header]) => header), parts: noRows },
  notes: { name: 'Columns', lines: [...columns, ...advice] },
  createdAt: new Date(Date.UTC(2026, 0, 1)),
};
