import type { FigureFormats } from './figure-types';
import { type SensitivityRow, sensitivityLayout } from './sensitivity-layout';

const formats: FigureFormats = {
  value: (value) => value.toFixed(0),
  bounds: ({ low, high }) =>
    low === null || high === null ? 'no interval' : `${low.toFixed(0)} to ${high.toFixed(0)}`,
  tick: (value) => value.toFixed(0),
};
const end = (at: string, estimate: number, half: number | null, remark = '') => ({
  at,
  expected: {
    estimate,
    low: half === null ? null : estimate - half,
    high: half === null ? null : estimate + half,
  },
  remark,
});
const rows: readonly SensitivityRow[] = [
  {
    name: 'Capex',
    low: end('20', 2500, 100),
    high: end('300', 3100, 150, 'outside the familiar range'),
  },
  { name: 'Book equity', low: end('400', 2900, null), high: end('2,000', 2600, null) },
];

describe('sensitivity layout', () => {
  it('runs each bar from the planned value to the end, on either side of it', () => {
    const layout = sensitivityLayout(rows, 2700, 600, formats);
    const [low, high] = layout.rows[0].ends;
    expect(low.bar!.x + low.bar!.width).toBeCloseTo(layout.plannedX, 9);
    expect(high.bar!.x).toBeCloseTo(layout.plannedX, 9);
    expect(high.bar!.width / low.bar!.width).toBeCloseTo(400 / 200, 9);
    expect(layout.rows[1].ends[0].x!).toBeGreaterThan(layout.plannedX);
  });

  it('keeps the order given, and every mark inside the width', () => {
    for (const width of [320, 600]) {
      const layout = sensitivityLayout(rows, 2700, width, formats);
      expect(layout.rows.map(({ name }) => name)).toEqual(['Capex', 'Book equity']);
      for (const { interval } of layout.rows.flatMap(({ ends }) => ends)) {
        if (interval === null) continue;
        expect(interval.from).toBeGreaterThanOrEqual(0);
        expect(interval.to).toBeLessThanOrEqual(width);
      }
    }
  });

  it('says in words what each end comes to and where it leaves what is familiar', () => {
    const [capex, equity] = sensitivityLayout(rows, 2700, 600, formats).rows;
    expect(capex.ends.map(({ words }) => words)).toEqual([
      'at 20: 2500 (2400 to 2600)',
      'at 300: 3100 (2950 to 3250), outside the familiar range',
    ]);
    expect(equity.ends[0].words).toBe('at 400: 2900 (no interval)');
    expect(equity.ends[0].interval).toBeNull();
  });

  it('folds the words where room is short, and no two lines meet', () => {
    const { rows: placed } = sensitivityLayout(rows, 2700, 160, formats);
    expect(placed[0].ends[1].lines.length).toBeGreaterThan(1);
    const baselines = placed.flatMap(({ textY, ends }) => [
      textY,
      ...ends.flatMap(({ lines }) => lines.map(({ y }) => y)),
    ]);
    expect(baselines).toEqual(baselines.toSorted((a, b) => a - b));
    expect(new Set(baselines).size).toBe(baselines.length);
  });

  it('has no bar where nothing is expected, and says why', () => {
    const none = { at: '0', expected: null, reason: 'Beyond what a number can hold.', remark: '' };
    const [row] = sensitivityLayout([{ ...rows[0], low: none }], 2700, 600, formats).rows;
    expect(row.ends[0].bar).toBeNull();
    expect(row.ends[0].words).toBe('at 0: Beyond what a number can hold.');
  });

  it('has no rows without inputs', () => {
    expect(sensitivityLayout([], 2700, 600, formats).rows).toEqual([]);
  });
});
