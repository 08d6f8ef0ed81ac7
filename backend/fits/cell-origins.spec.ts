import type { FileRecipe } from '../compute/file-recipe';
import { cellOrigins, type PanelCell } from './cell-origins';

const recipe: FileRecipe = {
  ...{ company: 'company', year: 'year', marketValue: 'value', capex: 'capex', bookEquity: 'book' },
  ...{ others: ['staff'], attributes: [], currency: 'EUR', unit: 'millions' },
  reading: { sheet: null, headerRow: 1, layout: { kind: 'long' }, decimalSign: 'as-found' },
  conversion: {
    columns: [{ column: 'capex', unit: 'thousands', measure: null }],
    currencies: {
      column: 'currency',
      rates: [{ currency: 'CHF', year: 2020, average: 0.9, yearEnd: 0.95 }],
    },
    prices: {
      baseYear: 2021,
      index: [
        { year: 2020, value: 100 },
        { year: 2021, value: 105 },
      ],
    },
    fiscalYears: { rule: 'year-of-end', usualEndMonth: 12, companies: [] },
  },
  mending: { cells: [], excludedRows: [], renames: [] },
};

const cell: PanelCell = {
  ...{ company: 'A', year: 2020, column: 0, value: 7, currency: 'CHF', fileRow: 2 },
};
const [marketValue, capex, staff] = [0, 1, 3];
const priceIndex = { year: 100, baseYear: 2021, base: 105 };

describe('how a cell came to be', () => {
  const originOf = cellOrigins(recipe, []);
  const conversionOf = (place: Partial<PanelCell>) =>
    originOf({ ...cell, ...place })?.conversion ?? null;

  it('names the rate of a stock at the year end and of a flow over the year, with unit and prices', () => {
    expect(conversionOf({ column: marketValue })).toEqual({
      ...{ currency: 'CHF', rate: 0.95, rateKind: 'year-end', unit: null, priceIndex },
    });
    expect(conversionOf({ column: capex })).toEqual({
      ...{ currency: 'CHF', rate: 0.9, rateKind: 'average', unit: 'thousands', priceIndex },
    });
  });

  it('is nothing to tell where nothing was converted', () => {
    expect(conversionOf({ column: staff })).toBeNull();
    expect(conversionOf({ column: marketValue, year: 2021, currency: 'EUR' })).toBeNull();
    expect(conversionOf({ value: null })).toBeNull();
    expect(conversionOf({ fileRow: 0 })).toBeNull();
    expect(cellOrigins(null, [])(cell)).toBeNull();
  });

  it('is a correction while the cell holds what the correction made of it', () => {
    const corrected = {
      ...{ company: 'A', year: 2020, columnIndex: 0, reason: 'Misread', source: 'Report' },
      ...{ createdAt: new Date(0), createdByName: 'Ilvo Brenn', before: 6, value: 7 },
    };
    const found = cellOrigins(recipe, [corrected]);
    expect(found(cell)).toEqual({ corrected, conversion: null });
    expect(found({ ...cell, value: 8 })?.corrected).toBeNull();
    expect(found({ ...cell, year: 2021 })?.corrected ?? null).toBeNull();
  });
});
