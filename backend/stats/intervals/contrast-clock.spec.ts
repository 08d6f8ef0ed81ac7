import { selectSample } from '../panel/select-sample';
import type { PanelSample } from '../panel/panel-sample';
import { panelOf, type PanelRow } from '../testing/golden-panels';
import { contrastCosines, ownClock } from './contrast-clock';

/** Companies A, B, C … with rows in these of 12 years. */
function sampleOf(...years: readonly (readonly number[])[]): PanelSample {
  const rows = years.flatMap((present, company) =>
    present.map((year): PanelRow => {
      const regressors = [((7 * year) % 5) + company];
      return { company: 'ABCD'[company], year: 2000 + year, outcome: year % 3, regressors };
    }),
  );
  const data = panelOf(rows, { outcome: 'y', regressors: ['x'] });
  return selectSample(data, 'A', undefined);
}

const all = Array.from({ length: 12 }, (_, year) => year);
const slopePart = new Float64Array(1);

describe('the clock of a contrast', () => {
  const sample = sampleOf([7, 8, 10, 11], all, all);

  it('moves in the years of a company that is there for a short time, by as much in each', () => {
    const clock = ownClock(sample, { companies: [0], weights: [1], slopePart });
    const expected = [0, 0, 0, 0, 0, 0, 0, 1 / 8, 3 / 8, 1 / 2, 5 / 8, 7 / 8];
    expect(Array.from(clock!.places)).toEqual(expected);
    expect(clock!.mostCosines).toBe(3);
  });

  it('moves by every company’s share of the variance', () => {
    const clock = ownClock(sample, { companies: [0, 1], weights: [1, -1], slopePart });
    // 1/16 in each of A's four years and 1/144 in each of B's twelve: 9 and 1 parts of 48.
    const parts = [1, 1, 1, 1, 1, 1, 1, 10, 10, 1, 10, 10];
    let before = 0;
    parts.forEach((part, year) => {
      expect(clock!.places[year]).toBeCloseTo((before + part / 2) / 48, 14);
      before += part;
    });
  });

  it('is the same for every scale of the weights', () => {
    const one = ownClock(sample, { companies: [0], weights: [1], slopePart });
    const carried = ownClock(sample, { companies: [0], weights: [0.1], slopePart });
    carried!.places.forEach((place, year) => expect(place).toBeCloseTo(one!.places[year], 14));
  });

  it('is the calendar where companies carry the contrast that are there most of the time', () => {
    const own = { companies: [1], weights: [1], slopePart };
    expect(ownClock(sample, own)).toBeNull();
    const standing = { companies: [0, 1, 2], weights: [-0.5, 1, -0.5], slopePart };
    expect(ownClock(sample, standing)).toBeNull();
    const half = sampleOf([6, 7, 8, 9, 10, 11], all);
    expect(ownClock(half, { companies: [0], weights: [1], slopePart })).toBeNull();
    expect(ownClock(sample, { companies: [], weights: [], slopePart })).toBeNull();
  });

  it('is the calendar where the rows tell fewer than three cosines apart', () => {
    const few = sampleOf([9, 10, 11], all, all);
    expect(ownClock(few, { companies: [0], weights: [1], slopePart })).toBeNull();
  });
});

describe('the cosines of a contrast', () => {
  it('are evenly spread over the calendar', () => {
    const sample = sampleOf(all, all);
    const [first, second] = contrastCosines(sample, { companies: [0], weights: [1], slopePart }, 2);
    all.forEach((year) => {
      const angle = (Math.PI * (year + 0.5)) / 12;
      expect(first[year]).toBeCloseTo(Math.sqrt(1 / 6) * Math.cos(angle), 14);
      expect(second[year]).toBeCloseTo(Math.sqrt(1 / 6) * Math.cos(2 * angle), 14);
    });
  });

  it('are no more than a short company’s rows tell apart, and those are orthogonal on them', () => {
    const present = [3, 5, 6, 9, 11];
    const sample = sampleOf(present, all);
    const cosines = contrastCosines(sample, { companies: [0], weights: [1], slopePart }, 8);
    expect(cosines.length).toBe(4);
    cosines.forEach((left, j) => {
      cosines.forEach((right, k) => {
        const product = present.reduce((sum, year) => sum + left[year] * right[year], 0);
        expect(product).toBeCloseTo(j === k ? present.length / 12 : 0, 14);
      });
    });
  });
});
