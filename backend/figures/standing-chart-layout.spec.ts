import type { FigureFormats, IntervalFigure } from './figure-types';
import { standingChartLayout } from './standing-chart-layout';

const formats: FigureFormats = {
  value: (value) => value.toFixed(0),
  bounds: ({ low, high }) =>
    low === null || high === null ? 'no interval' : `${low.toFixed(0)} to ${high.toFixed(0)}`,
  tick: (value) => value.toFixed(0),
};

function company(name: string, estimate: number, half: number | null = 100) {
  const bounds =
    half === null ? { low: null, high: null } : { low: estimate - half, high: estimate + half };
  return { company: name, estimate, ...bounds } satisfies IntervalFigure & { company: string };
}

const three = {
  intercepts: [company('Ostrell', 900), company('Velmara', 2970), company('Kestrane', -900)],
  ownCompany: 'Velmara',
  meanOfPeers: 0,
};

describe('standing chart layout', () => {
  it('sorts by estimate, highest first, and knows the own company', () => {
    const { rows } = standingChartLayout(three, 800, formats);
    expect(rows.map((row) => row.company)).toEqual(['Velmara', 'Ostrell', 'Kestrane']);
    expect(rows.map((row) => row.isOwn)).toEqual([true, false, false]);
    expect(rows[0].y).toBeLessThan(rows[1].y);
  });

  it('places marks, intervals, zero and the mean on one scale', () => {
    const { rows, zeroX, mean, ticks } = standingChartLayout(three, 800, formats);
    const perUnit = (rows[0].x - rows[1].x) / (2970 - 900);
    expect(zeroX).toBeCloseTo(rows[1].x - 900 * perUnit, 6);
    expect(mean?.x).toBeCloseTo(zeroX, 6);
    expect(rows[0].interval?.to).toBeCloseTo(rows[0].x + 100 * perUnit, 6);
    expect(ticks.find((tick) => tick.value === 0)?.position).toBeCloseTo(zeroX, 6);
  });

  it('says how many peers the mean is of', () => {
    expect(standingChartLayout(three, 800, formats).mean?.label.text).toBe('mean of the 2 peers');
  });

  it('stands empty without companies', () => {
    const empty = { intercepts: [], ownCompany: 'Velmara', meanOfPeers: null };
    const layout = standingChartLayout(empty, 800, formats);
    expect(layout.rows).toEqual([]);
    expect(layout.mean).toBeNull();
    expect(Number.isFinite(layout.zeroX)).toBeTrue();
  });

  it('gives one company, and companies all equal, a finite place inside the plot', () => {
    for (const intercepts of [
      [company('Velmara', 5, null)],
      [company('Velmara', 0, null), company('Ostrell', 0, null)],
    ]) {
      const layout = standingChartLayout({ ...three, intercepts, meanOfPeers: null }, 800, formats);
      for (const row of layout.rows) {
        expect(row.x).toBeGreaterThanOrEqual(layout.plot.left);
        expect(row.x).toBeLessThanOrEqual(layout.plot.right);
      }
    }
  });

  it('draws no interval where there is none, and says so', () => {
    const intercepts = [company('Velmara', 5, null), company('Ostrell', 3)];
    const [own] = standingChartLayout({ ...three, intercepts }, 800, formats).rows;
    expect(own.interval).toBeNull();
    expect(own.bounds).toBe('no interval');
  });

  it('keeps 120 companies under 900 pixels, with only the own one labelled', () => {
    const intercepts = Array.from({ length: 120 }, (_, k) => company(`Company ${k}`, k * 10));
    const layout = standingChartLayout(
      { intercepts, ownCompany: 'Company 40', meanOfPeers: 595 },
      800,
      formats,
    );
    expect(layout.height).toBeLessThan(900);
    expect(layout.rows.filter((row) => row.isLabelled).map((row) => row.company)).toEqual([
      'Company 40',
    ]);
    expect(layout.markRadius * 2).toBeLessThan(layout.rowHeight);
  });

  it('gives up the interval column first and the value column next as room gets short', () => {
    const wide = standingChartLayout(three, 800, formats);
    const medium = standingChartLayout(three, 400, formats);
    const narrow = standingChartLayout(three, 320, formats);
    expect([wide.valueX, wide.boundsX].every((x) => x !== null)).toBeTrue();
    expect(medium.valueX).not.toBeNull();
    expect(medium.boundsX).toBeNull();
    expect(narrow.valueX).toBeNull();
    expect(narrow.plot.right - narrow.plot.left).toBeGreaterThan(180);
  });

  it('keeps all columns inside the width', () => {
    const { boundsX, valueX, plot, width } = standingChartLayout(three, 800, formats);
    expect(boundsX).toBeLessThanOrEqual(width);
    expect(valueX).toBeLessThan(boundsX ?? 0);
    expect(plot.right).toBeLessThan(valueX ?? 0);
  });
});
