import { provideHttpClient } from '@angular/common/http';
import {
  HttpTestingController,
  type TestRequest,
  provideHttpClientTesting,
} from '@angular/common/http/testing';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { Router, provideRouter } from '@angular/router';
import {
  type PanelVersionSummary,
  type PeerGroupReply,
  type Role,
  type SavePeerGroup,
  problemType,
} from '@contract';
import { SessionStore } from '../api/session-store';
import { Confirm } from '../ui/confirm';
import type { PanelCompany } from './peer-draft';
import { PeersPage } from './peers-page';
import { AskReason } from './reasons/ask-reason';
import { panelCompany, scatteredCompanies } from './testing/panel-company';

const id = (last: number): string => `0b8b8f4e-0d43-4f2c-9a43-1d3b0f5a00${10 + last}`;

const panelVersion: PanelVersionSummary = {
  id: id(1),
  panelId: id(0),
  parentId: null,
  origin: 'import',
  restoredNumber: null,
  panelName: 'Flow control',
  number: 1,
  currency: 'EUR',
  unit: 'millions',
  note: '',
  companies: 3,
  rows: 33,
  firstYear: 2010,
  lastYear: 2020,
  createdAt: '2026-03-04T12:00:00.000Z',
  createdBy: 'Ilvo Brenn',
  file: { id: id(2), name: 'flow.csv', byteSize: 900, sha256: 'ab'.repeat(32) },
};
const companies: PanelCompany[] = ['Kesdrin', 'Sarvane', 'Velmara'].map((name) =>
  panelCompany(name, { completeRows: name === 'Kesdrin' ? 10 : 11, marketValue: 1234.5 }),
);
const saved: PeerGroupReply = {
  id: id(3),
  number: 1,
  panelVersionId: panelVersion.id,
  ownCompany: 'Velmara',
  peerCount: 2,
  note: 'First choice',
  createdAt: panelVersion.createdAt,
  createdBy: 'Ilvo Brenn',
  peers: [
    { company: 'Kesdrin', isIncluded: true, reason: 'Same customers' },
    { company: 'Sarvane', isIncluded: true, reason: '' },
  ],
};

