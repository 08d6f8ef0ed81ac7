import { type CoverageCell, coverageMapLayout } from './coverage-map-layout';

const variables = ['market value', 'capex', 'book equity'];
const cells: CoverageCell[] = [
  { company: 'Ardwyne', year: 2020, missing: [] },
  { company: 'Ardwyne', year: 2022, missing: ['capex'] },
  { company: 'Velmara', year: 2020, missing: variables },
  { company: 'Velmara', year: 2021, missing: [], flagged: ['capex'] },
];
const data = { cells, variables, variable: null, ownCompany: 'Velmara' };

describe('coverage map layout', () => {
  it('puts the own company first and counts a year without a row as missing', () => {
    const { rows } = coverageMapLayout(data, 600);
    expect(rows.map((row) => row.company)).toEqual(['Velmara', 'Ardwyne']);
    expect(rows[0].cells.map((cell) => cell.state)).toEqual(['none', 'complete', 'none']);
    expect(rows[1].cells.map((cell) => cell.state)).toEqual(['complete', 'none', 'some']);
    expect(rows[0].cells[1].flagged).toEqual(['capex']);
  });

  it('judges by one variable where one is chosen', () => {
    const [, ardwyne] = coverageMapLayout({ ...data, variable: 'capex' }, 600).rows;
    expect(ardwyne.cells.map((cell) => cell.state)).toEqual(['complete', 'none', 'none']);
    const [ofCapex] = coverageMapLayout({ ...data, variable: 'capex' }, 600).rows;
    const [ofEquity] = coverageMapLayout({ ...data, variable: 'book equity' }, 600).rows;
    expect([ofCapex.cells[1].flagged, ofEquity.cells[1].flagged]).toEqual([['capex'], []]);
    const byEquity = coverageMapLayout({ ...data, variable: 'book equity' }, 600).rows[1];
    expect(byEquity.cells.map((cell) => cell.state)).toEqual(['complete', 'none', 'complete']);
  });

  it('flags what else is to be looked at in a row where no one variable is', () => {
    const named = { company: 'Ardwyne', year: 2020, missing: [], flagged: ['company name'] };
    const flagged = (variable: string | null) =>
      coverageMapLayout({ ...data, cells: [named], variable }, 600).rows[0].cells[0].flagged;
    expect(flagged(null)).toEqual(['company name']);
    expect(flagged('capex')).toEqual([]);
  });

  it('keeps cells usable for 120 companies and 30 years, wider than the container if need be', () => {
    const many = Array.from({ length: 120 * 30 }, (_, k) => ({
      company: `Company ${Math.floor(k / 30)}`,
      year: 1996 + (k % 30),
      missing: [],
    }));
    const layout = coverageMapLayout({ ...data, cells: many, ownCompany: null }, 360);
    expect(layout.rows.length).toBe(120);
    expect(layout.cellWidth).toBeGreaterThanOrEqual(18);
    expect(layout.width).toBeGreaterThan(360);
    expect(layout.years.at(-1)?.label).toBe('2025');
  });

  it('draws one outline around each run of companies that stand together in the frame', () => {
    const many = ['Brovik', 'Dunmar', 'Eskel', 'Ardwyne'].flatMap((company) =>
      [2020, 2021, 2022].map((year) => ({ company, year, missing: [] })),
    );
    const frame = { firstYear: 2021, lastYear: 2022, companies: ['Ardwyne', 'Eskel', 'Dunmar'] };
    const layout = coverageMapLayout({ ...data, cells: many, ownCompany: null, frame }, 600);
    const { left, top, cellWidth, cellHeight } = layout;
    expect(layout.frame).toEqual([
      { x: left + cellWidth, y: top, width: 2 * cellWidth, height: cellHeight },
      {
        x: left + cellWidth,
        y: top + 2 * cellHeight,
        width: 2 * cellWidth,
        height: 2 * cellHeight,
      },
    ]);
    expect(coverageMapLayout(data, 600).frame).toEqual([]);
  });

  it('stands without cells', () => {
    const layout = coverageMapLayout({ ...data, cells: [] }, 600);
    expect([layout.rows, layout.years]).toEqual([[], []]);
    expect(Number.isFinite(layout.height)).toBeTrue();
  });
});
