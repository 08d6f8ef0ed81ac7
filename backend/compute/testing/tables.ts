import type { FileRecipe } from '../file-recipe';
import type { Table } from '../parsing/table';

/** A table as of a CSV file whose header is line 1. */
export function tableOf(header: readonly string[], ...rows: readonly string[][]): Table {
  return {
    header,
    repeatedHeaders: [],
    rows,
    lines: rows.map((_, index) => index + 2),
    delimiter: ',',
  };
}

export const plainHeader = ['company', 'year', 'mv', 'capex', 'be'];

/** A recipe for `plainHeader` that mends and converts nothing; euros in units. */
export const plainRecipe: FileRecipe = {
  company: 'company',
  year: 'year',
  marketValue: 'mv',
  capex: 'capex',
  bookEquity: 'be',
  others: [],
  attributes: [],
  currency: 'EUR',
  unit: 'units',
  reading: { sheet: null, headerRow: 1, layout: { kind: 'long' }, decimalSign: 'as-found' },
  conversion: {
    columns: [],
    currencies: null,
    prices: null,
    fiscalYears: { rule: 'year-of-end', usualEndMonth: 12, companies: [] },
  },
  mending: { cells: [], excludedRows: [], renames: [] },
};