describe('the Peers page', () => {
  let fixture: ComponentFixture<PeersPage>;
  let http: HttpTestingController;

  function start(roles: Role[]): void {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter([{ path: '**', children: [] }]),
      ],
    });
    TestBed.inject(SessionStore).accept({
      session: {
        person: { id: id(8), name: 'Ilvo Brenn', email: 'ilvo@velmara.example' },
        workspace: { id: id(9), name: 'Velmara' },
        roles,
        preferences: { theme: 'system', unit: 'millions', negatives: 'minus' },
      },
    });
    http = TestBed.inject(HttpTestingController);
    fixture = TestBed.createComponent(PeersPage);
    fixture.detectChanges();
  }

  afterEach(() => {
    http.verify();
  });

  /** An answer passes through promises before a signal shows it. */
  async function settled(): Promise<void> {
    await new Promise((resolve) => setTimeout(resolve));
    await fixture.whenStable();
  }

  async function answer(address: string, body: object): Promise<void> {
    http.expectOne(address).flush(body);
    await settled();
  }

  async function load(
    group: PeerGroupReply | null,
    newer: PanelVersionSummary[] = [],
    listed: readonly PanelCompany[] = companies,
  ): Promise<void> {
    http.expectOne('/api/panel-versions').flush({ versions: [...newer, panelVersion] });
    await answer('/api/peer-groups', { versions: group === null ? [] : [group] });
    if (group !== null) await answer(`/api/peer-groups/${group.id}`, group);
    await answer(`/api/panel-versions/${(newer[0] ?? panelVersion).id}/companies`, {
      companies: listed,
    });
    if (group !== null)
      await answer('/api/desk', { panelVersion, peerGroup: group, fit: null, editionsWaiting: 0 });
  }

  function page(): HTMLElement {
    return fixture.nativeElement as HTMLElement;
  }

  function words(): string {
    return (page().textContent ?? '').replace(/\s+/g, ' ');
  }

  async function writeReason(label: string, reason: string): Promise<void> {
    const field = page().querySelector<HTMLTextAreaElement>(`textarea[aria-label="${label}"]`);
    if (field === null) throw new Error(`expected a field “${label}”; found none`);
    field.value = reason;
    field.dispatchEvent(new Event('input'));
    await settled();
  }

  async function choosePanel(panelVersionId: string): Promise<void> {
    const select = page().querySelector('select')!;
    select.value = panelVersionId;
    select.dispatchEvent(new Event('change'));
    await settled();
  }

  /** The five-measure panel: `Company 1` is the own one, the first half of the others are in. */
  async function loadMany(count = 20): Promise<void> {
    const listed = scatteredCompanies(count).map((company, place) => ({
      ...company,
      attributes: { Industry: place % 3 === 0 ? 'Pumps' : 'Valves' },
    }));
    const peers = listed.slice(1).map(({ name }, place) => ({
      company: name,
      isIncluded: place < count / 2,
      reason: place === 0 ? 'Same customers' : '',
    }));
    await load({ ...saved, ownCompany: 'Company 1', peers }, [], listed);
  }

  /** Companies of a table with their distances, in their order. */
  function listedIn(side: 'in' | 'out'): { readonly company: string; readonly distance: number }[] {
    return [...page().querySelectorAll(`[aria-labelledby="peers-${side}"] td.distance button`)].map(
      (button) => ({
        company: /^Distance of (.*?):/.exec(button.getAttribute('aria-label') ?? '')?.[1] ?? '',
        distance: Number(button.textContent),
      }),
    );
  }

  async function check(label: string): Promise<void> {
    const box = [...page().querySelectorAll('label')].find(
      (each) => each.textContent.trim() === label,
    );
    if (box === undefined) throw new Error(`expected a box “${label}”; found none`);
    box.querySelector('input')!.click();
    await settled();
  }

  async function press(name: string): Promise<void> {
    const button = [...page().querySelectorAll('button')].find(
      (each) => (each.getAttribute('aria-label') ?? each.textContent ?? '').trim() === name,
    );
    if (button === undefined) throw new Error(`expected a button “${name}”; found none`);
    button.click();
    await settled();
  }

  function sent(): { readonly request: TestRequest; readonly body: SavePeerGroup } {
    const request = http.expectOne({ method: 'POST', url: '/api/peer-groups' });
    return { request, body: request.request.body as SavePeerGroup };
  }

  it('counts who is in and out, and lists what has no reason', async () => {
    start(['analyst']);
    await load(saved);
    expect(page().querySelector('h1')?.textContent).toContain('Velmara');
    expect(words()).toContain('2 in, 0 out, 1 reason missing.');
    expect(words()).toContain('before each of these has a reason: Sarvane');
    expect(words()).toContain('10 of 11');
  });

  it('sends the choice on top of the version it started from', async () => {
    start(['analyst']);
    await load(saved);
    await press('Take Sarvane out');
    expect(words()).toContain('1 in, 1 out, 1 reason missing.');
    await writeReason('Why Sarvane is out', 'Another business');
    await press('Save peer group');
    const { request, body } = sent();
    expect(body).toEqual({
      panelVersionId: panelVersion.id,
      ownCompany: 'Velmara',
      note: '',
      parentId: saved.id,
      peers: [
        { company: 'Kesdrin', isIncluded: true, reason: 'Same customers' },
        { company: 'Sarvane', isIncluded: false, reason: 'Another business' },
      ],
    });
    const next: PeerGroupReply = {
      ...saved,
      id: id(4),
      number: 2,
      peerCount: 1,
      peers: body.peers,
    };
    request.flush(next);
    await settled();
    await answer('/api/peer-groups', { versions: [next, saved] });
    expect(words()).toContain('Version 2 shown');
    expect(words()).not.toContain('Save peer group');
  });

  it('keeps what was entered when somebody saved meanwhile, and can save it after theirs', async () => {
    start(['analyst']);
    await load(saved);
    await press('Take Sarvane out');
    await press('Save peer group');
    sent().request.flush(
      {
        type: problemType('stale-version'),
        title: 'A newer version exists',
        status: 409,
        detail: 'Sera Quillon saved version 2 of the peer group meanwhile.',
        latestId: id(5),
      },
      { status: 409, statusText: 'Conflict' },
    );
    await settled();
    expect(words()).toContain('Sera Quillon saved version 2');
    expect(words()).toContain('1 in, 1 out');
    expect(page().querySelector(`a[href="/peers/${id(5)}"]`)).not.toBeNull();
    await press('Save mine after it');
    const { request, body } = sent();
    expect(body.parentId).toBe(id(5));
    request.flush(null, { status: 503, statusText: 'Unavailable' });
    await settled();
    expect(words()).toContain('The server does not answer');
    expect(words()).toContain('1 in, 1 out');
  });

  it('keeps what is written while another panel version loads, and follows the last choice', async () => {
    start(['analyst']);
    const newest = { ...panelVersion, id: id(6), number: 3 };
    const second = { ...panelVersion, id: id(7), number: 2 };
    await load(saved, [newest, second]);
    await choosePanel(second.id);
    const overtaken = http.expectOne(`/api/panel-versions/${second.id}/companies`);
    await choosePanel(panelVersion.id);
    await writeReason('Why Sarvane is in', 'Same buyers');
    await answer(`/api/panel-versions/${panelVersion.id}/companies`, { companies });
    overtaken.flush({ companies: companies.slice(1) });
    await settled();
    expect(words()).toContain('every reason written');
    await press('Save peer group');
    const { request, body } = sent();
    expect(body.panelVersionId).toBe(panelVersion.id);
    expect(body.peers).toEqual([
      { company: 'Kesdrin', isIncluded: true, reason: 'Same customers' },
      { company: 'Sarvane', isIncluded: true, reason: 'Same buyers' },
    ]);
    request.flush({ ...saved, id: id(4), number: 2, peers: body.peers });
    await settled();
    await answer('/api/peer-groups', { versions: [saved] });
  });

  it('keeps what is written while a version is saved, and calls it saved without the list', async () => {
    start(['analyst']);
    await load(saved);
    await press('Take Sarvane out');
    await press('Save peer group');
    const { request, body } = sent();
    await writeReason('Why Sarvane is out', 'Another business');
    request.flush({ ...saved, id: id(4), number: 2, peerCount: 1, peers: body.peers });
    await settled();
    http
      .expectOne('/api/peer-groups')
      .flush(null, { status: 503, statusText: 'Service Unavailable' });
    await settled();
    expect(page().querySelector('[role=alert]')).toBeNull();
    expect(words()).toContain('Version 2 shown');
    await press('Save peer group');
    const again = sent();
    expect(again.body.parentId).toBe(id(4));
    expect(again.body.peers[1].reason).toBe('Another business');
  });

  it('asks before it is left only while something entered is not saved', async () => {
    start(['analyst']);
    await load(saved);
    const ask = spyOn(TestBed.inject(Confirm), 'ask').and.resolveTo(false);
    expect(await fixture.componentInstance.mayLeave()).toBeTrue();
    await press('Take Sarvane out');
    expect(await fixture.componentInstance.mayLeave()).toBeFalse();
    await press('Discard changes');
    expect(await fixture.componentInstance.mayLeave()).toBeTrue();
    expect(ask).toHaveBeenCalledTimes(1);
  });

  it('asks for an own company before a first version can be saved', async () => {
    start(['analyst']);
    await load(null);
    const save = [...page().querySelectorAll('button')].find((each) =>
      each.textContent?.includes('Save peer group'),
    );
    expect(save?.disabled).toBeTrue();
    const own = [...page().querySelectorAll('select')][1];
    own.value = 'Velmara';
    own.dispatchEvent(new Event('change'));
    await settled();
    expect(save?.disabled).toBeFalse();
    expect(words()).toContain('is compared with all 2 other companies of the panel');
  });

  it('lets a CFO read and change nothing', async () => {
    start(['cfo']);
    await load(saved);
    expect(page().querySelector('textarea')).toBeNull();
    expect(page().querySelector('kv-peer-ground')).toBeNull();
    expect(words()).not.toContain('Take out');
    expect(words()).toContain('No reason written');
  });

  it('goes to the reason of the company that the address names', async () => {
    start(['analyst']);
    fixture.componentRef.setInput('company', 'Sarvane');
    document.body.append(page());
    await load(saved);
    expect(document.activeElement?.getAttribute('aria-label')).toBe('Why Sarvane is in');
    fixture.componentRef.setInput('company', 'Kesdrin');
    await settled();
    expect(document.activeElement?.getAttribute('aria-label')).toBe('Why Kesdrin is in');
  });

  it('goes to the row of that company where reasons can only be read', async () => {
    start(['cfo']);
    fixture.componentRef.setInput('company', 'Kesdrin');
    document.body.append(page());
    await load(saved);
    expect(document.activeElement?.textContent).toMatch(/^\s*Kesdrin.*Same customers/s);
  });

  it('stays where it is for a company that is no peer', async () => {
    start(['cfo']);
    fixture.componentRef.setInput('company', 'Velmara');
    document.body.append(page());
    await load(saved);
    expect(page().contains(document.activeElement)).toBeFalse();
  });

  it('finds the company where the list stops short of it', async () => {
    start(['cfo']);
    fixture.componentRef.setInput('company', 'Zorvane');
    document.body.append(page());
    const many = Array.from({ length: 240 }, (_, place) => `Peer ${place}`);
    const names = [...many, 'Velmara', 'Zorvane'];
    const listed = names.map((name) => ({ ...companies[0], name }));
    const peers = [...many, 'Zorvane'].map((company) => ({
      company,
      isIncluded: true,
      reason: company,
    }));
    await load({ ...saved, peers, peerCount: peers.length }, [], listed);
    expect(document.activeElement?.textContent).toMatch(/^\s*Zorvane/);
  });

  it('lists members and candidates nearest first, and members by name on request', async () => {
    start(['analyst']);
    await loadMany();
    for (const side of ['in', 'out'] as const) {
      const distances = listedIn(side).map(({ distance }) => distance);
      expect(distances.length).toBeGreaterThan(8);
      expect(distances).toEqual([...distances].sort((a, b) => a - b));
    }
    const order = page().querySelector<HTMLSelectElement>('.order select')!;
    order.value = 'name';
    order.dispatchEvent(new Event('change'));
    await settled();
    expect(listedIn('in')[0].company).toBe('Company 10');
  });

  it('shows what a distance is made of: parts that add up to its square', async () => {
    start(['cfo']);
    await loadMany();
    const [first] = listedIn('out');
    const button = page().querySelector<HTMLElement>(
      '[aria-labelledby="peers-out"] td.distance button',
    );
    button?.click();
    await settled();
    expect(button?.getAttribute('aria-expanded')).toBe('true');
    const lines = [...page().querySelectorAll('kv-distance-parts tbody tr')];
    const parts = lines.map((line) =>
      Number(line.lastElementChild?.textContent.trim().replace('\u2212', '-')),
    );
    expect(lines.length).toBe(6);
    expect(lines.map((line) => line.textContent).join(' ')).toMatch(/growth\s*[\d.]+ % a year/);
    const sum = parts.slice(0, 5).reduce((total, part) => total + part, 0);
    expect(sum).toBeCloseTo(parts[5], 10);
    expect(Math.abs(parts[5] - first.distance ** 2)).toBeLessThan(0.01 * (2 * first.distance + 1));
    await check('Show the parts of every distance');
    expect(page().querySelectorAll('kv-distance-parts').length).toBe(19 - 1);
  });

  it('counts the measures that the analyst chooses, and says why one does not count', async () => {
    start(['analyst']);
    await loadMany();
    const before = listedIn('out');
    await check('volatility');
    expect(listedIn('out')).not.toEqual(before);
    await check('Robust to outliers');
    await check('volatility');
    await check('Usual');
    expect(listedIn('out')).toEqual(before);
    fixture.destroy();
    fixture = TestBed.createComponent(PeersPage);
    fixture.detectChanges();
    await loadMany(8);
    expect(words()).toContain('does not count: 5 measures need 11 companies');
  });

  it('takes in all candidates that the filters show with one reason, and keeps reasons written', async () => {
    start(['analyst']);
    await loadMany();
    await TestBed.inject(Router).navigate([], { queryParams: { 'with.Industry': 'Pumps' } });
    await settled();
    const shown = listedIn('out').map(({ company }) => company);
    expect(words()).toContain(`${shown.length} of 9 candidates`);
    expect(shown.length).toBeLessThan(9);
    const ask = spyOn(TestBed.inject(AskReason), 'ask').and.resolveTo({
      reason: 'Pumps alike',
      replaces: false,
    });
    await press(`Take all ${shown.length} in with one reason…`);
    expect(ask.calls.mostRecent().args[0].companies).toEqual(shown);
    expect(ask.calls.mostRecent().args[0].reasons).toContain('Same customers');
    expect(words()).toContain(`${10 + shown.length} in, ${9 - shown.length} out`);
    await press('Save peer group');
    const { body } = sent();
    for (const peer of body.peers.filter(({ company }) => shown.includes(company)))
      expect(peer).toEqual({ company: peer.company, isIncluded: true, reason: 'Pumps alike' });
  });

  it('lists the nearest candidates, and more on request or where one of them is asked for', async () => {
    start(['analyst']);
    await loadMany(60);
    const nearest = listedIn('out');
    expect(nearest.length).toBe(20);
    await press('List 9 more');
    const all = listedIn('out');
    expect(all.slice(0, 20)).toEqual(nearest);
    expect(all.length).toBe(29);
    fixture.destroy();
    fixture = TestBed.createComponent(PeersPage);
    fixture.componentRef.setInput('company', all[25].company);
    document.body.append(page());
    fixture.detectChanges();
    await loadMany(60);
    expect(document.activeElement?.getAttribute('aria-label')).toBe(
      `Why ${all[25].company} is out`,
    );
  });

  it('changes nothing where no reason is given for several', async () => {
    start(['analyst']);
    await loadMany();
    spyOn(TestBed.inject(AskReason), 'ask').and.resolveTo(null);
    await press('Leave all 9 out with one reason…');
    expect(words()).toContain('10 in, 9 out, 18 reasons missing.');
  });

  it('says what a newer panel changed of the saved peers, when it is asked', async () => {
    start(['analyst']);
    await load(saved, [{ ...panelVersion, id: id(6), number: 2 }]);
    expect(words()).toContain(
      'The saved peers stand on Flow control v1; Flow control v2 is newer.',
    );
    await press('See what it changed for these companies');
    await answer(`/api/panel-versions/${panelVersion.id}/differences/${id(6)}`, {
      columns: [{ name: 'capex', role: 'capex' }],
      renamed: [],
      money: { currency: 'EUR', unit: 'millions' },
      addedRows: 0,
      removedRows: 0,
      changedCells: 1,
      listed: [
        {
          company: 'Kesdrin',
          year: 2019,
          kind: 'changed-cell',
          column: 'capex',
          before: 1,
          after: 2,
        },
      ],
    });
    expect(words()).toContain('Kesdrin: 1 cell changed');
  });

  it('compares no versions of different panels', async () => {
    start(['analyst']);
    await load(saved, [{ ...panelVersion, id: id(6), panelId: id(7), number: 1 }]);
    expect(page().querySelector('kv-panel-changes')).toBeNull();
  });

  it('offers to bring in a panel where there is none', async () => {
    start(['analyst']);
    http.expectOne('/api/panel-versions').flush({ versions: [] });
    await answer('/api/peer-groups', { versions: [] });
    expect(page().querySelector('a[href="/panel"]')?.textContent).toContain('Bring in a panel');
  });
});
