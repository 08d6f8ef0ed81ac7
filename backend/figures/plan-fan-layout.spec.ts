import type { FigureFormats } from './figure-types';
import { type FanData, planFanLayout } from './plan-fan-layout';

const formats: FigureFormats = {
  value: (value) => value.toFixed(0),
  bounds: () => '',
  tick: (value) => value.toFixed(0),
};
const percents = [5, 10, 25, 50, 75, 90, 95];
const data: FanData = {
  percents,
  years: [
    { year: 2026, percentiles: [2500, 2550, 2600, 2700, 2800, 2850, 2900] },
    { year: 2027, percentiles: [2400, 2500, 2600, 2750, 2900, 3000, 3100] },
  ],
  last: { year: 2025, actual: 2650 },
};

describe('plan fan layout', () => {
  it('nests its areas, the widest first', () => {
    const { areas } = planFanLayout(data, 600, formats);
    expect(areas.map(({ from, to }) => [from, to])).toEqual([
      [5, 95],
      [10, 90],
      [25, 75],
    ]);
    expect(areas.every(({ path }) => path !== '')).toBeTrue();
  });

  it('visits every percentile, year by year from the lowest', () => {
    const { points } = planFanLayout(data, 600, formats);
    expect(points.length).toBe(14);
    expect(points.slice(0, 7).map(({ percent }) => percent)).toEqual(percents);
    const heights = points.slice(0, 7).map(({ y }) => y);
    expect(heights).toEqual(heights.toSorted((a, b) => b - a));
    expect(points[7].year).toBe(2027);
  });

  it('keeps the names at the end apart and inside the width', () => {
    const narrow = {
      ...data,
      years: [{ year: 2026, percentiles: percents.map((percent) => 2700 + percent / 100) }],
    };
    for (const width of [320, 600]) {
      const { labels, plot } = planFanLayout(narrow, width, formats);
      const places = labels.map(({ y }) => y).toSorted((a, b) => a - b);
      places.slice(1).forEach((place, k) => expect(place - places[k]).toBeGreaterThan(14));
      expect(labels.every(({ valueX }) => valueX + 4 * 7.2 <= width)).toBeTrue();
      expect(plot.right).toBeGreaterThan(plot.left);
    }
  });

  it('opens the median from the last actual value', () => {
    const { medianPath, lastPoint } = planFanLayout(data, 600, formats);
    const [x, y] = medianPath.slice(1).split(/[,L]/).map(Number);
    expect(x).toBeCloseTo(lastPoint!.x, 2);
    expect(y).toBeCloseTo(lastPoint!.y, 2);
  });

  it('leaves a year without percentiles out, and draws nothing for none', () => {
    const years = [{ year: 2026, percentiles: percents.map(() => null) }, data.years[1]];
    expect(planFanLayout({ ...data, years }, 600, formats).points.length).toBe(7);
    const empty = planFanLayout({ percents, years: [], last: null }, 600, formats);
    expect(empty.points).toEqual([]);
    expect(empty.medianPath).toBe('');
  });
});
