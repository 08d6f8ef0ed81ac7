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

  it('keep the digits of F however far the tail and however near zero', () => {
    // P(F(2, d) > f) = (1 + 2f/d)^(−d/2), evaluated to 40 digits for d = 20.
    expectDigits(fUpperTail(0.5, 2, 20), 0.6139132535407594, 14);
    expectDigits(fUpperTail(1e6, 2, 20), 9.9990000549978e-51, 12);
    expectDigits(fUpperTail(1e10, 2, 20), 9.9999999e-91, 12);
    // P(F(1, 5) > f) = 1 − 2·√f·8/(3π√5) + O(f^1.5)
    expectDigits(fUpperTail(1e-12, 1, 5), 0.9999992407866204, 15);
  });

  it('agree with tables of Student’s t', () => {
    expectDigits(tQuantile(0.975, 3), 3.182446305284263, 12);
    expectDigits(tTwoSided(3.182446305284263, 3), 0.05, 12);
    expectDigits(tUpperTail(3.182446305284263, 3), 0.025, 12);
    expectDigits(tUpperTail(-3.182446305284263, 3), 0.975, 12);
    expectDigits(tTwoSided(0, 2.07), 1, 15);
  });
});
