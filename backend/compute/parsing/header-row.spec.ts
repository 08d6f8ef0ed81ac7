import { findHeaderRow } from './header-row';

function headerIn(...lines: readonly string[]): number | undefined {
  const rows = lines.map((line) => line.split(','));
  return findHeaderRow({ rows, lines: rows.map((_, row) => row + 1) });
}

describe('the header row', () => {
  it('is the first where a table begins at once', () => {
    expect(headerIn('Company,Year,Capex', 'Alder,2020,1', 'Birch,2020,2')).toBe(0);
  });

  it('stands below titles, notes and dates', () => {
    const titles = ['Peers of 2023,,', 'Prepared on,2023-05-01,', 'in EUR m,,'];
    expect(headerIn(...titles, 'Company,Year,Capex', 'Alder,2020,1')).toBe(3);
  });

  it('holds years in columns', () => {
    expect(headerIn('Market value,,,', 'Company,2019,2020,2021', 'Alder,1,2,3')).toBe(1);
  });

  it('is not the row of blocks above years', () => {
    const blocks = ',Market value,,,Capex,,';
    expect(headerIn(blocks, 'Company,2019,2020,2021,2019,2020,2021', 'Alder,1,2,3,4,5,6')).toBe(1);
  });

  it('may stand above rows that have gaps', () => {
    expect(headerIn('Company,Year,Capex', 'Alder,,', 'Birch,NA,NA', 'Cedar,2020,1')).toBe(0);
  });

  it('is not known where no row has numbers under it', () => {
    expect(headerIn('a,b,c', 'd,e,f')).toBeUndefined();
    expect(headerIn('1,2,3', '4,5,6')).toBeUndefined();
    expect(headerIn('a,b,c')).toBeUndefined();
  });
});
