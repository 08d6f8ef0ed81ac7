import { sniffDelimiter } from './sniff-delimiter';

describe('the delimiter of a text table', () => {
  it('is the one that lines agree on, below a title without one or with others', () => {
    const table = 'Company;Year;Capex\nAlder;2020;1,5\nBirch;2020;2,5\n';
    expect(sniffDelimiter(table)).toBe(';');
    expect(sniffDelimiter(`Peers of the year\n\n${table}`)).toBe(';');
    expect(sniffDelimiter(`Peers, as of May, in EUR, audited\n${table}`)).toBe(';');
    expect(sniffDelimiter(`sep=;\n${table}`)).toBe(';');
  });

  it('may be a tab between decimal commas', () => {
    expect(sniffDelimiter('a\tb\tc\n1,5\t2,5\t3,5\n1,5\t2,5\t3,5\n')).toBe('\t');
  });

  it('is not looked for inside quotes', () => {
    expect(sniffDelimiter('"a;b;c","d;e;f"\n"1;2;3","4;5;6"\n')).toBe(',');
  });

  it('is a comma where there is none', () => {
    expect(sniffDelimiter('a\n1\n')).toBe(',');
    expect(sniffDelimiter('')).toBe(',');
  });
});
