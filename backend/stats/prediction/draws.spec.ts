import { tQuantile } from '../distributions/t-distribution';
import { triangularQuantile, uniformDraws } from './index';
import { studentDraw } from './student-draw';

describe('triangularQuantile', () => {
  it('runs from the least to the largest value, the likeliest where its share lies', () => {
    const triangle = { low: -2, likely: 1, high: 10 };
    const at = (share: number): number => triangularQuantile(triangle, share);
    expect([at(0), at(0.25), at(1)]).toEqual([-2, 1, 10]);
    expect(triangularQuantile({ low: 3, likely: 3, high: 3 }, 0.3)).toBe(3);
    expect(triangularQuantile({ low: 3, likely: 3, high: 5 }, 0.75)).toBe(4);
    expect(triangularQuantile({ low: 1, likely: 3, high: 3 }, 0.25)).toBe(2);
  });

  it('has the mean and the variance of a triangular distribution', () => {
    // Over the middles of 10,000 equal stretches: integrals of the quantile, no drawing.
    for (const [low, likely, high] of [
      [-2, 1, 10],
      [0, 0, 1],
      [1e6, 3e6, 3e6],
    ] as const) {
      const values = Array.from({ length: 10_000 }, (_, i) =>
        triangularQuantile({ low, likely, high }, (i + 0.5) / 10_000),
      );
      const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
      const variance = values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / values.length;
      const exact =
        (low * low + likely * likely + high * high - low * likely - low * high - likely * high) /
        18;
      expect(Math.abs(mean - (low + likely + high) / 3)).toBeLessThan(1e-5 * (high - low));
      expect(Math.abs(variance / exact - 1)).toBeLessThan(1e-4);
    }
  });
});

describe('draws', () => {
  it('are uniform between 0 and 1, the same for the same seed', () => {
    const next = uniformDraws(11);
    const draws = Array.from({ length: 10_000 }, () => next());
    const again = uniformDraws(11);
    expect([again(), again()]).toEqual(draws.slice(0, 2));
    expect(Math.min(...draws)).toBeGreaterThan(0);
    expect(Math.max(...draws)).toBeLessThan(1);
    // Four standard errors: √(1/12/n) of the mean, √(1/180/n) of the variance.
    const mean = draws.reduce((sum, draw) => sum + draw, 0) / draws.length;
    const variance = draws.reduce((sum, draw) => sum + (draw - mean) ** 2, 0) / draws.length;
    expect(Math.abs(mean - 0.5)).toBeLessThan(4 * Math.sqrt(1 / 12 / 1e4));
    expect(Math.abs(variance - 1 / 12)).toBeLessThan(4 * Math.sqrt(1 / 180 / 1e4));
  });

  it('of Student’s t lie below its quantiles as often as they should', () => {
    for (const degrees of [2, 3.7, 25]) {
      const next = uniformDraws(5);
      const draws = Array.from({ length: 40_000 }, () => studentDraw(degrees, next(), next()));
      for (const share of [0.01, 0.1, 0.5, 0.8, 0.975]) {
        const bound = tQuantile(share, degrees);
        const below = draws.filter((draw) => draw < bound).length / draws.length;
        // Four standard errors of a share.
        expect(Math.abs(below - share))
          .withContext(`${degrees} ${share}`)
          .toBeLessThan(4 * Math.sqrt((share * (1 - share)) / draws.length));
      }
    }
  });
});
