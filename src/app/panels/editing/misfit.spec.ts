import { misfitOf } from './misfit';

describe('a share in per cent', () => {
  it('is no amount of money, and fits a column that is none', () => {
    const money = { name: 'capex', role: 'capex' } as const;
    expect(misfitOf('12%', money)).toContain('per cent');
    expect(misfitOf('(3 %)', money)).toContain('per cent');
    expect(misfitOf('12', money)).toBeUndefined();
    expect(misfitOf('12%', { name: 'growth', role: 'other' })).toBeUndefined();
  });
});
