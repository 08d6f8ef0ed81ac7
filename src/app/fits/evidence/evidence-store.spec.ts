import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { Bootstrap, EvidenceReply, EvidenceStateReply } from '@contract';
import { EvidenceStore } from './evidence-store';
import { exampleEvidence } from './testing/example-evidence';

const ready = (bootstrap: Bootstrap | null = null): EvidenceReply => ({
  state: 'ready',
  evidence: exampleEvidence,
  bootstrap,
});

describe('the store of a fit’s evidence', () => {
  let store: EvidenceStore;
  let http: HttpTestingController;

  beforeEach(() => {
    TestBed.configureTestingModule({
      providers: [
        EvidenceStore,
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter([]),
      ],
    });
    store = TestBed.inject(EvidenceStore);
    http = TestBed.inject(HttpTestingController);
    jasmine.clock().install();
  });

  afterEach(() => {
    jasmine.clock().uninstall();
    http.verify();
  });

  /** Lets the next look happen, and what waits for a reply go on. */
  async function pass(ms: number): Promise<void> {
    jasmine.clock().tick(ms);
    for (let turn = 0; turn < 5; turn += 1) await Promise.resolve();
  }

  async function answer(fitId: string, reply: EvidenceReply): Promise<void> {
    await pass(0);
    http.expectOne(`/api/fits/${fitId}/evidence`).flush(reply);
  }

  async function answerState(fitId: string, reply: EvidenceStateReply): Promise<void> {
    await pass(400);
    http.expectOne(`/api/fits/${fitId}/evidence/state`).flush(reply);
  }

  it('is idle, then loading, then ready, and asks no more', async () => {
    expect(store.view().kind).toBe('idle');
    store.show('a');
    expect(store.view().kind).toBe('loading');
    await answer('a', ready());
    expect(store.view()).toEqual({ kind: 'ready', evidence: exampleEvidence, bootstrap: null });
    await pass(5000);
  });

  it('asks for the state alone while the evidence is being computed', async () => {
    store.show('a');
    await answer('a', { state: 'computing' });
    expect(store.view().kind).toBe('computing');
    await answerState('a', { state: 'computing', bootstrap: null });
    expect(store.view().kind).toBe('computing');
    await answerState('a', { state: 'ready', bootstrap: null });
    await answer('a', ready());
    expect(store.view().kind).toBe('ready');
    await pass(5000);
  });

  it('says why there is none', async () => {
    store.show('a');
    await answer('a', { state: 'unavailable', reason: 'Fit again.' });
    expect(store.view()).toEqual({ kind: 'unavailable', reason: 'Fit again.' });
  });

  it('drops a reply that another fit has overtaken', async () => {
    store.show('a');
    await pass(0);
    const first = http.expectOne('/api/fits/a/evidence');
    store.show('b');
    expect(first.cancelled).toBeTrue();
    await answer('b', { state: 'unavailable', reason: 'Of b.' });
    expect(store.view()).toEqual({ kind: 'unavailable', reason: 'Of b.' });
  });

  it('fails with the problem, and loads again when asked', async () => {
    store.show('a');
    await pass(0);
    http
      .expectOne('/api/fits/a/evidence')
      .flush({ title: 'Broken' }, { status: 500, statusText: 'Broken' });
    expect(store.view().kind).toBe('failed');
    store.show('a');
    await answer('a', ready());
    expect(store.view().kind).toBe('ready');
  });

  it('runs a bootstrap with its seed and follows its draws until it is done', async () => {
    store.show('a');
    await answer('a', ready());
    void store.startBootstrap(7);
    const started: Bootstrap = { seed: 7, state: 'queued', progress: null, failure: null };
    const post = http.expectOne({ method: 'POST', url: '/api/fits/a/bootstrap' });
    expect(post.request.body).toEqual({ seed: 7 });
    post.flush(started);
    await pass(0);
    const running: Bootstrap = {
      ...started,
      state: 'running',
      progress: { done: 4000, total: 9999 },
    };
    await answer('a', ready(running));
    expect(store.view()).toEqual({ kind: 'ready', evidence: exampleEvidence, bootstrap: running });
    const further: Bootstrap = { ...running, progress: { done: 8000, total: 9999 } };
    await answerState('a', { state: 'ready', bootstrap: further });
    expect(store.view()).toEqual({ kind: 'ready', evidence: exampleEvidence, bootstrap: further });
    const ended: Bootstrap = { ...started, state: 'done' };
    await answerState('a', { state: 'ready', bootstrap: ended });
    await answer('a', ready(ended));
    expect(store.view()).toEqual({ kind: 'ready', evidence: exampleEvidence, bootstrap: ended });
    await pass(5000);
    expect(store.problem()).toBeNull();
  });

  it('keeps the evidence when a bootstrap cannot be started, and says why', async () => {
    store.show('a');
    await answer('a', ready());
    const asked = store.startBootstrap(1);
    http
      .expectOne('/api/fits/a/bootstrap')
      .flush({ title: 'Another is under way' }, { status: 409, statusText: 'Conflict' });
    await asked;
    expect(store.view().kind).toBe('ready');
    expect(store.problem()).not.toBeNull();
  });

  it('keeps the evidence when the draws can no longer be followed, and follows again when asked', async () => {
    const running: Bootstrap = { seed: 1, state: 'running', progress: null, failure: null };
    store.show('a');
    await answer('a', ready(running));
    await pass(400);
    http
      .expectOne('/api/fits/a/evidence/state')
      .flush({ title: 'Broken' }, { status: 500, statusText: 'Broken' });
    expect(store.view()).toEqual({ kind: 'ready', evidence: exampleEvidence, bootstrap: running });
    expect(store.problem()).not.toBeNull();
    await pass(5000);
    store.show('a');
    expect(store.problem()).toBeNull();
    const ended: Bootstrap = { ...running, state: 'done' };
    await answer('a', ready(ended));
    expect(store.view()).toEqual({ kind: 'ready', evidence: exampleEvidence, bootstrap: ended });
  });

  it('cancels the bootstrap and looks again', async () => {
    store.show('a');
    await answer('a', ready());
    void store.cancelBootstrap();
    http
      .expectOne({ method: 'DELETE', url: '/api/fits/a/bootstrap' })
      .flush(null, { status: 204, statusText: 'No content' });
    await pass(0);
    const cancelled: Bootstrap = { seed: 1, state: 'cancelled', progress: null, failure: null };
    await answer('a', ready(cancelled));
    expect(store.view()).toEqual({
      kind: 'ready',
      evidence: exampleEvidence,
      bootstrap: cancelled,
    });
  });

  it('stops asking when its page is left', async () => {
    store.show('a');
    await answer('a', { state: 'computing' });
    TestBed.resetTestingModule();
    await pass(5000);
    expect(store.view().kind).toBe('computing');
  });
});
