import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { type ScenarioReply, problemType } from '@contract';
import { SessionStore } from '../api/session-store';
import { withValue } from '../ui/plan/change-plan';
import { ProblemBannerState } from '../ui/problem';
import { DraftKeeper } from './draft-keeper';
import { ScenarioStore } from './scenario-store';
import { ScenarioEdits } from './scenario-edits';
import { ScenarioShelf } from './scenario-shelf';
import { ScenarioState } from './scenario-state';
import {
  deskReply,
  fitId,
  fitReply,
  heldReading,
  sessionOf,
  storedYears,
} from './testing/scenario-replies';

const scenarioId = '00000000-0000-4000-8000-000000000009';

/** A stored scenario with the figures that its plan has. */
function scenario(version: number, capex: number, name = 'Build-out'): ScenarioReply {
  const plan = [{ year: 2026, values: [capex, 1000] }];
  return {
    id: scenarioId,
    fitId,
    name,
    note: '',
    version,
    ...heldReading,
    plan,
    years: storedYears(plan),
    copiedFrom: null,
    createdBy: 'M. Oduya',
    updatedBy: version === 1 ? 'M. Oduya' : 'I. Vandresson',
    updatedAt: '2026-11-14T09:00:00.000Z',
  };
}

describe('a scenario on the page', () => {
  let http: HttpTestingController;
  let store: ScenarioStore;
  let edits: ScenarioEdits;
  let shelf: ScenarioShelf;

  beforeEach(() => {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter([]),
        DraftKeeper,
        ScenarioState,
        ScenarioEdits,
        ScenarioShelf,
        ScenarioStore,
      ],
    });
    http = TestBed.inject(HttpTestingController);
    TestBed.inject(SessionStore).accept(sessionOf('analyst'));
    store = TestBed.inject(ScenarioStore);
    edits = TestBed.inject(ScenarioEdits);
    shelf = TestBed.inject(ScenarioShelf);
    localStorage.clear();
    jasmine.clock().install();
  });
  afterEach(async () => {
    // A draft that still waits goes out before the page is gone.
    jasmine.clock().tick(1000);
    await settled();
    http.match(({ url, method }) => url === draftPath && method === 'PUT');
    jasmine.clock().uninstall();
    http.verify();
  });

  const draftPath = `/api/fits/${fitId}/draft`;

  /** Lets promises run that stand between an answer and the next request. */
  async function settled(): Promise<void> {
    for (let turn = 0; turn < 12; turn += 1) await Promise.resolve();
  }

  function openSaved(draft: object | null = null): void {
    store.open({ scenarioId, fitId: null });
    answerSaved(draft);
  }

  function answerSaved(draft: object | null = null): void {
    http.expectOne(`/api/scenarios/${scenarioId}`).flush(scenario(1, 120));
    http.expectOne('/api/desk').flush(deskReply);
    http.expectOne(`/api/fits/${fitId}`).flush(fitReply);
    http.expectOne(`/api/fits/${fitId}/scenarios`).flush({ scenarios: [scenario(1, 120)] });
    http.expectOne(`${draftPath}?scenario=${scenarioId}`).flush({ draft });
  }

  function openNew(): void {
    store.open({ scenarioId: null, fitId: null });
    http.expectOne('/api/desk').flush(deskReply);
    http.expectOne(`/api/fits/${fitId}`).flush(fitReply);
    http.expectOne(`/api/fits/${fitId}/scenarios`).flush({ scenarios: [] });
    http.expectOne(draftPath).flush({ draft: null });
  }

  const planCapex = (capex: number): void => {
    const plan = withValue(store.text().plan, 2026, 0, capex);
    edits.change({ plan }, { words: 'Capex FY2026' });
  };

  it('starts a new plan from the last actual values of the newest fit', () => {
    openNew();
    expect(store.text().plan.map(({ year }) => year)).toEqual([2026, 2027, 2028]);
    expect(store.reading()?.years[2].difference.estimate).toBe(0);
    expect(store.isChanged()).toBeFalse();
  });

  it('asks for the same address again when reading it failed', () => {
    store.open({ scenarioId, fitId: null });
    http
      .expectOne(`/api/scenarios/${scenarioId}`)
      .flush(null, { status: 503, statusText: 'Service Unavailable' });
    expect(store.view().kind).toBe('failed');
    store.retry();
    expect(store.view().kind).toBe('loading');
    answerSaved();
    expect(store.ground()?.saved?.id).toBe(scenarioId);
    expect(store.text().plan[0].values[0]).toBe(120);
  });

  it('follows each change at once, and keeps a draft once changes pause', async () => {
    openNew();
    planCapex(130);
    planCapex(140);
    expect(store.reading()?.years[0].difference.estimate).toBe(60);
    jasmine.clock().tick(799);
    await settled();
    http.expectNone(draftPath);
    jasmine.clock().tick(1);
    await settled();
    const kept = http.expectOne(draftPath);
    const body = kept.request.body as { plan: { values: number[] }[] };
    expect(kept.request.method).toBe('PUT');
    expect(body.plan[0].values[0]).toBe(140);
    kept.flush({ draft: { ...body, updatedAt: '2026-11-14T09:00:00.000Z' } });
    await settled();
    expect(store.draftState()).toBe('kept');
  });

  it('saves a new version, and says that the server computed the same', async () => {
    openSaved();
    planCapex(150);
    const saving = store.save();
    await settled();
    const request = http.expectOne(`/api/scenarios/${scenarioId}`);
    expect((request.request.body as { version: number }).version).toBe(1);
    request.flush(scenario(2, 150));
    expect((await saving)?.version).toBe(2);
    expect(store.confirmation()).toEqual({ kind: 'agrees', version: 2 });
    expect(store.isChanged()).toBeFalse();
    jasmine.clock().tick(2000);
    await settled();
  });

  it('keeps what was changed while a new plan was being saved, as a draft of the saved one', async () => {
    openNew();
    edits.rename({ name: 'Build-out' });
    planCapex(150);
    const saving = store.save();
    await settled();
    planCapex(160);
    http.expectOne('/api/scenarios').flush(scenario(1, 150));
    await settled();
    http.expectOne(draftPath).flush(null);
    expect((await saving)?.version).toBe(1);
    expect(store.text().plan[0].values[0]).toBe(160);
    expect(store.isChanged()).toBeTrue();
    expect(store.confirmation()).toBeNull();
    jasmine.clock().tick(800);
    await settled();
    const kept = http.expectOne(draftPath).request.body as {
      scenarioId: string;
      plan: { values: number[] }[];
    };
    expect(kept.scenarioId).toBe(scenarioId);
    expect(kept.plan[0].values[0]).toBe(160);
  });

  it('leaves the plan alone that the page has gone on to when a reply comes late', async () => {
    openSaved();
    planCapex(150);
    const saving = store.save();
    await settled();
    store.open({ scenarioId: null, fitId });
    http.expectOne('/api/desk').flush(deskReply);
    http.expectOne(`/api/fits/${fitId}`).flush(fitReply);
    http.expectOne(`/api/fits/${fitId}/scenarios`).flush({ scenarios: [] });
    http.expectOne(draftPath).flush({ draft: null });
    http.expectOne(`/api/scenarios/${scenarioId}`).flush(scenario(2, 150));
    await saving;
    expect(store.ground()?.saved).toBeNull();
    expect(store.text().name).toBe('');
    expect(store.text().plan[0].values[0]).toBe(110);
    expect(store.confirmation()).toBeNull();
  });

  it('says in the banner what failed for a plan that was left, and keeps its draft', async () => {
    openSaved();
    planCapex(150);
    const saving = store.save();
    await settled();
    openNew();
    http
      .expectOne(`/api/scenarios/${scenarioId}`)
      .flush(
        { type: problemType('stale-version'), title: 'Conflict', status: 409, detail: 'Version 2' },
        { status: 409, statusText: 'Conflict' },
      );
    expect(await saving).toBeNull();
    expect(store.theirs()).toBeNull();
    expect(TestBed.inject(ProblemBannerState).problem()).not.toBeNull();
    await settled();
    const kept = http.expectOne(draftPath).request.body as { scenarioId: string };
    expect(kept.scenarioId).toBe(scenarioId);
  });

  it('names the years for which the server computed something else', async () => {
    openSaved();
    planCapex(150);
    const saving = store.save();
    await settled();
    http.expectOne(`/api/scenarios/${scenarioId}`).flush({
      ...scenario(2, 150),
      years: scenario(2, 151).years,
    });
    await saving;
    expect(store.confirmation()).toEqual({ kind: 'differs', version: 2, years: [2026] });
  });

  /** One's own plan has 150, and the version that somebody else stored meanwhile 200. */
  async function meet(): Promise<void> {
    openSaved();
    planCapex(150);
    const saving = store.save();
    await settled();
    const stale = {
      type: problemType('stale-version'),
      title: 'Conflict',
      status: 409,
      detail: 'I. Vandresson saved version 2 of this scenario meanwhile.',
    };
    http
      .expectOne(`/api/scenarios/${scenarioId}`)
      .flush(stale, { status: 409, statusText: 'Conflict' });
    await settled();
    http.expectOne(`/api/scenarios/${scenarioId}`).flush(scenario(2, 200));
    expect(await saving).toBeNull();
  }

  it('puts the version that somebody else saved meanwhile beside one’s own, and saves neither', async () => {
    await meet();
    expect(store.theirs()?.plan[0].values[0]).toBe(200);
    expect(store.text().plan[0].values[0]).toBe(150);
    expect(store.problem()).toBeNull();
    expect(await store.save()).toBeNull();
  });

  it('goes on from both versions with what was chosen, and can take the choice back', async () => {
    await meet();
    store.meetTheirs({ ...store.text(), plan: [{ year: 2026, values: [200, 1000] }] });
    expect(store.theirs()).toBeNull();
    expect(store.isChanged()).toBeFalse();
    expect(edits.undo()).toBe('what was chosen of both versions');
    expect(store.text().plan[0].values[0]).toBe(150);
    const saving = store.save();
    await settled();
    const request = http.expectOne(`/api/scenarios/${scenarioId}`);
    expect((request.request.body as { version: number }).version).toBe(2);
    request.flush(scenario(3, 150));
    expect((await saving)?.version).toBe(3);
  });

  it('still shows both versions after a reload, though the draft is the newer one', async () => {
    await meet();
    jasmine.clock().tick(800);
    await settled();
    const { body } = http.expectOne(draftPath).request;
    store.retry();
    http.expectOne(`/api/scenarios/${scenarioId}`).flush(scenario(2, 200));
    http.expectOne('/api/desk').flush(deskReply);
    http.expectOne(`/api/fits/${fitId}`).flush(fitReply);
    http.expectOne(`/api/fits/${fitId}/scenarios`).flush({ scenarios: [scenario(2, 200)] });
    const draft = { ...(body as object), updatedAt: '2026-11-14T10:00:00.000Z' };
    http.expectOne(`${draftPath}?scenario=${scenarioId}`).flush({ draft });
    expect(store.theirs()?.version).toBe(2);
    expect(store.text().plan[0].values[0]).toBe(150);
  });

  it('saves how a plan came about and is looked at, and keeps it in the draft', async () => {
    openSaved();
    const outlook = { ...heldReading.outlook, confidence: 0.9 };
    const rules = [
      { rule: { kind: 'grow', percent: 5 } as const, moves: [] },
      ...heldReading.rules.slice(1),
    ];
    const uncertainty = { seed: 7, ranges: [[{ low: 100, high: 140 }, null]] };
    edits.change({ outlook, rules, uncertainty }, { words: 'the outlook' });
    jasmine.clock().tick(800);
    await settled();
    const draft = http.expectOne(draftPath);
    expect(draft.request.body).toEqual(jasmine.objectContaining({ outlook, rules, uncertainty }));
    draft.flush({
      draft: { ...(draft.request.body as object), updatedAt: '2026-11-14T10:00:00.000Z' },
    });
    const saving = store.save();
    await settled();
    const request = http.expectOne(`/api/scenarios/${scenarioId}`);
    expect(request.request.body).toEqual(jasmine.objectContaining({ outlook, rules, uncertainty }));
    request.flush({ ...scenario(2, 120), outlook, rules, uncertainty });
    await saving;
    expect(store.isChanged()).toBeFalse();
  });

  it('goes back and forth over changes of the plan', () => {
    openNew();
    planCapex(130);
    planCapex(140);
    expect(edits.undo()).toBe('Capex FY2026');
    expect(store.text().plan[0].values[0]).toBe(130);
    edits.redo();
    expect(store.text().plan[0].values[0]).toBe(140);
    edits.undo();
    edits.undo();
    expect(edits.undo()).toBeNull();
    expect(store.isChanged()).toBeFalse();
  });

  it('saves the plan as a copy beside the scenario that it came from', async () => {
    openSaved();
    planCapex(150);
    const saving = store.saveAsCopy();
    await settled();
    const request = http.expectOne('/api/scenarios');
    expect((request.request.body as { name: string }).name).toBe('Build-out (copy)');
    request.flush({ ...scenario(1, 150), id: '00000000-0000-4000-8000-00000000000a' });
    await settled();
    http.expectOne(`${draftPath}?scenario=${scenarioId}`).flush(null);
    await saving;
    expect(store.ground()?.scenarios.length).toBe(2);
  });

  it('brings an unsaved plan back, and goes back to what is stored when it is discarded', async () => {
    openSaved({
      scenarioId,
      name: 'Build-out',
      note: 'half done',
      ...heldReading,
      plan: [{ year: 2026, values: [170, 1000] }],
      updatedAt: '2026-11-14T08:00:00.000Z',
    });
    expect(store.restoredAt()).toBe('2026-11-14T08:00:00.000Z');
    expect(store.text().plan[0].values[0]).toBe(170);
    const discarding = store.discard();
    await settled();
    http.expectOne(`${draftPath}?scenario=${scenarioId}`).flush(null);
    await discarding;
    expect(store.text().plan[0].values[0]).toBe(120);
    expect(store.restoredAt()).toBeNull();
  });

  it('takes a scenario away and puts it back', async () => {
    openSaved();
    const removing = shelf.remove(scenario(1, 120));
    await settled();
    http.expectOne(`/api/scenarios/${scenarioId}`).flush(null);
    expect(await removing).toBeTrue();
    expect(store.ground()?.scenarios).toEqual([]);
    const restoring = shelf.restore(scenario(1, 120));
    await settled();
    http.expectOne(`/api/scenarios/${scenarioId}/restore`).flush(scenario(1, 120));
    expect(await restoring).toBeTrue();
    expect(store.ground()?.scenarios.length).toBe(1);
  });

  it('puts a scenario of another fit back without listing it on this one', async () => {
    openSaved();
    const ofAnother = { ...scenario(1, 120), fitId: '00000000-0000-4000-8000-00000000000f' };
    const elsewhere = { ...ofAnother, id: '00000000-0000-4000-8000-00000000000b' };
    const restoring = shelf.restore(elsewhere);
    http.expectOne(`/api/scenarios/${elsewhere.id}/restore`).flush(elsewhere);
    expect(await restoring).toBeTrue();
    expect(store.ground()?.scenarios.map(({ id }) => id)).toEqual([scenarioId]);
  });

  it('keeps the draft again when the scenario could not be taken away', async () => {
    openSaved();
    planCapex(150);
    const removing = shelf.remove(scenario(1, 120));
    await settled();
    http
      .expectOne(`/api/scenarios/${scenarioId}`)
      .flush(null, { status: 503, statusText: 'Service Unavailable' });
    expect(await removing).toBeFalse();
    expect(store.problem()).not.toBeNull();
    jasmine.clock().tick(800);
    await settled();
    const kept = http.expectOne(draftPath).request.body as { plan: { values: number[] }[] };
    expect(kept.plan[0].values[0]).toBe(150);
  });

  it('keeps an edit made while the draft was being discarded', async () => {
    openSaved();
    planCapex(150);
    const discarding = store.discard();
    await settled();
    planCapex(170);
    http.expectOne(`${draftPath}?scenario=${scenarioId}`).flush(null);
    await discarding;
    expect(store.text().plan[0].values[0]).toBe(170);
  });

  it('moves for a CFO without asking for a draft or keeping one', async () => {
    TestBed.inject(SessionStore).accept(sessionOf('cfo'));
    store.open({ scenarioId: null, fitId });
    http.expectOne('/api/desk').flush(deskReply);
    http.expectOne(`/api/fits/${fitId}`).flush(fitReply);
    http.expectOne(`/api/fits/${fitId}/scenarios`).flush({ scenarios: [] });
    planCapex(150);
    jasmine.clock().tick(5000);
    await settled();
    expect(store.maySave()).toBeFalse();
    expect(store.reading()?.years[0].difference.estimate).toBe(80);
  });
});
