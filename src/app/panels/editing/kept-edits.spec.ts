import { provideHttpClient } from '@angular/common/http';
import { TestBed } from '@angular/core/testing';
import type { SessionReply } from '@contract';
import { SessionStore } from '../../api/session-store';
import { KeptEdits } from './kept-edits';
import { cellKey, noEdits, savedRows, setCells } from './panel-edits';
import { emptyDraft } from './save-lines';

const saved = savedRows([{ fileRow: 2, company: 'Kesdrin', year: 2020, values: [1, null] }]);
const edits = setCells(noEdits, saved, [
  { place: { company: 'Kesdrin', year: 2020, column: 1 }, value: 4 },
]);

function as(person: string): SessionReply {
  return {
    session: {
      person: { id: person, name: 'Ilvo Brenn', email: 'ilvo@velmara.example' },
      workspace: { id: '0b8b8f4e-0d43-4f2c-9a43-1d3b0f5a0019', name: 'Velmara' },
      roles: ['analyst'],
      preferences: { theme: 'system', unit: 'millions', negatives: 'minus' },
    },
  };
}

describe('edits that are kept', () => {
  const anIlvo = as('0b8b8f4e-0d43-4f2c-9a43-1d3b0f5a0018');
  const someoneElse = as('0b8b8f4e-0d43-4f2c-9a43-1d3b0f5a0017');

  function open(): KeptEdits {
    TestBed.resetTestingModule();
    TestBed.configureTestingModule({ providers: [provideHttpClient()] });
    TestBed.inject(SessionStore).accept(anIlvo);
    return TestBed.inject(KeptEdits);
  }

  beforeEach(() => {
    sessionStorage.clear();
  });
  afterEach(() => {
    sessionStorage.clear();
  });

  it('outlive a reload, each with its version', () => {
    expect(open().keep('v1', edits)).toBeTrue();
    expect(open().recall('v1')).toEqual(edits);
    expect(open().recall('v2')).toBeNull();
  });

  it('are gone once there are none', () => {
    const kept = open();
    kept.keep('v1', edits);
    kept.keep('v1', noEdits);
    expect(kept.recall('v1')).toBeNull();
    expect(sessionStorage.length).toBe(0);
  });

  it('outlive the end of a session, leave the storage, and are shown to nobody else', () => {
    const kept = open();
    kept.keep('v1', edits);
    const sessions = TestBed.inject(SessionStore);
    sessions.forget();
    expect(sessionStorage.length).toBe(0);
    sessions.accept(someoneElse);
    expect(kept.recall('v1')).toBeNull();
    sessions.accept(anIlvo);
    expect(kept.recall('v1')).toEqual(edits);
  });

  it('bring note, reasons and sources along, each with its version', () => {
    const draft = {
      note: 'Second look',
      common: { reason: 'Was missing', source: '' },
      own: new Map([[cellKey({ company: 'Kesdrin', year: 2020, column: 1 }), { source: 'p. 81' }]]),
    };
    expect(open().keepDraft('v1', draft)).toBeTrue();
    expect(open().recallDraft('v1')).toEqual(draft);
    expect(open().recallDraft('v2')).toBeNull();
    const kept = open();
    TestBed.inject(SessionStore).accept(someoneElse);
    expect(kept.recallDraft('v1')).toBeNull();
    TestBed.inject(SessionStore).accept(anIlvo);
    kept.keepDraft('v1', emptyDraft);
    expect(kept.recallDraft('v1')).toBeNull();
    expect(sessionStorage.length).toBe(0);
  });

  it('pass over what the storage holds in another form', () => {
    sessionStorage.setItem('kv-panel-edits:v1', '{"cells":');
    expect(open().recall('v1')).toBeNull();
    sessionStorage.setItem('kv-panel-edits:v1', '{"cells":[]}');
    expect(open().recall('v1')).toBeNull();
  });
});
