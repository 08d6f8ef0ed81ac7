import { unescapeText } from './unescape-text';

describe('text of a workbook’s cell', () => {
  it('has its control characters back', () => {
    expect(unescapeText('two_x000A_lines and _x0041_')).toBe('two\nlines and A');
    expect(unescapeText('_x12_ and x000A')).toBe('_x12_ and x000A');
  });

  it('never gets a NUL or half a character', () => {
    for (const text of ['a_x0000_b', 'a_xD83D_b', '_xdc00_']) expect(unescapeText(text)).toBe(text);
  });
});
