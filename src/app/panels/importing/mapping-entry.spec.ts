import { ImportMapping, type ImportReply, type PanelVersionSummary } from '@contract';
import {
  doubleChoices,
  freeColumns,
  nextVersion,
  startingEntry,
  versionWords,
} from './mapping-entry';
import { flowDraft } from './testing/import-replies';

const draft: ImportReply = {
  ...flowDraft,
  mapping: {
    panelName: 'panel',
    company: 'firm',
    year: 'fy',
    marketValue: 'mv',
    others: ['staff'],
  },
};

const version = {
  panelName: 'Peers',
  number: 3,
  currency: 'EUR',
  unit: 'millions',
} as PanelVersionSummary;

const entry = startingEntry(draft, undefined, version);

const said = ImportMapping.parse({
  ...draft.mapping,
  company: 'cur',
  capex: 'capex',
  bookEquity: 'equity',
  currency: 'CHF',
  unit: 'thousands',
  conversion: {
    columns: [],
    currencies: {
      column: 'cur',
      rates: [{ currency: 'USD', year: 2020, average: 0.9, yearEnd: null }],
    },
    prices: { baseYear: 2020, index: [{ year: 2020, value: 100 }] },
    fiscalYears: { rule: 'year-of-most-months', usualEndMonth: 3, companies: [] },
  },
  mending: { cells: [], excludedRows: [7], renames: [] },
});

describe('mapping entry', () => {
  it('starts from the guess, and takes currency and unit from the newest panel version', () => {
    expect(entry).toEqual(
      jasmine.objectContaining({
        panelName: 'panel',
        company: 'firm',
        marketValue: 'mv',
        capex: '',
        others: ['staff'],
        attributes: [],
        currency: 'EUR',
        unit: 'millions',
        currencyColumn: '',
        isReal: false,
      }),
    );
  });

  it('prefers what was said of the same header before, without its mends', () => {
    const known = startingEntry(draft, said, version);
    expect(known.company).toBe('cur');
    expect(known.unit).toBe('thousands');
    expect(known.rates).toEqual([{ currency: 'USD', year: '2020', average: '0.9', yearEnd: '' }]);
    expect(known.index).toEqual([{ year: '2020', value: '100' }]);
    expect(known.fiscalYears.usualEndMonth).toBe(3);
    expect(known.mending.excludedRows).toEqual([]);
  });

  it('keeps what a checked import has of its own', () => {
    const checked = { ...draft, check: {} as ImportReply['check'], mapping: said };
    const known = startingEntry(checked, undefined, version);
    expect(known.company).toBe('cur');
    expect(known.mending.excludedRows).toEqual([7]);
  });

  it('keeps name, currency and unit when the file is read another way', () => {
    const before = { panelName: 'Mine', currency: 'SEK', unit: '' } as const;
    const known = startingEntry(draft, undefined, version, before);
    expect([known.panelName, known.currency, known.unit]).toEqual(['Mine', 'SEK', 'millions']);
  });

  it('offers the columns that no choice took', () => {
    expect(freeColumns(draft.headers, entry)).toEqual(['capex', 'equity', 'staff', 'cur']);
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
});
