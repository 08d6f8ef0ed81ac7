import { TestBed } from '@angular/core/testing';
import { NumberFormat } from '../../ui/number-format';
import { reachRangeWords, reachedWords } from './reach-words';

const asked = {
  regressor: 0,
  label: 'Capex',
  of: 2027,
  year: 2027,
  target: 2750,
  confidence: 0.95,
};

describe('words of a value that is reached', () => {
  const numbers = () => TestBed.inject(NumberFormat);

  beforeEach(() => numbers().unit.set('units'));

  it('say what amount in which year, with its range', () => {
    const reach = { value: 1234, range: { kind: 'interval', low: 980, high: 1600 } } as const;
    expect(reachedWords(reach, asked, numbers())).toBe(
      'Capex of 1,234 in FY2027 brings the expected value of FY2027 to 2,750.',
    );
    expect(reachRangeWords(reach, asked, numbers())).toBe('95 % range: 980 to 1,600.');
  });

  it('say the two kinds of no finite range', () => {
    const rays = { value: 1234, range: { kind: 'rays', upTo: 500, from: 900 } } as const;
    expect(reachRangeWords(rays, asked, numbers())).toBe(
      'No finite range at 95 %: everything up to 500 and everything from 900 on cannot be ruled out.',
    );
    const one = { value: 1234, range: { kind: 'rays', upTo: null, from: 900 } } as const;
    expect(reachRangeWords(one, asked, numbers())).toBe(
      'No finite range at 95 %: everything from 900 on cannot be ruled out.',
    );
    const every = { value: 1234, range: { kind: 'every-value' } } as const;
    expect(reachRangeWords(every, asked, numbers())).toBe(
      'No finite range at 95 %: no value at all can be ruled out.',
    );
  });

  it('say why there is no range, or no value', () => {
    const unknown = { value: 1234, range: null, rangeReason: 'Too few years' } as const;
    expect(reachRangeWords(unknown, asked, numbers())).toBe('No range: Too few years.');
    const none = { value: null, reason: 'The slope of capex is zero.' } as const;
    expect(reachedWords(none, asked, numbers())).toBe('The slope of capex is zero.');
    expect(reachRangeWords(none, asked, numbers())).toBe('');
  });
});
