import type { ImportCheck } from '@contract';
import { changeWords, countWords, findingWords, importFinding, leftOutWords } from './check-words';
import { flowCheck, flowDraft, uuid } from './testing/import-replies';

const check: ImportCheck = {
  ...flowCheck,
  companies: 14,
  years: 18,
  firstYear: 2008,
  lastYear: 2025,
  rows: 246,
  completeRows: 241,
  findings: [],
  findingCount: 0,
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

  it('says what is left out, and that formulas are not worked out', () => {
    expect(leftOutWords(check)).toBe('No row of the file is left out.');
    expect(leftOutWords({ ...check, leftOutRows: 2, formulaCells: 1 })).toBe(
      '2 rows of the file are left out: excluded, or without company or year. 1 cell holds a formula: the value stored for it is taken.',
    );
  });

  it('says in one sum what becomes of the rows while findings keep the file out', () => {
    const kept = { ...check, findingCount: 9, blockingCount: 9 };
    expect(leftOutWords(kept)).toBe(
      'Nothing comes in yet: 9 findings keep the file out. Of its 246 rows 246 name a company and a year.',
    );
    expect(leftOutWords({ ...kept, blockingCount: 1, rows: 243, leftOutRows: 3 })).toBe(
      'Nothing comes in yet: 1 finding keeps the file out. Of its 246 rows 243 name a company and a year, and 3 are left out or have no company or year that can be read.',
    );
  });

  it('says what would change against the newest version', () => {
    const none = { addedRows: 0, removedRows: 0, changedCells: 0, listed: [] };
    const changes = { panelVersionId: uuid(1), number: 3, ...none };
    expect(changeWords(changes)).toBe(
      'Nothing changes against version 3: it holds the same figures.',
    );
    expect(changeWords({ ...changes, addedRows: 14, removedRows: 1, changedCells: 2 })).toBe(
      'Against version 3: 14 rows come, 1 row goes and 2 cells change.',
    );
  });

  it('heads the page with what is being done with the import', () => {
    expect(importFinding(flowDraft)).toBe('flow.csv: 33 rows, not checked yet');
    expect(importFinding({ ...flowDraft, state: 'committing' })).toContain('being written');
    expect(importFinding({ ...flowDraft, check })).toContain('nothing to mend');
  });
});
