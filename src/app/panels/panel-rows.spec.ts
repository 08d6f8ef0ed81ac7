import { small } from './editing/testing/desk-panels';
import { panelRows } from './panel-rows';

describe('rows of a panel', () => {
  it('has a row for each company and year, its figures in the order of the columns', () => {
    const rows = panelRows(small);
    expect(rows.length).toBe(4);
    expect(rows[1]).toEqual({ fileRow: 3, company: 'Sarvane', year: 2011, values: [110, 11, 55] });
  });

  it('gives the same rows for the same version, so that nothing is made anew from them', () => {
    expect(panelRows(small)).toBe(panelRows(small));
    expect(panelRows({ ...small })).not.toBe(panelRows(small));
  });
});
