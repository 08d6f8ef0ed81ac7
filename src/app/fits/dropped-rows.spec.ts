import { droppedRows } from './dropped-rows';

const cell = (company: string, year: number, column: string, row = 4) =>
  ({ company, year, row, column, reason: 'missing' }) as const;

describe('the rows that dropped out', () => {
  it('are company-years, each with all that it lacks, though they share a line or have none', () => {
    const cells = [
      cell('Kesdrin', 2016, 'market_value'),
      cell('Kesdrin', 2017, 'capex'),
      cell('Kesdrin', 2016, 'capex'),
      cell('Velmara', 2017, 'capex', 0),
      cell('Sarvane', 2017, 'capex', 0),
    ];
    expect(droppedRows(cells, 'market_value', 0)).toEqual([
      {
        name: 'Kesdrin FY2016',
        address: { company: 'Kesdrin', year: 2016 },
        missing: 'market_value and capex',
      },
      { name: 'Kesdrin FY2017', address: { company: 'Kesdrin', year: 2017 }, missing: 'capex' },
      { name: 'Velmara FY2017', address: { company: 'Velmara', year: 2017 }, missing: 'capex' },
      { name: 'Sarvane FY2017', address: { company: 'Sarvane', year: 2017 }, missing: 'capex' },
    ]);
  });

  it('of a lagged model lack regressors of the year before, but the market value of their own year', () => {
    const cells = [cell('Kesdrin', 2016, 'market_value'), cell('Kesdrin', 2016, 'capex')];
    expect(droppedRows(cells, 'market_value', 1)[0].missing).toBe(
      'market_value and capex of the year before',
    );
  });

  it('are lines of the file in results that name no company and year', () => {
    const cells = ['market_value', 'capex'].map((column) => ({
      ...{ row: 94, column, reason: 'missing' as const },
    }));
    expect(droppedRows(cells, 'market_value', 0)).toEqual([
      { name: 'Row 94', address: { row: 94 }, missing: 'market_value and capex' },
    ]);
  });
});
