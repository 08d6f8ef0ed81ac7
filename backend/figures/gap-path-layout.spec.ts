import type { FigureFormats } from './figure-types';
import { gapPathLayout } from './gap-path-layout';

const formats: FigureFormats = {
  value: (value) => value.toFixed(0),
  bounds: ({ low, high }) =>
    low === null || high === null ? 'no interval' : `${low.toFixed(0)} to ${high.toFixed(0)}`,
  tick: (value) => value.toFixed(0),
};
const standing = { estimate: 2100, low: 700, high: 3400 };

function years(...gaps: (number | null)[]) {
  return gaps.map((gap, k) => ({ year: 2008 + k, gap, peers: 13 }));
}

describe('gap path layout', () => {
  it('breaks the line at a missing year, and gives it no point', () => {
    const layout = gapPathLayout(years(1100, 1300, null, 900, 1200), standing, 800, formats);
    expect(layout.path.match(/M/g)?.length).toBe(2);
    expect(layout.points.map((point) => point.year)).toEqual([2008, 2009, 2011, 2012]);
  });

  it('puts zero on the axis and the standing inside its band', () => {
    const layout = gapPathLayout(years(1100, 1300), standing, 800, formats);
    expect(layout.yTicks[0].value).toBe(0);
    expect(layout.zeroY).toBeCloseTo(layout.plot.bottom, 6);
    const { y, band } = layout.standing!;
    expect(band!.top).toBeLessThan(y);
    expect(band!.bottom).toBeGreaterThan(y);
  });

  it('writes years without thousands separators, the last one always', () => {
    const layout = gapPathLayout(
      years(...Array.from({ length: 18 }, (_, k) => k)),
      null,
      360,
      formats,
    );
    expect(layout.years.at(-1)?.label).toBe('2025');
    for (const [before, after] of layout.years.slice(1).map((tick, k) => [layout.years[k], tick]))
      expect(after.position - before.position).toBeGreaterThanOrEqual(44);
  });

  it('keeps the label of the standing off the line where there is room', () => {
    const layout = gapPathLayout(years(2100, 2100, 2100, 4000, 4000, 4000), standing, 800, formats);
    expect(layout.standing?.label.anchor).toBe('end');
    expect(layout.standing?.label.text).toBe('standing 2100 (700 to 3400)');
  });

  it('draws no band where the standing has no interval', () => {
    const open = { estimate: 5, low: null, high: null };
    expect(gapPathLayout(years(1), open, 800, formats).standing?.band).toBeNull();
  });

  it('stands without years, with one year, and with gaps all equal', () => {
    expect(gapPathLayout([], null, 800, formats).points).toEqual([]);
    const one = gapPathLayout(years(5), null, 800, formats);
    expect(one.points[0].x).toBeCloseTo((one.plot.left + one.plot.right) / 2, 6);
    const equal = gapPathLayout(years(0, 0, 0), null, 800, formats);
    expect(equal.points.every((point) => Number.isFinite(point.y))).toBeTrue();
  });
});
