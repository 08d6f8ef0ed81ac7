import { expectDigits } from '../testing/expect-digits';
import { percentile } from './index';

describe('percentile', () => {
  it('is R’s quantile(type = 7)', () => {
    // R 4.2.2: quantile(c(1.5, 2, 4, 8, 16.25, 32, 64), c(0, .05, .1, .25, .5, .75, .9, .95, 1), type = 7)
    const sorted = Float64Array.of(1.5, 2, 4, 8, 16.25, 32, 64);
    const shares = [0, 0.05, 0.1, 0.25, 0.5, 0.75, 0.9, 0.95, 1];
    const expected = [1.5, 1.65, 1.8, 3, 8, 24.125, 44.8, 54.4, 64];
    shares.forEach((share, index) => {
      expectDigits(percentile(sorted, share), expected[index], 14, String(share));
    });
  });

  it('of one value is that value, and of equal ones theirs', () => {
    expect(percentile([7], 0.1)).toBe(7);
    expect(percentile([0, Infinity, Infinity], 0.75)).toBe(Infinity);
  });
});
