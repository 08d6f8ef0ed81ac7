import { expectDigits } from '../testing/expect-digits';
import { fUpperTail } from './f-upper-tail';
import { tQuantile, tTwoSided, tUpperTail } from './t-distribution';

describe('distributions', () => {
  it('keep the digits of an upper tail that 1 − cdf loses', () => {
    // R 4.2.2: pf(49.17662550, 9, 188, lower.tail = FALSE)
    expect(fUpperTail(49.1766255, 9, 188)).toBeCloseTo(8.7e-45, 46);
    expect(fUpperTail(49.1766255, 9, 188)).toBeGreaterThan(8e-45);
    expect(fUpperTail(0, 3, 4)).toBe(1);
  });

  it('agree with tables of Student’s t', () => {
    expectDigits(tQuantile(0.975, 3), 3.182446305284263, 12);
    expectDigits(tTwoSided(3.182446305284263, 3), 0.05, 12);
    expectDigits(tUpperTail(3.182446305284263, 3), 0.025, 12);
    expectDigits(tUpperTail(-3.182446305284263, 3), 0.975, 12);
    expectDigits(tTwoSided(0, 2.07), 1, 15);
  });
});
