import type { ImportReply, PanelVersionSummary } from '@contract';
import {
  doubleChoices,
  furtherColumns,
  isSameEntry,
  nextVersion,
  startingEntry,
  versionWords,
} from './mapping-entry';

const draft: ImportReply = {
  id: '6f0a1d1e-52a1-4f0e-9a3c-0d3f0b9f3c11',
  fileName: 'panel.csv',
  byteSize: 120,
  state: 'mapped',
  headers: ['firm', 'fy', 'mv', 'capex', 'equity', 'staff', 'remark'],
  firstRows: [
    { row: 2, cells: ['A', '2008', '1.5', '2', '3', '(1,200)', 'late'] },
    { row: 3, cells: ['A', '2009', '', '2', '3', '', ''] },
  ],
  rowCount: 2,
  mapping: {
    panelName: 'panel',
    company: 'firm',
    year: 'fy',
    marketValue: 'mv',
    others: ['staff'],
  },
  check: null,
  panelVersionId: null,
};

const version = {
  panelName: 'Peers',
  number: 3,
  currency: 'EUR',
  unit: 'millions',
} as PanelVersionSummary;

const entry = startingEntry(draft, undefined, version);

describe('mapping entry', () => {
  it('starts from the guess, and takes currency and unit from the newest panel version', () => {
    expect(entry).toEqual({
      panelName: 'panel',
      company: 'firm',
      year: 'fy',
      marketValue: 'mv',
      capex: '',
      bookEquity: '',
      others: ['staff'],
      currency: 'EUR',
      unit: 'millions',
    });
  });

  it('prefers what was said of the same header before, until the import has its own', () => {
    const said = { ...entry, company: 'remark', capex: 'capex', bookEquity: 'equity' } as const;
    const remembered = { ...said, unit: 'thousands' as const };
    expect(startingEntry(draft, remembered, version).company).toBe('remark');
    expect(startingEntry(draft, remembered, version).unit).toBe('thousands');
    expect(startingEntry({ ...draft, state: 'checked' }, remembered, version).company).toBe('firm');
  });

  it('offers the numeric columns that no choice took', () => {
    expect(furtherColumns(draft, entry)).toEqual(['capex', 'equity', 'staff']);
    expect(furtherColumns(draft, { ...entry, capex: 'capex', bookEquity: 'equity' })).toEqual([
      'staff',
    ]);
  });

  it('finds a column that two choices name, and says so of the later one', () => {
    expect(doubleChoices({ ...entry, capex: 'mv' })).toEqual(['capex']);
    expect(doubleChoices(entry)).toEqual([]);
  });

  it('says what a name makes of the import', () => {
    expect(nextVersion(' Peers ', [version])).toBe(4);
    expect(versionWords('Peers', [version])).toContain('version 4');
    expect(versionWords('Others', [version])).toBe('Becomes a new panel, version 1');
  });

  it('tells a changed entry from an unchanged one, whatever the order of further columns', () => {
    const checked = { ...entry, unit: 'millions' as const, others: ['b', 'a'] };
    expect(isSameEntry({ ...entry, others: ['a', 'b'] }, checked)).toBeTrue();
    expect(isSameEntry({ ...entry, others: ['a'] }, checked)).toBeFalse();
    expect(isSameEntry({ ...entry, others: ['a', 'b'], unit: 'units' }, checked)).toBeFalse();
  });
});
