import { differenceBarsLayout } from './difference-bars-layout';
import type { FigureFormats, IntervalFigure } from './figure-types';
import { slopeIntervalsLayout } from './slope-intervals-layout';

const formats: FigureFormats = {
  value: (value) => value.toFixed(2),
  bounds: ({ low, high }) =>
    low === null || high === null ? 'no interval' : `${low.toFixed(2)} to ${high.toFixed(2)}`,
  tick: (value) => value.toFixed(0),
};
const none = { low: null, high: null };

describe('slope intervals layout', () => {
  const format = (slope: IntervalFigure) => ({
    value: formats.value(slope.estimate),
    bounds: formats.bounds(slope),
  });
  const capex = { name: '1 more of capex', estimate: 1.84, low: 0.92, high: 2.76 };
  const equity = { name: '1 more of book equity', estimate: -0.31, low: -0.66, high: 0.04 };

  it('puts slopes of like size on one scale, with one zero', () => {
    const { rows, isOneScale } = slopeIntervalsLayout([capex, equity], 330, format);
    expect(isOneScale).toBeTrue();
    expect(rows[0].zeroX).toBe(rows[1].zeroX);
    expect(rows[0].x).toBeGreaterThan(rows[0].zeroX);
    expect(rows[1].x).toBeLessThan(rows[1].zeroX);
  });

  it('gives slopes of very unlike size a scale each', () => {
    const staff = { name: '1 more of staff', estimate: 300, low: 100, high: 500 };
    const { rows, isOneScale } = slopeIntervalsLayout([equity, staff], 330, format);
    expect(isOneScale).toBeFalse();
    expect(rows[0].interval!.to - rows[0].interval!.from).toBeGreaterThan(60);
  });

  it('runs an interval with an open end to the edge of the chart', () => {
    const open = { ...capex, high: null, unbounded: 'high' as const };
    const [row] = slopeIntervalsLayout([open], 330, format).rows;
    expect(row.interval?.from).toBeLessThan(row.x);
    expect(row.interval?.to).toBe(324);
    const bare = { ...capex, low: null, high: null, unbounded: 'both' as const };
    expect(slopeIntervalsLayout([bare], 330, format).rows[0].interval).toBeNull();
  });

  it('folds the figures under a name that leaves no room for them', () => {
    const long = { ...capex, name: '1 more of property, plant and equipment' };
    const { rows } = slopeIntervalsLayout([capex, long], 330, format);
    expect(rows[0].figuresY).toBe(rows[0].textY);
    expect(rows[1].figuresY).toBeGreaterThan(rows[1].textY);
    expect(rows[1].label).toBe(long.name);
  });

  it('stands without slopes, and with one that is zero and has no interval', () => {
    expect(slopeIntervalsLayout([], 330, format).rows).toEqual([]);
    const [row] = slopeIntervalsLayout([{ name: 'a', estimate: 0, ...none }], 330, format).rows;
    expect(row.x).toBe(row.zeroX);
    expect(row.interval).toBeNull();
  });
});

describe('difference bars layout', () => {
  const total = { estimate: 540, low: 100, high: 980 };
  const terms = [
    { name: 'Capex', estimate: 790, ...none },
    { name: 'Book equity', estimate: -250, ...none },
  ];

  it('starts each bar where the sum stands, and the total at zero', () => {
    const { bars, zeroX } = differenceBarsLayout({ terms, total }, 560, formats);
    expect(bars[0].x).toBeCloseTo(zeroX, 6);
    expect(bars[1].x + bars[1].width).toBeCloseTo(bars[0].sumX, 6);
    expect(bars[2].x).toBeCloseTo(zeroX, 6);
    expect(bars[2].sumX).toBeCloseTo(bars[1].sumX, 6);
  });

  it('writes the sign of what is added', () => {
    const { bars } = differenceBarsLayout({ terms, total }, 560, formats);
    expect(bars.map((bar) => bar.value)).toEqual(['+790.00', '-250.00', '+540.00']);
  });

  it('stands with nothing that differs', () => {
    const { bars, zeroX } = differenceBarsLayout(
      { terms: [], total: { estimate: 0, ...none } },
      320,
      formats,
    );
    expect(bars.map((bar) => [bar.x, bar.width])).toEqual([[zeroX, 0]]);
  });
});
