import { type CoverageFrame, type CoverageSpan, coverageMapLayout } from './coverage-map-layout';
import { type CoverageCell, type CoverageData, coverageTable } from './coverage-map-table';

const variables = ['market value', 'capex', 'book equity'];
const cells: CoverageCell[] = [
  { company: 'Ardwyne', year: 2020, missing: [] },
  { company: 'Ardwyne', year: 2022, missing: ['capex'] },
  { company: 'Velmara', year: 2020, missing: variables },
  { company: 'Velmara', year: 2021, missing: [], flagged: ['capex'] },
];
const data = { cells, variables, variable: null, ownCompany: 'Velmara' };

interface Drawn extends CoverageData {
  readonly frame?: CoverageFrame;
  readonly shown?: CoverageSpan;
}

function laidOut({ frame, shown, ...table }: Drawn, width: number) {
  return coverageMapLayout(coverageTable(table), { width, frame, shown });
}

describe('coverage map layout', () => {
  it('puts the own company first and counts a year without a row as missing', () => {
    const { rows } = laidOut(data, 600);
    expect(rows.map((row) => row.company)).toEqual(['Velmara', 'Ardwyne']);
    expect(rows[0].cells.map((cell) => cell.state)).toEqual(['none', 'complete', 'none']);
    expect(rows[1].cells.map((cell) => cell.state)).toEqual(['complete', 'none', 'some']);
    expect(rows[0].cells[1].flagged).toEqual(['capex']);
  });

  it('judges by one variable where one is chosen', () => {
    const [, ardwyne] = laidOut({ ...data, variable: 'capex' }, 600).rows;
    expect(ardwyne.cells.map((cell) => cell.state)).toEqual(['complete', 'none', 'none']);
    const [ofCapex] = laidOut({ ...data, variable: 'capex' }, 600).rows;
    const [ofEquity] = laidOut({ ...data, variable: 'book equity' }, 600).rows;
    expect([ofCapex.cells[1].flagged, ofEquity.cells[1].flagged]).toEqual([['capex'], []]);
    const byEquity = laidOut({ ...data, variable: 'book equity' }, 600).rows[1];
    expect(byEquity.cells.map((cell) => cell.state)).toEqual(['complete', 'none', 'complete']);
  });

  it('flags what else is to be looked at in a row where no one variable is', () => {
    const named = { company: 'Ardwyne', year: 2020, missing: [], flagged: ['company name'] };
    const flagged = (variable: string | null) =>
      laidOut({ ...data, cells: [named], variable }, 600).rows[0].cells[0].flagged;
    expect(flagged(null)).toEqual(['company name']);
    expect(flagged('capex')).toEqual([]);
  });

  it('keeps cells usable for 120 companies and 30 years, wider than the container if need be', () => {
    const many = Array.from({ length: 120 * 30 }, (_, k) => ({
      company: `Company ${Math.floor(k / 30)}`,
      year: 1996 + (k % 30),
      missing: [],
    }));
    const layout = laidOut({ ...data, cells: many, ownCompany: null }, 360);
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
    const layout = laidOut({ ...data, cells: many, ownCompany: null, frame }, 600);
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
    expect(laidOut(data, 600).frame).toEqual([]);
  });

  it('stands without cells', () => {
    const layout = laidOut({ ...data, cells: [] }, 600);
    expect([layout.rows, layout.years]).toEqual([[], []]);
    expect(Number.isFinite(layout.height)).toBeTrue();
  });

  it('draws some of the companies where they are, at the head of a picture of their own', () => {
    const many = Array.from({ length: 8000 * 3 }, (_, k) => ({
      company: `Company ${String(Math.floor(k / 3)).padStart(4, '0')}`,
      year: 2020 + (k % 3),
      missing: k === 5002 * 3 ? ['capex'] : [],
    }));
    const frame = { firstYear: 2020, lastYear: 2022, companies: ['Company 5003', 'Company 0001'] };
    const shown = { first: 5000, end: 5040 };
    const layout = laidOut({ ...data, cells: many, ownCompany: null, frame, shown }, 600);
    const { top, cellHeight } = layout;
    expect(layout.rows.length).toBe(40);
    expect([layout.rows[0].company, layout.rows[0].y]).toEqual([
      'Company 5000',
      top + cellHeight / 2,
    ]);
    expect(layout.rows[2].cells.map(({ state }) => state)).toEqual([
      'some',
      'complete',
      'complete',
    ]);
    expect(layout.frame.map(({ y }) => y)).toEqual([top + 3 * cellHeight]);
    expect(layout.fullHeight - layout.height).toBe((8000 - 40) * cellHeight);
    expect(laidOut({ ...data, shown: { first: 1, end: 60 } }, 600).shown).toEqual({
      first: 1,
      end: 2,
    });
  });
});

describe('coverage table', () => {
  it('counts every company year of the span, with and without a row', () => {
    expect(coverageTable(data).counts).toEqual({ complete: 2, some: 1, none: 3, flagged: 1 });
    const ofCapex = coverageTable({ ...data, variable: 'capex' });
    expect(ofCapex.counts).toEqual({ complete: 2, some: 0, none: 4, flagged: 1 });
    expect(coverageTable({ ...data, variable: 'book equity' }).counts.flagged).toBe(0);
  });
});
