import { shifted } from '../../ui/shifted';
import { figureText, shiftOf } from './shown-figure';

describe('figures in the unit that is shown', () => {
  it('keep every digit there and back', () => {
    for (const value of [0.1, 1.1, 123.456, 2410.37, -0.007, 1e-7, 8.7e21])
      for (const shift of [-6, -3, 3, 6])
        expect(shifted(shifted(value, shift), -shift)).toBe(value);
    // Multiplied, 1.1 millions would be 1100.0000000000002 thousands.
    expect(shifted(1.1, 3)).toBe(1100);
  });

  it('are text with a decimal point and nothing between thousands', () => {
    expect(figureText(1234567.25, 0)).toBe('1234567.25');
    expect(figureText(-1.5, 3)).toBe('-1500');
    expect(figureText(null, 3)).toBe('');
  });

  it('leave alone what is no money', () => {
    expect(shiftOf({ name: 'mv', role: 'marketValue' }, 0.001)).toBe(-3);
    expect(shiftOf({ name: 'staff', role: 'other' }, 0.001)).toBe(0);
  });
});
