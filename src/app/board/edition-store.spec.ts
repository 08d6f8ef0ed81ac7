import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import type { EditionReply } from '@contract';
import { EditionStore } from './edition-store';
import { editionReply, editionSummary } from './testing/edition-content';

const seventh = editionReply;
const eighth: EditionReply = {
  ...seventh,
  edition: {
    ...editionSummary,
    id: '0b8b8f4e-0d43-4f2c-9a43-1d3b0f5a0099',
    number: editionSummary.number + 1,
  },
};

describe('EditionStore', () => {
  let http: HttpTestingController;
  let store: EditionStore;

  beforeEach(() => {
    TestBed.configureTestingModule({
      providers: [EditionStore, provideHttpClient(), provideHttpClientTesting()],
    });
    http = TestBed.inject(HttpTestingController);
    store = TestBed.inject(EditionStore);
  });
  afterEach(() => {
    http.verify();
  });

  function open(reply: EditionReply): void {
    store.load(reply.edition.id);
    http.expectOne(`/api/editions/${reply.edition.id}`).flush(reply);
    http.expectOne('/api/editions').flush({ editions: [seventh.edition, eighth.edition] });
  }

  function shown(): EditionReply {
    const view = store.view();
    if (view.kind !== 'ready') throw new Error(`expected an edition; found ${view.kind}`);
    return view.reply;
  }

  it('shows a decision on the edition that it was made on', async () => {
    open(seventh);
    const decided = store.sign('a long passphrase');
    http
      .expectOne(`/api/editions/${seventh.edition.id}/sign`)
      .flush({ ...seventh, maySign: false });
    expect(await decided).toBeNull();
    expect(shown()).toEqual({ ...seventh, maySign: false });
  });

  it('does not put a decision’s reply in the place of another edition', async () => {
    open(seventh);
    const decided = store.sign('a long passphrase');
    open(eighth);
    http
      .expectOne(`/api/editions/${seventh.edition.id}/sign`)
      .flush({ ...seventh, maySign: false });
    expect(await decided).toBeNull();
    expect(shown()).toEqual(eighth);
  });
});
