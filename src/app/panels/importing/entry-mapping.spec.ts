import { noMending, plainReading } from '@contract';
import { isSameMapping, readEntry } from './entry-mapping';
import { type MappingEntry, startingEntry } from './mapping-entry';
import { flowDraft, flowVersion } from './testing/import-replies';

const entry = startingEntry(flowDraft, undefined, flowVersion);

function read(change: Partial<MappingEntry>): ReturnType<typeof readEntry> {
  return readEntry({ ...entry, ...change }, flowDraft.headers, plainReading);
}

const usd = { currency: 'USD', year: '2020', average: '0.92', yearEnd: '0.9' };

describe('entries as a mapping', () => {
  it('are what the server checks', () => {
    const { mapping, problems } = read({ attributes: ['cur'] });
    expect(problems).toEqual({ columns: [], currencies: [], prices: [], fiscalYears: [] });
    expect(mapping?.others).toEqual(['staff']);
    expect(mapping?.attributes).toEqual(['cur']);
    expect(mapping?.conversion.currencies).toBeNull();
    expect(mapping?.conversion.prices).toBeNull();
  });

  it('bring a column along once, whatever else it was taken for before', () => {
    const { mapping } = read({ others: ['staff', 'mv', 'cur'], attributes: ['cur'] });
    expect(mapping?.others).toEqual(['staff', 'cur']);
    expect(mapping?.attributes).toEqual([]);
  });

  it('say units and measures only where they differ, and of columns that come along', () => {
    const columns: MappingEntry['columns'] = [
      { column: 'mv', unit: 'thousands', measure: null },
      { column: 'staff', unit: null, measure: 'no-money' },
      { column: 'cur', unit: 'billions', measure: 'flow' },
    ];
    expect(read({ columns }).mapping?.conversion.columns).toEqual([
      { column: 'mv', unit: 'thousands', measure: null },
    ]);
  });

  it('hold rates only with a currency column, and name a rate that is none', () => {
    expect(read({ rates: [usd] }).mapping?.conversion.currencies).toBeNull();
    expect(read({ rates: [usd], currencyColumn: 'cur' }).mapping?.conversion.currencies).toEqual({
      column: 'cur',
      rates: [{ currency: 'USD', year: 2020, average: 0.92, yearEnd: 0.9 }],
    });
    const wrong = read({ rates: [{ ...usd, average: 'x' }], currencyColumn: 'cur' });
    expect(wrong.mapping).toBeNull();
    expect(wrong.problems.currencies.length).toBe(1);
  });

  it('need the index of the year whose prices count', () => {
    const index = [{ year: '2019', value: '98.5' }];
    expect(read({ isReal: true, baseYear: '2020', index }).problems.prices[0]).toContain('2020');
    expect(read({ isReal: true, baseYear: '', index }).mapping).toBeNull();
    expect(read({ isReal: true, baseYear: '2019', index }).mapping?.conversion.prices).toEqual({
      baseYear: 2019,
      index: [{ year: 2019, value: 98.5 }],
    });
  });

  it('pass over a company without a name, and refuse one with two months', () => {
    const companies = [
      { company: ' Aldren SE ', endMonth: 3 },
      { company: '', endMonth: 6 },
    ];
    const fiscalYears = { ...entry.fiscalYears, companies };
    expect(read({ fiscalYears }).mapping?.conversion.fiscalYears.companies).toEqual([
      { company: 'Aldren SE', endMonth: 3 },
    ]);
    const twice = { ...fiscalYears, companies: [companies[0], companies[0]] };
    expect(read({ fiscalYears: twice }).problems.fiscalYears.length).toBe(1);
  });

  it('are the same in another order, and not with another mend', () => {
    const { mapping } = read({ others: ['staff', 'cur'] });
    if (mapping === null) throw new Error('expected a mapping');
    expect(isSameMapping(mapping, { ...mapping, others: ['cur', 'staff'] })).toBeTrue();
    expect(isSameMapping(mapping, { ...mapping, unit: 'units' })).toBeFalse();
    const utf8 = { ...mapping, reading: { ...mapping.reading, encoding: 'utf-8' } } as const;
    const unsaid = { ...mapping, reading: { ...mapping.reading, encoding: undefined } };
    expect(isSameMapping(utf8, unsaid)).toBeTrue();
    const utf16 = { ...mapping, reading: { ...mapping.reading, encoding: 'utf-16' } } as const;
    expect(isSameMapping(utf8, utf16)).toBeFalse();
    const mending = { ...noMending, excludedRows: [2] };
    expect(isSameMapping(mapping, { ...mapping, mending })).toBeFalse();
    expect(isSameMapping(null, mapping)).toBeFalse();
    expect(isSameMapping(mapping, { company: 'firm' })).toBeFalse();
  });
});
