import type { FigureFormats } from './figure-types';
import { type ResidualGroupsData, residualGroupsLayout } from './residual-groups-layout';

const formats: FigureFormats = {
  value: (value) => value.toFixed(0),
  bounds: () => '',
  tick: (value) => value.toFixed(0),
};
const companies: ResidualGroupsData = {
  groups: [
    { label: 'Ostrell', count: 18, standardDeviation: 20, largest: -55 },
    { label: 'Velmara', count: 18, standardDeviation: 45, largest: 130 },
    { label: 'Kestrane', count: 1, standardDeviation: null, largest: 0 },
  ],
  ownCompany: 'Velmara',
  order: 'widest',
  most: 30,
};
const years: ResidualGroupsData = {
  groups: [
    { label: '2013', count: 14, mean: -12, standardDeviation: 20, largest: -55 },
    { label: '2014', count: 14, mean: 30, standardDeviation: 60, largest: 130 },
  ],
  ownCompany: null,
  order: 'given',
  most: 30,
};

describe('residual groups layout', () => {
  it('sorts companies by spread, one without spread last', () => {
    const { rows } = residualGroupsLayout(companies, 640, formats);
    expect(rows.map(({ label, isOwn }) => [label, isOwn])).toEqual([
      ['Velmara', true],
      ['Ostrell', false],
      ['Kestrane', false],
    ]);
    expect(rows[2].spread).toBeNull();
    expect(rows[2].deviation).toBe('n/a');
  });

  it('keeps years in their order and lays the spread around their mean', () => {
    const { rows, zeroX } = residualGroupsLayout(years, 640, formats);
    expect(rows.map(({ label }) => label)).toEqual(['2013', '2014']);
    expect(rows[0].x).toBeLessThan(zeroX);
    const perUnit = (rows[1].x - rows[0].x) / 42;
    expect(rows[1].spread!.to).toBeCloseTo(rows[1].x + 60 * perUnit, 6);
    expect(rows[1].largestX).toBeCloseTo(zeroX + 130 * perUnit, 6);
    expect(rows[1].figures).toEqual(['30', '60', '130']);
  });

  it('draws the 30 widest of 120 with the own company among them, and no more than fits a page', () => {
    const groups = Array.from({ length: 120 }, (_, k) => ({
      label: `Company ${k}`,
      count: 20,
      standardDeviation: 200 - k,
      largest: 300,
    }));
    const data = { ...companies, groups, ownCompany: 'Company 90' };
    const { rows, more, height } = residualGroupsLayout(data, 360, formats);
    expect(rows.length).toBe(30);
    expect(rows[28].label).toBe('Company 28');
    expect(rows[29].label).toBe('Company 90');
    expect(more?.text).toBe('90 more in the table');
    expect(height).toBeLessThan(720);
  });

  it('keeps columns inside the width and gives them up for the line under the chart', () => {
    const wide = residualGroupsLayout(companies, 640, formats);
    expect(wide.heads.map(({ text }) => text)).toEqual(['st. dev.', 'largest']);
    expect(wide.columnX.at(-1)).toBeLessThanOrEqual(640);
    expect(wide.readoutY).toBeNull();
    const narrow = residualGroupsLayout(companies, 300, formats);
    expect(narrow.columnX.at(-1)).toBeNull();
    expect(narrow.readoutY).toBeLessThan(narrow.height);
  });

  it('stands without groups, with one, and with spreads that are all 0', () => {
    expect(residualGroupsLayout({ ...companies, groups: [] }, 640, formats).rows).toEqual([]);
    const flat = { label: 'Velmara', count: 3, standardDeviation: 0, largest: 0 };
    for (const groups of [[flat], [flat, { ...flat, label: 'Ostrell' }]]) {
      const { rows, zeroX } = residualGroupsLayout({ ...companies, groups }, 640, formats);
      for (const { x, spread } of rows) {
        expect(x).toBe(zeroX);
        expect(spread).toEqual({ from: zeroX, to: zeroX });
      }
    }
  });
});
