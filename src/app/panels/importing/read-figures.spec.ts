import { readFigures } from './read-figures';

describe('readFigures', () => {
  it('reads plain figures with a point', () => {
    expect(readFigures(['1.0854', '0.92', '12', ' 1.25 '])).toEqual([1.0854, 0.92, 12, 1.25]);
  });

  it('reads a table with a decimal comma, its thousands points too', () => {
    expect(readFigures(['0,92', '1,085', '1.234,5'])).toEqual([0.92, 1.085, 1234.5]);
  });

  it('reads a comma as parting thousands where the others have a decimal point', () => {
    expect(readFigures(['0.92', '1,085', '1,234.5'])).toEqual([0.92, 1085, 1234.5]);
  });

  it('refuses what could be two numbers, and what is none', () => {
    expect(readFigures(['1,085'])).toEqual([undefined]);
    expect(readFigures(['1.085'])).toEqual([1.085]);
    expect(readFigures(['abc', '', '1.2.3', '-1'])).toEqual([
      undefined,
      undefined,
      undefined,
      undefined,
    ]);
  });
});
