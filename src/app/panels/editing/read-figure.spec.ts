import { misfitOf, readFigures } from './read-figure';

const read = (text: string) => readFigures([[text]])[0][0];

describe('figures as people write them', () => {
  it('are read with either decimal sign, grouped or not', () => {
    for (const text of ['1234.5', '1,234.5', '1.234,5', '1 234,5', '1’234.5', '1234,5'])
      expect(read(text)).toBe(1234.5);
    expect(read('1e3')).toBe(1000);
    expect(read('1,234')).toBe(1234);
    expect(read('1.234')).toBe(1.234);
    expect(read('1,234,567')).toBe(1_234_567);
    expect(read('1.234.567')).toBe(1_234_567);
  });

  it('are negative in parentheses, with either minus sign, and with one behind', () => {
    for (const text of ['(1,234)', '-1234', '\u22121,234', '1,234-', '- 1 234'])
      expect(read(text)).toBe(-1234);
    expect(Object.is(read('-0'), 0)).toBeTrue();
  });

  it('are missing where the cell says so', () => {
    for (const text of ['', ' ', '-', '–', '—', 'NA', 'n/a', '#N/A', '..'])
      expect(read(text)).toBeNull();
  });

  it('are none where the text is something else', () => {
    for (const text of ['abc', '1,23,4', '12 m', '1.2.3', '()', '--1', '1e999', 'Infinity'])
      expect(read(text)).toBeUndefined();
  });

  it('take the decimal sign of the block as a whole', () => {
    expect(readFigures([['1.234', '5,5']])).toEqual([[1234, 5.5]]);
    expect(readFigures([['1,234'], ['5.5']])).toEqual([[1234], [5.5]]);
    expect(readFigures([['1.5', '2.5', '3,5']])).toEqual([[1.5, 2.5, undefined]]);
  });
});

describe('a share in per cent', () => {
  it('is no amount of money, and fits a column that is none', () => {
    const money = { name: 'capex', role: 'capex' } as const;
    expect(misfitOf('12%', money)).toContain('per cent');
    expect(misfitOf('(3 %)', money)).toContain('per cent');
    expect(misfitOf('12', money)).toBeUndefined();
    expect(misfitOf('12%', { name: 'growth', role: 'other' })).toBeUndefined();
  });
});
