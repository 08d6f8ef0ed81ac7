import { type ExpectedPlan, expectedPathLayout } from './expected-path-layout';
import type { FigureFormats } from './figure-types';

const formats: FigureFormats = {
  value: (value) => value.toFixed(0),
  bounds: ({ low, high }) =>
    low === null || high === null ? 'no interval' : `${low.toFixed(0)} to ${high.toFixed(0)}`,
  tick: (value) => value.toFixed(0),
};
const ownYears = [6100, 6600, 6200, 7000, 9400].map((actual, k) => ({
  year: 2021 + k,
  actual,
  fitted: 6400 + 600 * k,
}));
const base = [2026, 2027, 2028].map((year) => ({ year, estimate: 8800 }));

function plan(name: string, end: number, hasBounds = true): ExpectedPlan {
  return {
    name,
    years: [2026, 2027, 2028].map((year, k) => {
      const estimate = 8800 + ((end - 8800) * (k + 1)) / 3;
      const half = hasBounds ? 200 * (k + 1) : null;
      return {
        year,
        estimate,
        low: half === null ? null : estimate - half,
        high: half === null ? null : estimate + half,
      };
    }),
  };
}

describe('expected path layout', () => {
  it('parts what happened from the plan at the last actual year', () => {
    const layout = expectedPathLayout({ ownYears, base, plans: [plan('B', 10340)] }, 640, formats);
    const own = layout.points.filter((point) => point.kind === 'own');
    const planned = layout.points.filter((point) => point.kind !== 'own');
    expect(layout.planX).toBeCloseTo(own.at(-1)!.x, 6);
    expect(planned.every((point) => point.x > layout.planX!)).toBeTrue();
  });

  it('draws no hairline, and no plan, where nothing is planned', () => {
    const layout = expectedPathLayout({ ownYears, base: [], plans: [] }, 640, formats);
    expect(layout.planX).toBeNull();
    expect(layout.basePath).toBe('');
    expect(layout.endLabels).toEqual([]);
  });

  it('starts plan and base where the model stands in the last actual year', () => {
    const layout = expectedPathLayout({ ownYears, base, plans: [plan('B', 10340)] }, 640, formats);
    const start = layout.fittedPath.slice(layout.fittedPath.lastIndexOf('L') + 1);
    expect(layout.basePath.startsWith(`M${start}L`)).toBeTrue();
    expect(layout.plans[0].path.startsWith(`M${start}L`)).toBeTrue();
  });

  it('keeps the labels at the ends apart and inside the width', () => {
    const plans = ['Plan A, steady', 'Plan B, build-out', 'Plan C'].map((name, k) =>
      plan(name, 8800 + k),
    );
    for (const width of [320, 640]) {
      const { endLabels, plot } = expectedPathLayout({ ownYears, base, plans }, width, formats);
      const places = endLabels.map((label) => label.y).sort((a, b) => a - b);
      for (let k = 1; k < places.length; k++)
        expect(places[k] - places[k - 1]).toBeGreaterThanOrEqual(width === 320 ? 30 : 17);
      expect(places[0]).toBeGreaterThanOrEqual(plot.top);
    }
  });

  it('draws the area of the first plan, and an interval at the end of each', () => {
    const plans = [plan('A', 9890), plan('B', 10340), plan('C', 9000, false)];
    const layout = expectedPathLayout({ ownYears, base, plans }, 640, formats);
    expect(layout.intervalArea).not.toBe('');
    expect(layout.bandArea).toBe('');
    expect(layout.plans.map((item) => item.interval !== null)).toEqual([true, true, false]);
    expect(new Set(layout.plans.map((item) => item.mark)).size).toBe(3);
  });

  it('names the lines of what happened once each, off each other', () => {
    const { seriesLabels } = expectedPathLayout({ ownYears, base, plans: [] }, 640, formats);
    expect(seriesLabels.map((label) => label.text)).toEqual(['actual', 'expected']);
    const [first, second] = seriesLabels;
    expect(Math.abs(first.x - second.x) > 40 || Math.abs(first.y - second.y) > 12).toBeTrue();
  });

  it('stands without years, with one year, and with values all equal', () => {
    expect(expectedPathLayout({ ownYears: [], base: [], plans: [] }, 640, formats).points).toEqual(
      [],
    );
    for (const own of [
      ownYears.slice(0, 1),
      ownYears.map((at) => ({ ...at, actual: 5, fitted: 5 })),
    ])
      for (const point of expectedPathLayout({ ownYears: own, base: [], plans: [] }, 640, formats)
        .points)
        expect([point.x, point.y].every(Number.isFinite)).toBeTrue();
  });

  it('names the band beside its last year, inside the width and off the lines of history', () => {
    const wide = plan('B', 9000);
    const years = wide.years.map((year) => ({ ...year, bandLow: 7000, bandHigh: 11500 }));
    const data = { ownYears, base, plans: [{ ...wide, years }], bandName: '80 % band' };
    for (const width of [320, 640]) {
      const layout = expectedPathLayout(data, width, formats);
      const label = layout.bandLabel!;
      expect(label.text).toBe('80 % band');
      expect(label.x).toBeCloseTo(layout.plot.right, 6);
      expect(label.y).toBeGreaterThan(14);
      expect(label.y).toBeLessThan(layout.yearsY - 10);
      expect(layout.points.at(-1)!.band).toBe('7000 to 11500');
    }
  });

  it('names no band where there is none', () => {
    const data = { ownYears, base, plans: [plan('B', 9000)], bandName: '80 % band' };
    const layout = expectedPathLayout(data, 640, formats);
    expect(layout.bandLabel).toBeNull();
    expect(layout.points.at(-1)!.band).toBe('');
  });

  it('has four marks that no two plans share', () => {
    const plans = ['A', 'B', 'C', 'D'].map((name) => plan(name, 9000));
    const { plans: placed } = expectedPathLayout({ ownYears, base, plans }, 640, formats);
    expect(new Set(placed.map(({ mark }) => mark)).size).toBe(4);
  });
});
