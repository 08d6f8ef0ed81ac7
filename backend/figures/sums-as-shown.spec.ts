import { sumsAsShown } from './sums-as-shown';

describe('sums as shown', () => {
  it('holds where the rounded parts come to the rounded total', () => {
    expect(sumsAsShown([10.2, 20.1], 30.3, 0)).toBeTrue();
    expect(sumsAsShown([0.1, 0.2], 0.1 + 0.2, 1)).toBeTrue();
    expect(sumsAsShown([-250, 1790], 1540, 0)).toBeTrue();
  });

  it('fails where rounding shows', () => {
    expect(sumsAsShown([10.4, 20.4], 30.8, 0)).toBeFalse();
    expect(sumsAsShown([-0.04, -0.04], -0.08, 1)).toBeFalse();
  });

  it('holds for no parts and a total of nothing', () => {
    expect(sumsAsShown([], 0, 2)).toBeTrue();
  });
});
