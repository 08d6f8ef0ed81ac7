import type { FigureFormats } from './figure-types';
import { changeText, leaveOneOutLayout } from './leave-one-out-layout';

const formats: FigureFormats = {
  value: (value) => value.toFixed(0),
  bounds: ({ low, high }) =>
    low === null || high === null ? 'no interval' : `${low.toFixed(0)} to ${high.toFixed(0)}`,
  tick: (value) => value.toFixed(0),
};
const full = { estimate: 2100, low: 700, high: 3400 };
const data = {
  leftOut: [
    { name: 'Tolvane', estimate: 1500 },
    { name: 'Ostrell', estimate: 2350 },
    { name: 'Kestrane', estimate: null, reason: 'too few rows' },
  ],
  full,
  fullName: 'all 4 companies',
  most: 25,
};

describe('leave-one-out layout', () => {
  it('keeps the order it is given and puts dots, line and band on one scale', () => {
    const { rows, full: line } = leaveOneOutLayout(data, 640, formats);
    expect(rows.map(({ name }) => name)).toEqual(['Tolvane', 'Ostrell', 'Kestrane']);
    const perUnit = (rows[1].x! - rows[0].x!) / 850;
    expect(line.x).toBeCloseTo(rows[0].x! + 600 * perUnit, 6);
    expect(line.band!.from).toBeCloseTo(line.x - 1400 * perUnit, 6);
    expect(line.band!.to).toBeCloseTo(line.x + 1300 * perUnit, 6);
  });

  it('clips a reason in the place of its mark, and keeps it whole for who asks', () => {
    const reason = 'One company would be left, and nobody to compare it with.';
    const leftOut = [{ name: '2014', estimate: null, reason }, ...data.leftOut];
    const [row] = leaveOneOutLayout({ ...data, leftOut }, 320, formats).rows;
    expect(row.reason).toBe(reason);
    expect(row.reasonLabel).toMatch(/^One company .*…$/);
  });

  it('gives a change that rounds to zero no sign', () => {
    expect([0.4, -0.4, 0].map((change) => changeText(change, formats))).toEqual(['0', '0', '0']);
    expect([0.6, -0.6].map((change) => changeText(change, formats))).toEqual(['+1', '-1']);
  });

  it('writes the figure without each and how far that is from the full one', () => {
    const { rows, full: line } = leaveOneOutLayout(data, 640, formats);
    expect(rows.map(({ value, change }) => [value, change])).toEqual([
      ['1500', '-600'],
      ['2350', '+250'],
      ['', ''],
    ]);
    expect(line.label.text).toBe('all 4 companies 2100 (700 to 3400)');
  });

  it('gives a row without a figure its reason and no dot', () => {
    const { rows } = leaveOneOutLayout(data, 640, formats);
    expect(rows[2].x).toBeNull();
    expect(rows[2].reason).toBe('too few rows');
    expect(rows[0].reason).toBe('');
  });

  it('draws the 25 first of 119 and says how many are left to the table', () => {
    const leftOut = Array.from({ length: 119 }, (_, k) => ({
      name: `Company ${k}`,
      estimate: 2100 + 400 / (k + 1),
    }));
    const { rows, more, height } = leaveOneOutLayout({ ...data, leftOut }, 360, formats);
    expect(rows.length).toBe(25);
    expect(rows.at(-1)?.name).toBe('Company 24');
    expect(more?.text).toBe('94 more in the table');
    expect(more!.y).toBeLessThan(height);
    expect(leaveOneOutLayout(data, 640, formats).more).toBeNull();
  });

  it('shows zero only where it is in sight', () => {
    expect(leaveOneOutLayout(data, 640, formats).zeroX).toBeNull();
    const near = { ...data, full: { ...full, low: -100 } };
    expect(leaveOneOutLayout(near, 640, formats).zeroX).not.toBeNull();
  });

  it('keeps words inside the width, and writes figures under the chart where columns have no room', () => {
    for (const width of [360, 640, 1200]) {
      const chart = leaveOneOutLayout(data, width, formats);
      expect(chart.changeX === null).toBe(chart.readoutY !== null);
      expect(chart.plot.right).toBeLessThanOrEqual(width);
      expect(chart.full.label.x).toBeGreaterThan(60);
      expect(chart.full.label.x).toBeLessThan(width - 60);
    }
    expect(leaveOneOutLayout(data, 360, formats).readoutY).not.toBeNull();
  });

  it('stands with nothing left out, with one, with all equal and without an interval', () => {
    const open = { estimate: 5, low: null, high: null };
    expect(leaveOneOutLayout({ ...data, leftOut: [] }, 640, formats).rows).toEqual([]);
    for (const leftOut of [
      [{ name: '2014', estimate: 5 }],
      [
        { name: '2014', estimate: 5 },
        { name: '2015', estimate: 5 },
      ],
    ]) {
      const chart = leaveOneOutLayout({ ...data, leftOut, full: open }, 640, formats);
      expect(chart.full.band).toBeNull();
      for (const { x } of chart.rows) expect(x).toBeCloseTo(chart.full.x, 6);
      expect(chart.full.x).toBeGreaterThan(chart.plot.left);
      expect(chart.full.x).toBeLessThan(chart.plot.right);
    }
  });
});
