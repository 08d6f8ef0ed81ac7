import { type ImportCheck, countWords, findingWords } from './check-words';

const check: ImportCheck = {
  companies: 14,
  years: 18,
  firstYear: 2008,
  lastYear: 2025,
  rows: 246,
  completeRows: 241,
  findings: [],
  findingCount: 0,
  blockingCount: 0,
};

describe('words of a check', () => {
  it('says what keeps the file out', () => {
    expect(findingWords(check)).toBe('The check found nothing to mend');
    expect(findingWords({ ...check, findingCount: 5 })).toBe('5 findings, none keeps the file out');
    expect(findingWords({ ...check, findingCount: 5, blockingCount: 1 })).toBe(
      '5 findings, 1 keeps the file out',
    );
    expect(findingWords({ ...check, findingCount: 1200, blockingCount: 2 })).toBe(
      '1,200 findings, 2 keep the file out',
    );
  });

  it('counts companies, years and complete rows', () => {
    expect(countWords(check)).toBe('14 companies, FY2008–FY2025: 246 rows, 241 of them complete');
  });

  it('leaves the years out where no row could be read', () => {
    expect(
      countWords({ ...check, firstYear: null, lastYear: null, rows: 0, completeRows: 0 }),
    ).toBe('0 rows, 0 of them complete');
  });
});
