import { blockText, readBlockText } from './block-text';

describe('a block on the clipboard', () => {
  it('is read as spreadsheets write it, whatever ends its lines', () => {
    const cells = [
      ['1', '2'],
      ['', '4'],
    ];
    for (const end of ['\n', '\r\n', '\r']) {
      expect(readBlockText(`1\t2${end}\t4`)).toEqual(cells);
      expect(readBlockText(`1\t2${end}\t4${end}`)).toEqual(cells);
    }
  });

  it('keeps empty cells and rows in the middle', () => {
    expect(readBlockText('a\t\t\n\n\tb\t\n')).toEqual([['a', '', ''], [''], ['', 'b', '']]);
  });

  it('keeps tabs, line ends and quotes of quoted cells', () => {
    const cells = [['two\nlines', 'a\tb', 'say "yes"', ' 5" pipe']];
    expect(readBlockText(blockText(cells))).toEqual(cells);
    expect(readBlockText('"1""2"\t3')).toEqual([['1"2', '3']]);
    expect(readBlockText('5" pipe\t6')).toEqual([['5" pipe', '6']]);
  });

  it('brings 50 rows of 20 columns there and back', () => {
    const cells = Array.from({ length: 50 }, (_, row) =>
      Array.from({ length: 20 }, (_unused, column) => String(row * 20.5 - column / 3)),
    );
    expect(readBlockText(blockText(cells))).toEqual(cells);
  });
});
