import { provideHttpClient } from '@angular/common/http';
import {
  HttpTestingController,
  type TestRequest,
  provideHttpClientTesting,
} from '@angular/common/http/testing';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import {
  type PanelVersionSummary,
  type PeerGroupReply,
  type Role,
  type SavePeerGroup,
} from '@contract';
import { SessionStore } from '../../api/session-store';
import type { PanelCompany } from '../peer-draft';
import { PeersPage } from '../peers-page';
import { flowControl } from './loaded-peers';
import { panelCompany, scatteredCompanies } from './panel-company';
import { specId } from './peer-version';

export const companies: PanelCompany[] = ['Kesdrin', 'Sarvane', 'Velmara'].map((name) =>
  panelCompany(name, { completeRows: name === 'Kesdrin' ? 10 : 11, marketValue: 1234.5 }),
);
export const saved: PeerGroupReply = {
  id: specId(3),
  number: 1,
  panelVersionId: flowControl.id,
  ownCompany: 'Velmara',
  peerCount: 2,
  note: 'First choice',
  createdAt: flowControl.createdAt,
  createdBy: 'Ilvo Brenn',
  peers: [
    { company: 'Kesdrin', isIncluded: true, reason: 'Same customers' },
    { company: 'Sarvane', isIncluded: true, reason: '' },
  ],
};

/** The Peers page before a server of the spec's making; checks after each spec that every request was answered. */
export function peersBench() {
  let fixture: ComponentFixture<PeersPage>;
  let http: HttpTestingController;

  /** The page, on the company that its address names where there is one. */
  function open(company?: string): void {
    fixture = TestBed.createComponent(PeersPage);
    fixture.componentRef.setInput('company', company);
    fixture.detectChanges();
  }

  function start(roles: Role[], company?: string): void {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter([{ path: '**', children: [] }]),
      ],
    });
    TestBed.inject(SessionStore).accept({
      session: {
        person: { id: specId(8), name: 'Ilvo Brenn', email: 'ilvo@velmara.example' },
        workspace: { id: specId(9), name: 'Velmara' },
        roles,
        preferences: { theme: 'system', unit: 'millions', negatives: 'minus' },
      },
    });
    http = TestBed.inject(HttpTestingController);
    open(company);
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
    http.expectOne('/api/panel-versions').flush({ versions: [...newer, flowControl] });
    await answer('/api/peer-groups', { versions: group === null ? [] : [group] });
    if (group !== null) await answer(`/api/peer-groups/${group.id}`, group);
    await answer(`/api/panel-versions/${(newer[0] ?? flowControl).id}/companies`, {
      companies: listed,
    });
    if (group !== null)
      await answer('/api/desk', {
        panelVersion: flowControl,
        peerGroup: group,
        fit: null,
        editionsWaiting: 0,
      });
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
    const select = page().querySelector('select');
    if (select === null) throw new Error('expected the list of panel versions; found none');
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
    box.querySelector('input')?.click();
    await settled();
  }

  async function press(name: string): Promise<void> {
    const button = [...page().querySelectorAll('button')].find(
      (each) => (each.getAttribute('aria-label') ?? each.textContent ?? '').trim() === name,
    );
    if (button === undefined) throw new Error(`expected a button “${name}”; found none`);
    button.focus();
    button.click();
    await settled();
  }

  function sent(): { readonly request: TestRequest; readonly body: SavePeerGroup } {
    const request = http.expectOne({ method: 'POST', url: '/api/peer-groups' });
    return { request, body: request.request.body as SavePeerGroup };
  }

  return {
    page,
    start,
    settled,
    answer,
    load,
    words,
    writeReason,
    choosePanel,
    loadMany,
    listedIn,
    check,
    press,
    sent,
    /** The page's component and how it is drawn. */
    drawn: (): ComponentFixture<PeersPage> => fixture,
    server: (): HttpTestingController => http,
    /** Draws the page anew, as somebody does who comes back to it. */
    reopen: (company?: string): void => {
      fixture.destroy();
      open(company);
    },
  };
}
