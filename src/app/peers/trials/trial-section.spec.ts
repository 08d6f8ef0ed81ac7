import { HttpTestingController, type TestRequest } from '@angular/common/http/testing';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import type { PeerTrialReply } from '@contract';
import { SessionStore } from '../../api/session-store';
import type { PeersStore } from '../peers-store';
import { exampleTrial, fitted } from '../testing/example-trial';
import { flowControl, loadedPeers } from '../testing/loaded-peers';
import { scatteredCompanies } from '../testing/panel-company';
import { TrialSection } from './trial-section';

const outside = ['Company 6', 'Company 7'];
const trialPath = `/api/peer-trials/${exampleTrial().id}`;

describe('what each choice would change, on the page', () => {
  let fixture: ComponentFixture<TrialSection>;
  let page: HTMLElement;
  let http: HttpTestingController;
  let peers: PeersStore;
  const moves: unknown[] = [];

  beforeEach(() => {
    sessionStorage.clear();
    moves.length = 0;
  });
  afterEach(() => {
    http.verify();
    sessionStorage.clear();
  });

  async function open(): Promise<void> {
    ({ peers } = await loadedPeers(scatteredCompanies(7), 'Company 1', outside));
    http = TestBed.inject(HttpTestingController);
    show();
  }

  function show(): void {
    fixture = TestBed.createComponent(TrialSection);
    fixture.componentRef.setInput('source', 'Flow control v1');
    fixture.componentInstance.moved.subscribe((move) => moves.push(move));
    page = fixture.nativeElement as HTMLElement;
    fixture.detectChanges();
  }

  async function settled(): Promise<void> {
    await new Promise((resolve) => setTimeout(resolve));
    await fixture.whenStable();
  }

  const words = () => page.textContent.replace(/\s+/g, ' ');
  const button = (name: string) =>
    [...page.querySelectorAll('button')].find(
      (each) => (each.ariaLabel ?? each.textContent).trim() === name,
    );
  const rowNames = (table: number) =>
    [...page.querySelectorAll('table')[table].querySelectorAll('tbody th')].map((cell) =>
      (cell.firstChild?.textContent ?? '').trim(),
    );

  function press(name: string): void {
    const pressed = button(name);
    pressed?.focus();
    pressed?.click();
  }

  async function compute(name: string): Promise<TestRequest> {
    press(name);
    await settled();
    http.expectOne('/api/desk').flush({
      panelVersion: flowControl,
      peerGroup: null,
      fit: null,
      editionsWaiting: 0,
    });
    await settled();
    return http.expectOne('/api/peer-trials');
  }

  async function flush(request: TestRequest, trial: PeerTrialReply): Promise<void> {
    request.flush(trial);
    await settled();
  }

  it('asks nothing by itself, and says what it would compute', async () => {
    await open();
    expect(words()).toContain('without each of its 4 members');
    expect(words()).toContain('each of the nearest 2 candidates');
    expect(button('Compute the changes')?.disabled).toBeFalse();
  });

  it('shows the changes largest first, with words where something turns', async () => {
    await open();
    const request = await compute('Compute the changes');
    const { peers: sent } = request.request.body as { peers: string[] };
    expect([...sent].sort()).toEqual(['Company 2', 'Company 3', 'Company 4', 'Company 5']);
    await flush(request, exampleTrial());
    expect(words()).toContain('The changes are computed.');
    expect(page.querySelector('h2')?.textContent).toContain(
      'The standing moves most by leaving Company 3 out and taking Company 6 in',
    );
    expect(words()).toContain('As chosen: standing 100.0 (20.0 to 180.0); places 1 to 3 of 5');
    expect(words()).toContain('Standing in EUR m · 95 % intervals');
    expect(rowNames(0)).toEqual(['Company 3', 'Company 4', 'Company 2', 'Company 5']);
    expect(words()).toContain('interval of the standing starts to hold zero');
    expect(words()).toContain('slope of capex changes sign');
    expect(words()).toContain('A regressor never changes within a company. (outlay)');
    expect(words()).toContain('None of these moves places');
    expect(page.querySelector('kv-caution-line')).not.toBeNull();
    expect(button('Compute for this choice')).toBeUndefined();
  });

  it('is ordered by a column whose header is pressed, and says so', async () => {
    await open();
    await flush(await compute('Compute the changes'), exampleTrial());
    const [table] = page.querySelectorAll('table');
    const header = [...table.querySelectorAll('thead button')].find((each) =>
      each.textContent.includes('Company'),
    ) as HTMLButtonElement;
    header.click();
    await settled();
    expect(rowNames(0)[0]).toBe('Company 2');
    expect(header.closest('th')?.getAttribute('aria-sort')).toBe('ascending');
    expect(words()).toContain('Ordered by company, ascending');
  });

  it('counts the groups while they are fitted, and can be cancelled', async () => {
    await open();
    const running = exampleTrial({
      state: 'running',
      progress: { done: 2, total: 7 },
      without: [
        { company: 'Company 2', outcome: fitted([110, 30, 190], [1, 3], 0.5) },
        { company: 'Company 3', outcome: null },
      ],
      taking: [],
    });
    await flush(await compute('Compute the changes'), running);
    expect(words()).toContain('Groups fitted: 2 of 7');
    expect(words()).toContain('not computed yet');
    expect(document.activeElement?.tagName).toBe('H2');
    expect(words()).toContain('The changes are being computed.');
    press('Cancel');
    await settled();
    http.expectOne({ method: 'DELETE', url: trialPath }).flush(null);
    await new Promise((resolve) => setTimeout(resolve, 550));
    http.expectOne(trialPath).flush({ ...running, state: 'cancelled' });
    await settled();
    expect(words()).toContain('Cancelled: what was computed until then is shown.');
    expect(button('Compute for this choice')).toBeDefined();
    expect(document.activeElement?.tagName).toBe('H2');
  });

  it('stays marked as of an earlier choice once the choice is another one', async () => {
    await open();
    await flush(await compute('Compute the changes'), exampleTrial());
    button('Take Company 6 in')?.click();
    expect(moves).toEqual([{ company: 'Company 6', isIncluded: true }]);
    peers.change('Company 6', { isIncluded: true });
    await settled();
    expect(words()).toContain('These figures are of an earlier choice.');
    expect(button('Take Company 6 in')).toBeUndefined();
    expect(button('Take Company 2 out')).toBeDefined();
    const { request } = await compute('Compute for this choice');
    expect((request.body as { peers: string[] }).peers).toContain('Company 6');
  });

  it('is found again after a reload, and forgotten where it is not there any more', async () => {
    await open();
    await flush(await compute('Compute the changes'), exampleTrial());
    fixture.destroy();
    show();
    http.expectOne(trialPath).flush(exampleTrial());
    await settled();
    expect(rowNames(0)[0]).toBe('Company 3');
    fixture.destroy();
    show();
    http
      .expectOne(trialPath)
      .flush(
        { type: 'https://kinvale.example/problems/not-found', title: 'x', status: 404 },
        { status: 404, statusText: 'Not Found' },
      );
    await settled();
    expect(button('Compute the changes')).toBeDefined();
    expect(sessionStorage.length).toBe(0);
  });

  it('leaves nothing in the browser once the session ends', async () => {
    await open();
    await flush(await compute('Compute the changes'), exampleTrial());
    expect(sessionStorage.length).toBe(1);
    TestBed.inject(SessionStore).forget();
    expect(sessionStorage.length).toBe(0);
  });

  it('says why the server refused', async () => {
    await open();
    const request = await compute('Compute the changes');
    request.flush(
      {
        type: 'https://kinvale.example/problems/too-many-requests',
        title: 'Too many requests',
        status: 429,
        detail: '3 choices of this workspace are being tried out.',
      },
      { status: 429, statusText: 'Too Many Requests' },
    );
    await settled();
    expect(words()).toContain('3 choices of this workspace are being tried out.');
  });
});
