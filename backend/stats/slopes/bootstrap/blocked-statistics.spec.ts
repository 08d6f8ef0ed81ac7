import { randomNumbers } from '../../testing/random-panels';
import { blockedStatistics } from './blocked-statistics';
import { drawStatistics, type SlopeScores } from './draw-statistics';
import { signDraws } from './sign-draws';

/** Any numbers: the two ways of summing must agree whether or not they come from a fit. */
function anyScores(companies: number, size: number): SlopeScores {
  const random = randomNumbers(companies);
  const numbers = (length: number): Float64Array =>
    Float64Array.from({ length }, () => random() - 0.5);
  return {
    size,
    g: numbers(companies * size),
    q: numbers(companies * size),
    alpha: numbers(companies),
    kappa: numbers(companies),
  };
}

describe('statistics of draws in blocks of companies', () => {
  for (const companies of [13, 16, 29]) {
    it(`equal those of each draw by itself, ${companies} companies`, () => {
      const scores = anyScores(companies, 4);
      const direct = drawStatistics(scores, signDraws(companies, 3), () => undefined);
      const told: number[] = [];
      const blocked = blockedStatistics(scores, signDraws(companies, 3), (share) =>
        told.push(share),
      );
      expect(blocked.length).toBe(direct.length);
      const largest = blocked.reduce(
        (most, value, index) => Math.max(most, Math.abs(value - direct[index])),
        0,
      );
      // Figures of size 10 to 1000 and sums of a few hundred terms: 1e-10 is rounding.
      expect(largest).toBeLessThan(1e-10);
      expect(told.length).toBe(Math.ceil(companies / 8));
    });
  }
});
