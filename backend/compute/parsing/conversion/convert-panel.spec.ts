import type { Conversion, FileRecipe } from '../../file-recipe';
import { plainHeader, plainRecipe, tableOf } from '../../testing/tables';
import { FindingList } from '../finding-list';
import { panelOfTable, type TablePanel } from '../panel-of-table';
import type { TableFinding } from '../table-finding';

/** All expected figures can be worked out by hand from the numbers beside them. */
function convert(
  rows: readonly string[][],
  conversion: Partial<Conversion>,
  others: Partial<FileRecipe> = {},
  header = [...plainHeader, 'cur', 'staff', 'debt'],
): TablePanel & { readonly findings: readonly TableFinding[] } {
  const findings = new FindingList();
  const recipe: FileRecipe = {
    ...plainRecipe,
    ...others,
    conversion: { ...plainRecipe.conversion, ...conversion },
  };
  const panel = panelOfTable(tableOf(header, ...rows), recipe, findings);
  return { ...panel, findings: findings.first() };
}

function columns({ values }: TablePanel): number[][] {
  return values.map((column) => [...column]);
}

describe('units', () => {
  const rows = [['A', '2020', '1500', '2.5', '0.3', 'EUR', '7', '40']];

  it('are those of the panel unless a column has its own', () => {
    expect(columns(convert(rows, {}, { unit: 'millions' }))).toEqual([[1500], [2.5], [0.3]]);
    const own = [
      { column: 'mv', unit: 'thousands', measure: null },
      { column: 'capex', unit: 'billions', measure: null },
      { column: 'be', unit: 'millions', measure: null },
    ] as const;
    expect(columns(convert(rows, { columns: own }, { unit: 'millions' }))).toEqual([
      [1.5],
      [2500],
      [0.3],
    ]);
  });

  it('turn 0.3 million into exactly 300 000 and 9 into exactly 0.009 thousand', () => {
    const own = [
      { column: 'mv', unit: 'millions', measure: null },
      { column: 'capex', unit: 'units', measure: null },
    ] as const;
    const small = [['A', '2020', '0.3', '9', '1', 'EUR', '7', '40']];
    expect(columns(convert(small, { columns: own }))[0]).toEqual([300_000]);
    expect(columns(convert(small, { columns: own }, { unit: 'thousands' }))[1]).toEqual([0.009]);
  });

  it('are for money only: a further column has one where it is said to be a flow or a stock', () => {
    const own = [
      { column: 'staff', unit: 'thousands', measure: 'no-money' },
      { column: 'debt', unit: 'thousands', measure: 'stock' },
    ] as const;
    const panel = convert(rows, { columns: own }, { others: ['staff', 'debt'] });
    expect(columns(panel).slice(3)).toEqual([[7], [40_000]]);
    const unsaid = [{ column: 'staff', unit: 'thousands', measure: null }] as const;
    expect(columns(convert(rows, { columns: unsaid }, { others: ['staff'] }))[3]).toEqual([7]);
  });
});

describe('a figure that no number can hold once it is converted', () => {
  it('is found where it stands', () => {
    const own = [{ column: 'mv', unit: 'billions', measure: null }] as const;
    const rows = [['A', '2020', '-1e300', '2', '3', 'EUR', '7', '40']];
    const panel = convert(rows, { columns: own });
    expect(columns(panel)[0]).toEqual([NaN]);
    expect(
      panel.findings.map(({ row, column, code, isBlocking }) => [row, column, code, isBlocking]),
    ).toEqual([[2, 'mv', 'not-a-number', true]]);
  });
});

