import { provideHttpClient } from '@angular/common/http';
import { TestBed } from '@angular/core/testing';
import { ImportMapping, type Session, noMending } from '@contract';
import { SessionStore, defaultPreferences } from '../../api/session-store';
import { RememberedMapping } from './remembered-mapping';

const headers = ['firm', 'fy', 'mv', 'capex', 'equity'];
const mapping = ImportMapping.parse({
  panelName: 'Flow control',
  company: 'firm',
  year: 'fy',
  marketValue: 'mv',
  capex: 'capex',
  bookEquity: 'equity',
  others: [],
  currency: 'EUR',
  unit: 'millions',
  mending: { ...noMending, excludedRows: [7] },
});
const key = 'kinvale-mappings-1';

function sessionOf(personId: string): Session {
  return {
    person: { id: personId, name: 'Ilvo Brenn', email: 'ilvo@example.com' },
    workspace: { id: 'w', name: 'Flow' },
    roles: ['analyst'],
    preferences: defaultPreferences,
  };
}

describe('RememberedMapping', () => {
  function begin(): RememberedMapping {
    TestBed.configureTestingModule({ providers: [provideHttpClient()] });
    return TestBed.inject(RememberedMapping);
  }

  beforeEach(() => localStorage.removeItem(key));
  afterEach(() => localStorage.removeItem(key));

  it('knows the columns of the same header the next time, but not what was mended', () => {
    begin().remember(headers, mapping);
    TestBed.resetTestingModule();
    const remembered = begin();
    expect(remembered.recall(headers)).toEqual({ ...mapping, mending: noMending });
    expect(remembered.recall(headers.slice(1))).toBeUndefined();
  });

  it('keeps what one person said from another at the same machine', () => {
    const remembered = begin();
    const sessions = TestBed.inject(SessionStore);
    sessions.accept({ session: sessionOf('one') });
    remembered.remember(headers, mapping);
    sessions.accept({ session: sessionOf('two') });
    expect(remembered.recall(headers)).toBeUndefined();
    sessions.accept({ session: sessionOf('one') });
    expect(remembered.recall(headers)?.panelName).toBe('Flow control');
  });

  it('takes an entry of before, and passes over what is no mapping', () => {
    const remembered = begin();
    const place = { owner: '', headers: JSON.stringify(headers) };
    const old: Partial<ImportMapping> = { ...mapping };
    delete old.reading;
    delete old.conversion;
    delete old.attributes;
    localStorage.setItem(key, JSON.stringify([{ ...place, mapping: old }]));
    expect(remembered.recall(headers)?.conversion).toEqual(mapping.conversion);
    localStorage.setItem(key, JSON.stringify([{ ...place, mapping: { company: 7 } }]));
    expect(remembered.recall(headers)).toBeUndefined();
    localStorage.setItem(key, 'no list');
    expect(remembered.recall(headers)).toBeUndefined();
  });
});
