import { TestBed } from '@angular/core/testing';
import { NumberFormat } from '../ui/number-format';
import { exactFigure, exactHeader } from './exact-figure';

describe('a figure for a file', () => {
  function numbersIn(unit: 'thousands' | 'millions'): NumberFormat {
    const numbers = TestBed.inject(NumberFormat);
    numbers.currency.set('EUR');
    numbers.panelUnit.set('millions');
    numbers.unit.set(unit);
    return numbers;
  }

  it('is in the unit shown, with every digit and none that multiplying makes up', () => {
    const numbers = numbersIn('thousands');
    expect(1.005 * numbers.factor()).not.toBe(1005);
    expect(exactFigure(1.005, numbers, 'money')).toBe(1005);
    expect(exactFigure(1234.567890123, numbers, 'money')).toBe(1234567.890123);
    expect(exactFigure(0.07, numbers, 'percent')).toBe(7);
    expect(exactFigure(0.1 + 0.2, numbers, 'plain')).toBe(0.30000000000000004);
  });

  it('is null where there is none', () => {
    const numbers = numbersIn('millions');
    for (const none of [null, undefined, NaN, -Infinity])
      expect(exactFigure(none, numbers, 'money')).toBeNull();
    expect(exactFigure(0, numbers, 'money')).toBe(0);
  });

  it('stands under a header with its unit', () => {
    const numbers = numbersIn('thousands');
    expect(exactHeader('low', numbers, 'money')).toBe('low, EUR k');
    expect(exactHeader('share', numbers, 'percent')).toBe('share, %');
    expect(exactHeader('rows', numbers, 'count')).toBe('rows');
  });
});
