import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { Router, provideRouter } from '@angular/router';
import type { DeskReply, Role } from '@contract';
import { SessionStore } from '../api/session-store';
import { FitHome } from './fit-home';
import { exampleDesk, exampleFit, examplePanelVersion } from './testing/example-fit';

describe('the way to a fit', () => {
  let fixture: ComponentFixture<FitHome>;
  let http: HttpTestingController;
  const group = exampleFit.peerGroup;

  async function open(desk: DeskReply, roles: Role[], peerGroupId?: string): Promise<void> {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter([{ path: '**', children: [] }]),
      ],
    });
    TestBed.inject(SessionStore).accept({
      session: {
        person: { id: exampleFit.fit.id, name: 'Ilvo Brenn', email: 'ilvo@velmara.example' },
        workspace: { id: exampleFit.fit.id, name: 'Velmara' },
        roles,
        preferences: { theme: 'system', unit: 'millions', negatives: 'minus' },
      },
    });
    http = TestBed.inject(HttpTestingController);
    fixture = TestBed.createComponent(FitHome);
    fixture.componentRef.setInput('peerGroupId', peerGroupId);
    await settled();
    http.expectOne('/api/desk').flush(desk);
    await settled();
  }

  async function settled(): Promise<void> {
    fixture.detectChanges();
    await new Promise((resolve) => setTimeout(resolve));
    fixture.detectChanges();
  }

  /** The peer group and the panel's columns, and the list of fits under the offer. */
  async function answerGround(): Promise<void> {
    http.expectOne(`/api/peer-groups/${group.id}`).flush({ ...group, peers: [] });
    await settled();
    http.expectOne(`/api/panel-versions/${examplePanelVersion.id}`).flush({
      version: examplePanelVersion,
      companyHeader: 'company',
      yearHeader: 'year',
      columns: [
        { name: 'value', role: 'marketValue' },
        { name: 'capex', role: 'capex' },
        { name: 'equity', role: 'bookEquity' },
        { name: 'employees', role: 'other' },
      ],
      rows: { fileRow: [], company: [], year: [], values: [[], [], [], []] },
    });
    await settled();
    http.expectOne('/api/fits').flush({ fits: [] });
    http.expectOne('/api/peer-groups').flush({ versions: [group] });
    http.expectOne('/api/panel-versions').flush({ versions: [examplePanelVersion] });
    await settled();
  }

  function page(): HTMLElement {
    return fixture.nativeElement as HTMLElement;
  }

  it('goes to the newest fit where there is one', async () => {
    await open(exampleDesk, ['cfo']);
    await settled();
    expect(TestBed.inject(Router).url).toBe(`/fit/${exampleFit.fit.id}`);
  });

  it('offers a fit of the peer group with the defaults, and opens what was started', async () => {
    await open({ ...exampleDesk, fit: null }, ['analyst']);
    await answerGround();
    expect(page().querySelector('h1')?.textContent).toContain('Velmara');
    page().querySelector<HTMLInputElement>('input[type=checkbox]')?.click();
    await settled();
    page().querySelector<HTMLButtonElement>('button[type=submit]')?.click();
    const start = http.expectOne({ method: 'POST', url: '/api/fits' });
    expect(start.request.body).toEqual({
      peerGroupId: group.id,
      effects: 'company',
      form: 'levels',
      lag: 0,
      slopes: 'cr2',
      confidence: 0.95,
      furtherRegressors: ['employees'],
    });
    start.flush(exampleFit);
    await settled();
    expect(TestBed.inject(Router).url).toBe(`/fit/${exampleFit.fit.id}`);
  });

  it('offers a fit of the version in the address though another has one', async () => {
    const fit = { ...exampleFit.fit, peerGroupId: examplePanelVersion.id };
    await open({ ...exampleDesk, fit }, ['analyst'], group.id);
    await answerGround();
    expect(page().querySelector('button[type=submit]')?.textContent).toContain('Run the fit');
  });

  it('starts nothing for a CFO', async () => {
    await open({ ...exampleDesk, fit: null }, ['cfo']);
    await answerGround();
    expect(page().querySelector('button[type=submit]')).toBeNull();
    expect(page().textContent).toContain('Not fitted yet');
  });

  it('leads to peers and panel where they are missing', async () => {
    await open({ ...exampleDesk, fit: null, peerGroup: null }, ['analyst']);
    expect(page().querySelector('a[href="/peers"]')?.textContent).toContain('Choose peers');
  });
});
