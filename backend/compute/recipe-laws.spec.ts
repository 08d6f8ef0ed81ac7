import * as fc from 'fast-check';
import { panelDifferences } from '../panel-data';
import { filePanel } from './file-panel';
import type { FileRecipe } from './file-recipe';
import { FindingList } from './parsing/finding-list';
import { mendTable } from './parsing/mending/mend-table';
import { type DecimalSign, parseNumber } from '../panel-data/numbers/parse-number';
import type { Table } from './parsing/table';
import { plainHeader, plainRecipe, tableOf } from './testing/tables';

const header = [...plainHeader, 'cur'];
const names = ['Nordwerk', 'Nordwerk AG', 'Tallow', 'Pell'];
const name = fc.constantFrom(...names);
const year = fc.integer({ min: 1990, max: 2030 });
const figure = fc.oneof(fc.double({ noNaN: true, noDefaultInfinity: true }), fc.constant(null));

/** Tables whose figures are written with all their digits, as the language prints them. */
const tables: fc.Arbitrary<Table> = fc
  .array(fc.tuple(name, year, figure, figure, figure), { maxLength: 30 })
  .map((rows) =>
    tableOf(
      header,
      ...rows.map(([company, inYear, ...figures]) => [
        company,
        String(inYear),
        ...figures.map((value) => (value === null ? '' : String(value))),
        'USD',
      ]),
    ),
  );
const mendings = fc.record({
  cells: fc.array(
    fc.record({
      row: fc.integer({ min: 1, max: 35 }),
      column: fc.constantFrom(...header, 'gone'),
      text: fc.constantFrom('', '7', 'x', 'Tallow', '2001'),
    }),
    { maxLength: 8 },
  ),
  excludedRows: fc.array(fc.integer({ min: 1, max: 35 }), { maxLength: 8 }),
  renames: fc.array(fc.record({ from: name, to: name }), { maxLength: 6 }),
});
/** All numbers here have a decimal point. */
const reading = { ...plainRecipe.reading, decimalSign: '.' } as const;
const recipe: FileRecipe = { ...plainRecipe, reading };

describe('the laws of a recipe', () => {
  it('factors of 1 leave every figure as it is, to the last bit', () => {
    const years = Array.from({ length: 41 }, (_, index) => 1990 + index);
    const ones: FileRecipe = {
      ...recipe,
      unit: 'millions',
      conversion: {
        ...recipe.conversion,
        columns: plainHeader
          .slice(2)
          .map((column) => ({ column, unit: 'millions', measure: null })),
        currencies: {
          column: 'cur',
          rates: years.map((ofYear) => ({
            currency: 'USD',
            year: ofYear,
            average: 1,
            yearEnd: 1,
          })),
        },
        prices: { baseYear: 2000, index: years.map((ofYear) => ({ year: ofYear, value: 97.3 })) },
      },
    };
    fc.assert(
      fc.property(tables, (table) => {
        expect(filePanel(table, ones).values).toEqual(filePanel(table, recipe).values);
      }),
    );
  });

  it('figures come out as they were printed', () => {
    fc.assert(
      fc.property(tables, (table) => {
        const { values } = filePanel(table, recipe);
        const printed = values.map((column) =>
          Array.from(column, (value) => (Number.isNaN(value) ? '' : value)),
        );
        const expected = [2, 3, 4].map((column) =>
          table.rows.map((cells) => (cells[column] === '' ? '' : Number(cells[column]))),
        );
        expect(printed).toEqual(expected);
      }),
    );
  });

  it('mending twice is mending once', () => {
    fc.assert(
      fc.property(tables, mendings, (table, mending) => {
        const once = mendTable(table, mending, new FindingList());
        const twice = mendTable(once.table, mending, new FindingList());
        expect(twice.table).toEqual(once.table);
        const named = { ...recipe, mending: { ...recipe.mending, renames: mending.renames } };
        const renamed = (from: Table): Table => {
          const { companies, company } = filePanel(from, named);
          const rows = from.rows.map(([, ...cells], row) => [companies[company[row]], ...cells]);
          return { ...from, rows };
        };
        expect(renamed(renamed(table))).toEqual(renamed(table));
      }),
    );
  });

  it('mending leaves the table that it mends', () => {
    fc.assert(
      fc.property(tables, mendings, (table, mending) => {
        const before = structuredClone(table);
        filePanel(table, { ...recipe, mending });
        expect(table).toEqual(before);
      }),
    );
  });

  it('renames never lose a row', () => {
    fc.assert(
      fc.property(tables, mendings, (table, { renames }) => {
        const mending = { ...recipe.mending, renames };
        const panel = filePanel(table, { ...recipe, mending });
        const without = filePanel(table, recipe);
        expect(panel.fileRow).toEqual(without.fileRow);
        expect(panel.year).toEqual(without.year);
        expect(panel.values).toEqual(without.values);
      }),
    );
  });

  it('a panel differs from itself in nothing, and from another by as much as that one from it', () => {
    const none = { addedRows: 0, removedRows: 0, changedCells: 0, listed: [] };
    fc.assert(
      fc.property(tables, tables, (left, right) => {
        const [one, other] = [filePanel(left, recipe), filePanel(right, recipe)];
        expect(panelDifferences(one, one, 500)).toEqual(none);
        const there = panelDifferences(one, other, 500);
        const back = panelDifferences(other, one, 500);
        expect(back.addedRows).toBe(there.removedRows);
        expect(back.removedRows).toBe(there.addedRows);
        expect(back.changedCells).toBe(there.changedCells);
      }),
    );
  });
});

describe('numbers printed in the ways of several countries', () => {
  const decimals = fc.integer({ min: 0, max: 9_999_999_999 }).map((cents) => cents / 100);
  const ways: readonly (readonly [string, DecimalSign])[] = [
    ['en-GB', '.'],
    ['de-DE', ','],
    ['de-CH', '.'],
    ['de-AT', ','],
    ['fr-FR', ','],
    ['sv-SE', ','],
    ['es-ES', ','],
  ];
  for (const [locale, decimalSign] of ways) {
    it(`are read back as they were: ${locale}`, () => {
      const options = { minimumFractionDigits: 2 };
      const plain = new Intl.NumberFormat(locale, options);
      const percent = new Intl.NumberFormat(locale, { style: 'percent', maximumFractionDigits: 4 });
      const money = new Intl.NumberFormat(locale, { style: 'currency', currency: 'EUR' });
      const coded = new Intl.NumberFormat(locale, {
        style: 'currency',
        currency: 'SEK',
        currencyDisplay: 'code',
      });
      const bracketed = new Intl.NumberFormat(locale, {
        style: 'currency',
        currency: 'EUR',
        currencySign: 'accounting',
      });
      fc.assert(
        fc.property(decimals, fc.boolean(), (amount, isNegative) => {
          const value = isNegative ? -amount : amount;
          for (const form of [plain, money, coded, bracketed]) {
            const text = form.format(value);
            expect(parseNumber(text, decimalSign)).withContext(text).toBe(value);
          }
          const share = Number(`${value}e-4`);
          const text = percent.format(share);
          expect(parseNumber(text, decimalSign)).withContext(text).toBe(share);
        }),
      );
    });
  }
});
