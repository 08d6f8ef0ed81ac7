import { spreadsheetText } from './spreadsheet-text';

describe('a text in a spreadsheet', () => {
  const starts = ['=', '+', '-', '@', '\t', '\r', '\n', '\0', '＝', '＋', '－', '＠'];
  for (const start of starts)
    it(`is no formula where it begins with ${JSON.stringify(start)}`, () => {
      expect(spreadsheetText(`${start}1+1`)).toBe(`'${start}1+1`);
      expect(spreadsheetText(`'${start}1+1`))
        .withContext('an apostrophe of its own is told apart')
        .toBe(`''${start}1+1`);
    });

  it('stays as it is otherwise', () => {
    for (const text of ['', 'Velmara', 'A-B', '’s', "'s", '12'])
      expect(spreadsheetText(text)).toBe(text);
  });
});
