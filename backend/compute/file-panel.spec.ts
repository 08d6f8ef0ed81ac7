import { filePanel } from './file-panel';
import { plainHeader, plainRecipe, tableOf } from './testing/tables';

describe('filePanel', () => {
  it('holds rows in the order of the file, companies by first appearance, and the last attribute given', () => {
    const table = tableOf(
      [...plainHeader, 'industry', 'country', 'cur'],
      ['B', '2021', '1', '2', '3', 'Mills', '', 'EUR'],
      ['A ', '2020', '4', '', '6', 'Rail', 'AT', 'EUR'],
      ['', '2020', '4', '5', '6', 'none', 'none', 'EUR'],
      ['B', '2020', '7', '8', '9', 'Milling ', '-', 'USD'],
    );
    const rates = [{ currency: 'USD', year: 2020, average: 2, yearEnd: 3 }];
    const panel = filePanel(table, {
      ...plainRecipe,
      attributes: ['industry', 'country'],
      conversion: { ...plainRecipe.conversion, currencies: { column: 'cur', rates } },
    });
    expect(panel).toEqual({
      companies: ['B', 'A'],
      company: Int32Array.of(0, 1, 0),
      year: Int32Array.of(2021, 2020, 2020),
      columns: [
        { name: 'mv', role: 'marketValue' },
        { name: 'capex', role: 'capex' },
        { name: 'be', role: 'bookEquity' },
      ],
      values: [Float64Array.of(1, 4, 21), Float64Array.of(2, NaN, 16), Float64Array.of(3, 6, 27)],
      fileRow: Int32Array.of(2, 3, 5),
      currency: ['EUR', 'EUR', 'USD'],
      attributes: [{ industry: 'Milling' }, { industry: 'Rail', country: 'AT' }],
    });
  });

  it('has no currencies by row where the file has none', () => {
    const panel = filePanel(tableOf(plainHeader, ['A', '2020', '1', '2', '3']), plainRecipe);
    expect(panel.currency).toBeNull();
    expect(panel.attributes).toEqual([{}]);
  });
});
