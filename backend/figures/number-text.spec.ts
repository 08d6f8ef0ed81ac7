import {
  boundsText,
  columnDigits,
  columnText,
  digitsFor,
  fixedText,
  fullText,
  intervalDigits,
  intervalText,
  tickDigits,
  unitRatio,
  unitText,
} from './number-text';

describe('number text', () => {
  it('keeps so many significant digits, and rounds to tens where fewer are wanted', () => {
    expect(digitsFor(2.8561, 4)).toBe(3);
    expect(digitsFor(-0.50791, 4)).toBe(4);
    expect(digitsFor(2407.4, 3)).toBe(-1);
    expect(fixedText(2407.4, -1)).toBe('2,410');
    // Rounding up lengthens the number: 9,999.6 has its fourth digit before the point.
    expect(fixedText(9999.6, digitsFor(9999.6, 4))).toBe('10,000');
  });

  it('writes negatives with the minus sign, or in parentheses in a column', () => {
    expect(fixedText(-1234.5, 0)).toBe('\u22121,235');
    expect(columnText(-1234.4, 0, 'minus')).toBe('\u22121,234');
    expect(columnText(-1234.4, 0, 'parentheses')).toBe('(1,234)');
  });

  it('tells zero, what rounds to zero and what is missing apart', () => {
    expect(columnText(0, 0, 'minus')).toBe('–');
    expect(columnText(-0.2, 0, 'parentheses')).toBe('0');
    expect(columnText(null, 0, 'minus')).toBe('n/a');
    expect(columnText(Number.NaN, 0, 'minus')).toBe('n/a');
  });

  it('gives an estimate and its bounds the same digits', () => {
    const digits = intervalDigits(2407.1, 1275.2, 3539.4, 4);
    expect(intervalText(2407.1, 1275.2, 3539.4, digits)).toBe('2,407 (1,275 to 3,539)');
    expect(intervalText(-0.5079, -1.2, 0.3, intervalDigits(-0.5079, -1.2, 0.3, 4))).toBe(
      '\u22120.5079 (\u22121.2000 to 0.3000)',
    );
    expect(boundsText(-12, 180, 0)).toBe('\u221212 to 180');
  });

  it('lets a wide interval decide the digits of an estimate near zero', () => {
    expect(intervalDigits(0.0012, -2, 2, 4)).toBe(4);
  });

  it('says that there is no interval rather than inventing one', () => {
    expect(intervalText(5, null, null, 0)).toBe('5 (no interval)');
  });

  it('aligns a column on its largest number and rounds no whole number away', () => {
    expect(columnDigits([5200.4, -970, null, 0], 4)).toBe(0);
    expect(columnDigits([12345678], 4)).toBe(0);
    expect(columnDigits([2.856, 0.01], 4)).toBe(3);
    expect(columnDigits([], 4)).toBe(0);
  });

  it('shows every digit in full precision', () => {
    expect(fullText(2407.09123456789)).toBe('2,407.09123456789');
    expect(fullText(-1e-9)).toBe('\u22121e\u22129');
    expect(fullText(null)).toBe('n/a');
  });

  it('converts between units of money and names them', () => {
    expect(unitRatio('millions', 'thousands')).toBe(1000);
    expect(unitRatio('millions', 'billions')).toBe(0.001);
    expect(unitText('EUR', 'millions')).toBe('EUR m');
    expect(unitText('EUR', 'units')).toBe('EUR');
  });

  it('gives ticks the digits that tell them apart', () => {
    expect(tickDigits(2000)).toBe(0);
    expect(tickDigits(0.5)).toBe(1);
    expect(tickDigits(0.1)).toBe(1);
    expect(tickDigits(0.002)).toBe(3);
  });
});
