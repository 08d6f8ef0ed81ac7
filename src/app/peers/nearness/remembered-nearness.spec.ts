import { provideHttpClient } from '@angular/common/http';
import { TestBed } from '@angular/core/testing';
import { SessionStore } from '../../api/session-store';
import { type NearnessChoice, RememberedNearness } from './remembered-nearness';

describe('RememberedNearness', () => {
  it('knows the choice of each workspace until the session ends', () => {
    TestBed.configureTestingModule({ providers: [provideHttpClient()] });
    const remembered = TestBed.inject(RememberedNearness);
    const choice: NearnessChoice = { measures: ['growth'], scatter: 'robust' };
    remembered.remember('one', choice);
    expect(remembered.recall('one')).toEqual(choice);
    expect(remembered.recall('other')).toBeUndefined();
    TestBed.inject(SessionStore).forget();
    expect(remembered.recall('one')).toBeUndefined();
  });
});
