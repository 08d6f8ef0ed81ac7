import { provideHttpClient } from '@angular/common/http';
import { TestBed } from '@angular/core/testing';
import type { ImportMapping } from '@contract';
import { SessionStore } from '../../api/session-store';
import { RememberedMapping } from './remembered-mapping';

const headers = ['firm', 'fy', 'mv', 'capex', 'equity'];
const mapping: ImportMapping = {
  panelName: 'Flow control',
  company: 'firm',
  year: 'fy',
  marketValue: 'mv',
  capex: 'capex',
  bookEquity: 'equity',
  others: [],
  currency: 'EUR',
  unit: 'millions',
};

describe('RememberedMapping', () => {
  it('knows the columns of the same header until the session ends', () => {
    TestBed.configureTestingModule({ providers: [provideHttpClient()] });
    const remembered = TestBed.inject(RememberedMapping);
    remembered.remember(headers, mapping);
    expect(remembered.recall(headers)).toEqual(mapping);
    expect(remembered.recall(headers.slice(1))).toBeUndefined();
    TestBed.inject(SessionStore).forget();
    expect(remembered.recall(headers)).toBeUndefined();
  });
});
