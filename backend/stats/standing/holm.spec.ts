import { holmRejections } from './holm';

describe('holmRejections', () => {
  it('compares the smallest p values with ever larger shares of α and stops at the first that is too large', () => {
    expect(holmRejections([0.04, 0.01, 0.9, 0.012], 0.05)).toEqual([false, true, false, true]);
    expect(holmRejections([0.03, 0.03], 0.05)).toEqual([false, false]);
    expect(holmRejections([0.02, 0.05], 0.05)).toEqual([true, true]);
    expect(holmRejections([], 0.05)).toEqual([]);
  });
});
