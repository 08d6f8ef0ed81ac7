import { fiellerRange } from './fieller';

// Quadratics solved by hand: (δ·slope)² ≤ m00 + 2δ·m01 + δ²·m11.
describe('fiellerRange', () => {
  it('is an interval where the slope is told from zero', () => {
    // 4δ² ≤ 3 + 2δ + 3δ²: δ² − 2δ − 3 ≤ 0, from −1 to 3.
    expect(fiellerRange(2, { m00: 3, m01: 1, m11: 3 })).toEqual({
      kind: 'interval',
      low: -1,
      high: 3,
    });
    expect(fiellerRange(-2, { m00: 3, m01: -1, m11: 3 })).toEqual({
      kind: 'interval',
      low: -3,
      high: 1,
    });
  });

  it('is two rays where all but a stretch can be the solution', () => {
    // δ² ≤ 3 + 4δ·… with m01 = 2, m11 = 2: −δ² − 4δ − 3 ≤ 0, up to −3 and from −1.
    expect(fiellerRange(1, { m00: 3, m01: 2, m11: 2 })).toEqual({
      kind: 'rays',
      upTo: -3,
      from: -1,
    });
  });

  it('is every value where nothing can be ruled out', () => {
    expect(fiellerRange(1, { m00: 3, m01: 1, m11: 2 })).toEqual({ kind: 'every-value' });
    expect(fiellerRange(1, { m00: 3, m01: 0, m11: 1 })).toEqual({ kind: 'every-value' });
  });

  it('is one ray at the border between the two', () => {
    // 0 ≤ 3 + 2δ·m01.
    expect(fiellerRange(1, { m00: 3, m01: 1, m11: 1 })).toEqual({
      kind: 'rays',
      upTo: null,
      from: -1.5,
    });
    expect(fiellerRange(1, { m00: 3, m01: -1, m11: 1 })).toEqual({
      kind: 'rays',
      upTo: 1.5,
      from: null,
    });
  });

  it('is a point where the line is known without doubt', () => {
    expect(fiellerRange(2, { m00: 0, m01: 0, m11: 0 })).toEqual({
      kind: 'interval',
      low: 0,
      high: 0,
    });
  });
});