describe('currencies by row', () => {
  const rates = [
    { currency: 'USD', year: 2020, average: 0.5, yearEnd: 0.25 },
    { currency: 'USD', year: 2021, average: 2, yearEnd: null },
  ];
  const currencies = { column: 'cur', rates };

  it('take capex at the average rate, market value and book equity at the year-end one', () => {
    const rows = [
      ['A', '2020', '8', '8', '16', 'USD', '1', '1'],
      ['B', '2020', '8', '8', '16', 'EUR', '1', '1'],
    ];
    const panel = convert(rows, { currencies });
    expect(columns(panel)).toEqual([
      [2, 8],
      [4, 8],
      [4, 16],
    ]);
    expect(panel.currency).toEqual(['USD', 'EUR']);
    expect(panel.findings).toEqual([]);
    expect(panel.missingRates).toEqual([]);
  });

  it('convert a further column by what it measures', () => {
    const own = [
      { column: 'staff', unit: null, measure: 'flow' },
      { column: 'debt', unit: null, measure: 'stock' },
    ] as const;
    const rows = [['A', '2020', '8', '8', '16', 'USD', '8', '8']];
    const others = ['staff', 'debt'];
    expect(columns(convert(rows, { currencies }, { others })).slice(3)).toEqual([[8], [8]]);
    const panel = convert(rows, { currencies, columns: own }, { others });
    expect(columns(panel).slice(3)).toEqual([[4], [2]]);
  });

  it('take the rates of the calendar year that the fiscal year counts as', () => {
    const fiscalYears = {
      rule: 'year-of-most-months',
      usualEndMonth: 12,
      companies: [],
    } as const;
    const rows = [['A', '31.03.2021', '8', '8', '16', 'USD', '1', '1']];
    expect(columns(convert(rows, { currencies, fiscalYears }))).toEqual([[2], [4], [4]]);
  });

  it('find a missing rate once a currency and year, with how many figures want it', () => {
    const rows = [
      ['A', '2021', '8', '8', '16', 'USD', '1', '1'],
      ['B', '2021', '8', '8', '', 'USD', '1', '1'],
      ['A', '2022', '', '8', '', 'USD', '1', '1'],
      ['B', '2022', '1', '', '', 'CHF', '1', '1'],
    ];
    const panel = convert(rows, { currencies });
    const found = panel.findings.filter(({ code }) => code === 'no-rate');
    expect(
      found.map(({ row, column, found: text, detail }) => [row, column, text, detail]),
    ).toEqual([
      [2, 'cur', 'USD', 'USD needs a year-end rate (3 figures) for 2021.'],
      [4, 'cur', 'USD', 'USD needs an average rate (1 figure) for 2022.'],
      [5, 'cur', 'CHF', 'CHF needs a year-end rate (1 figure) for 2022.'],
    ]);
    expect(found.every(({ isBlocking }) => isBlocking)).toBeTrue();
    expect(panel.missingRates).toEqual([
      { currency: 'CHF', years: [2022] },
      { currency: 'USD', years: [2021, 2022] },
    ]);
    expect(columns(panel)[1]).toEqual([16, 16, NaN, NaN]);
    expect(columns(panel)[0]).toEqual([NaN, NaN, NaN, NaN]);
  });

  it('find what is no code, but not where a row has no money', () => {
    const rows = [
      ['A', '2020', '8', '8', '16', '$', '1', '1'],
      ['B', '2020', '8', '8', '16', 'GBp', '1', '1'],
      ['C', '2020', '8', '8', '16', '', '1', '1'],
      ['D', '2020', '', '', '', '', '1', '1'],
      ['E', '2020', '8', '8', '16', ' EUR ', '1', '1'],
    ];
    const panel = convert(rows, { currencies });
    const found = panel.findings.filter(({ code }) => code === 'currency');
    expect(found.map(({ row, found: text, isBlocking }) => [row, text, isBlocking])).toEqual([
      [2, '$', true],
      [3, 'GBp', true],
      [4, '', true],
    ]);
    expect(columns(panel)[0]).toEqual([NaN, NaN, NaN, NaN, 8]);
  });

  it('know a code that the rates name though the standard does not', () => {
    const named = [{ currency: 'QQQ', year: 2020, average: 2, yearEnd: 4 }];
    const rows = [['A', '2020', '1', '1', '1', 'QQQ', '1', '1']];
    const panel = convert(rows, { currencies: { column: 'cur', rates: named } });
    expect(columns(panel)).toEqual([[4], [2], [4]]);
    expect(panel.findings).toEqual([]);
  });
});

describe('real terms', () => {
  const index = [
    { year: 2019, value: 80 },
    { year: 2020, value: 100 },
    { year: 2021, value: 125 },
  ];

  it('multiply money by index of the base year over that of its own', () => {
    const rows = [
      ['A', '2019', '8', '16', '40', 'EUR', '5', '1'],
      ['A', '2020', '8', '16', '40', 'EUR', '5', '1'],
      ['A', '2021', '8', '16', '40', 'EUR', '5', '1'],
    ];
    const panel = convert(rows, { prices: { baseYear: 2020, index } }, { others: ['staff'] });
    // 100/80 = 1.25, 100/100 = 1, 100/125 = 0.8
    const expected = [
      [10, 8, 6.4],
      [20, 16, 12.8],
      [50, 40, 32],
      [5, 5, 5],
    ];
    columns(panel).forEach((column, k) => {
      column.forEach((value, row) => {
        expect(value).toBeCloseTo(expected[k][row], 12);
      });
    });
    expect(panel.findings).toEqual([]);
  });

  it('find each year whose money has no index, once', () => {
    const rows = [
      ['A', '2022', '', '', '', 'EUR', '5', '1'],
      ['A', '2023', '8', '', '', 'EUR', '5', '1'],
      ['B', '2023', '8', '', '', 'EUR', '5', '1'],
      ['B', '2020', '8', '', '', 'EUR', '5', '1'],
    ];
    const panel = convert(rows, { prices: { baseYear: 2020, index } });
    const found = panel.findings.filter(({ code }) => code === 'no-price-index');
    expect(found.map(({ row, column, found: text }) => [row, column, text])).toEqual([
      [3, 'year', '2023'],
    ]);
    expect(found[0].isBlocking).toBeTrue();
    expect(columns(panel)[0]).toEqual([NaN, NaN, NaN, 8]);
  });

  it('find the base year where it has none', () => {
    const rows = [['A', '2020', '8', '', '', 'EUR', '5', '1']];
    const panel = convert(rows, { prices: { baseYear: 2015, index } });
    const [found] = panel.findings.filter(({ code }) => code === 'no-price-index');
    expect(found.detail).toBe('Real terms need a price index for 2015.');
  });
});

describe('all conversions together', () => {
  it('go by unit, then rate, then prices', () => {
    const panel = convert(
      [['A', '2021', '1000', '3000', '4000', 'USD', '1', '1']],
      {
        columns: [{ column: 'mv', unit: 'units', measure: null }],
        currencies: {
          column: 'cur',
          rates: [{ currency: 'USD', year: 2021, average: 2, yearEnd: 4 }],
        },
        prices: {
          baseYear: 2020,
          index: [
            { year: 2020, value: 1 },
            { year: 2021, value: 2 },
          ],
        },
      },
      { unit: 'thousands' },
    );
    // 1000 units = 1 thousand, times 4, times 1/2; 3000 times 2, times 1/2; 4000 times 4, times 1/2.
    expect(columns(panel)).toEqual([[2], [3000], [8000]]);
  });
});
