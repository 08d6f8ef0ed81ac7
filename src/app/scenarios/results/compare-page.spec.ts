import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideRouter, withComponentInputBinding } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import type { ScenarioReply } from '@contract';
import { SessionStore } from '../../api/session-store';
import { routes } from '../scenarios.routes';
import {
  deskReply,
  fitId,
  fitReply,
  heldReading,
  sessionOf,
  storedYears,
} from '../testing/scenario-replies';
import { idsIn } from './compare-reader';

const uuid = (last: number) => `00000000-0000-4000-8000-00000000000${last}`;

function saved(last: number, name: string, of = fitId): ScenarioReply {
  const plan = [{ year: 2026, values: [110 + 10 * last, 1000] }];
  return {
    id: uuid(last),
    fitId: of,
    name,
    note: '',
    version: 1,
    ...heldReading,
    plan,
    years: storedYears(plan),
    copiedFrom: null,
    createdBy: 'M. Oduya',
    updatedBy: 'M. Oduya',
    updatedAt: '2026-11-14T09:00:00.000Z',
  };
}

describe('the ids of an address', () => {
  it('are those that are ids, each once, four at most', () => {
    const all = [1, 2, 2, 3, 4, 5].map(uuid).join(',');
    expect(idsIn(all)).toEqual([1, 2, 3, 4].map(uuid));
    expect(idsIn(`${uuid(1)},1200,../x`)).toEqual([uuid(1)]);
    expect(idsIn(undefined)).toEqual([]);
  });
});

describe('the page of a comparison', () => {
  let http: HttpTestingController;
  let harness: RouterTestingHarness;

  async function opened(ids: readonly number[]): Promise<void> {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter([{ path: 'scenarios', children: routes }], withComponentInputBinding()),
      ],
    });
    http = TestBed.inject(HttpTestingController);
    TestBed.inject(SessionStore).accept(sessionOf('cfo'));
    harness = await RouterTestingHarness.create(`/scenarios/compare?of=${ids.map(uuid).join(',')}`);
    await harness.fixture.whenStable();
  }

  async function text(): Promise<string> {
    await harness.fixture.whenStable();
    return harness.routeNativeElement!.textContent;
  }

  it('shows the scenarios that it names, whoever opens it', async () => {
    await opened([1, 2]);
    http.expectOne('/api/desk').flush(deskReply);
    http.expectOne(`/api/scenarios/${uuid(1)}`).flush(saved(1, 'Build-out'));
    http.expectOne(`/api/scenarios/${uuid(2)}`).flush(saved(2, 'Lower payout'));
    http.expectOne(`/api/fits/${fitId}`).flush(fitReply);
    expect(await text()).toContain('Build-out and Lower payout side by side');
    expect(harness.routeNativeElement!.querySelector('kv-scenario-comparison')).not.toBeNull();
    expect(harness.routeNativeElement!.querySelectorAll('.plan-line').length).toBe(2);
    expect(harness.routeNativeElement!.querySelector('kv-caution-line')).not.toBeNull();
  });

  it('says which are left out, and why', async () => {
    await opened([1, 2, 3]);
    http.expectOne('/api/desk').flush(deskReply);
    http.expectOne(`/api/scenarios/${uuid(1)}`).flush(saved(1, 'Build-out'));
    http.expectOne(`/api/scenarios/${uuid(2)}`).flush(saved(2, 'Older', uuid(7)));
    http
      .expectOne(`/api/scenarios/${uuid(3)}`)
      .flush(null, { status: 404, statusText: 'Not Found' });
    http.expectOne(`/api/fits/${fitId}`).flush(fitReply);
    const shown = await text();
    expect(shown).toContain('Older is read through another fit');
    expect(shown).toContain('One of the scenarios cannot be read');
    expect(shown).toContain('nothing to be compared with');
  });

  it('says what to do where the address names none', async () => {
    await opened([]);
    expect(await text()).toContain('names no scenarios');
  });
});
