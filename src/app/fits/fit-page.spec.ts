import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { EvidenceReply, FitReply, Role } from '@contract';
import { SessionStore } from '../api/session-store';
import { exampleEvidence } from './evidence/testing/example-evidence';
import { FitPage } from './fit-page';
import { exampleDesk, exampleFit, exampleResult } from './testing/example-fit';

describe('the Fit page', () => {
  let fixture: ComponentFixture<FitPage>;
  let http: HttpTestingController;
  const address = `/api/fits/${exampleFit.fit.id}`;

  function start(roles: Role[]): void {
    TestBed.configureTestingModule({
      providers: [provideHttpClient(), provideHttpClientTesting(), provideRouter([])],
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
    fixture = TestBed.createComponent(FitPage);
    fixture.componentRef.setInput('fitId', exampleFit.fit.id);
    fixture.detectChanges();
  }

  let evidence: EvidenceReply;

  beforeEach(() => {
    evidence = { state: 'unavailable', reason: 'Written by an engine before it.' };
  });

  afterEach(() => {
    fixture.destroy();
    http.verify();
  });

  async function settled(ms = 0): Promise<void> {
    await new Promise((resolve) => setTimeout(resolve, ms));
    fixture.detectChanges();
  }

  async function answer(reply: FitReply): Promise<void> {
    await settled(20);
    http.expectOne(address).flush(reply);
    for (const request of http.match('/api/desk')) request.flush(exampleDesk);
    await settled(20);
  }

  /** The list under the page asks for itself. */
  async function answerList(): Promise<void> {
    http.expectOne('/api/fits').flush({ fits: [exampleFit.fit] });
    http.expectOne('/api/peer-groups').flush({ versions: [exampleFit.peerGroup] });
    http.expectOne('/api/panel-versions').flush({ versions: [exampleFit.panelVersion] });
    for (const request of http.match(`${address}/evidence`)) request.flush(evidence);
    await settled(20);
  }

  function page(): HTMLElement {
    return fixture.nativeElement as HTMLElement;
  }

  function words(): string {
    return (page().textContent ?? '').replace(/\s+/g, ' ');
  }

  function button(name: RegExp): HTMLButtonElement {
    const found = [...page().querySelectorAll('button')].find((each) =>
      name.test(each.textContent ?? ''),
    );
    if (found === undefined) throw new Error(`expected a button ${name}; found none`);
    return found;
  }

  it('leads with the finding and shows what it rests on', async () => {
    start(['analyst']);
    await answer(exampleFit);
    await answerList();
    expect(page().querySelector('h1')?.textContent?.replace(/\s+/g, ' ').trim()).toBe(
      'Velmara stands 1,810 (1,170 to 2,450) above its peers, place 1 to 2 of 3',
    );
    expect(words()).toContain('1,172 to 2,450');
    expect(words()).toContain('0.9626');
    expect(words()).toContain('2.07');
    expect(words()).toContain('on 2 and 28, p < 0.001');
    expect(page().querySelector('a[href$="?company=Kesdrin&year=2016"]')?.textContent).toContain(
      'Kesdrin FY2016: capex missing',
    );
    const scenarios = page().querySelector(`a[href="/scenarios?fit=${exampleFit.fit.id}"]`);
    expect(scenarios?.textContent).toContain('Run scenarios');
  });

  it('counts the company-years that dropped out, not the lines of the file', async () => {
    start(['cfo']);
    const dropped = [2016, 2017, 2018].flatMap((year) =>
      ['market_value', 'capex'].map((column) => ({
        ...{ company: 'Kesdrin', year, row: 17, column, reason: 'missing' as const },
      })),
    );
    const sample = { ...exampleResult.sample, dropped };
    await answer({ ...exampleFit, result: { ...exampleResult, sample } });
    await answerList();
    expect(words()).toContain('3 rows of these companies dropped out for a missing cell:');
    expect(words()).toContain('Kesdrin FY2018: market_value and capex missing');
  });

  it('says what the company levels are net of, further regressors included', async () => {
    start(['cfo']);
    const further = { ...exampleResult.slopes[1], name: 'employees' };
    const result = { ...exampleResult, slopes: [...exampleResult.slopes, further] };
    await answer({ ...exampleFit, result });
    await answerList();
    expect(page().querySelector('h2#levels')?.textContent).toBe(
      'Company levels, capex, book equity and employees taken out',
    );
    expect(page().querySelector('kv-companies-table caption')?.textContent).toMatch(
      /market value with\s+capex, book equity and employees taken out/,
    );
  });

  it('shows the warnings while there is no evidence, then what the evidence comes to', async () => {
    start(['cfo']);
    const warnings = [{ code: 'few-years' as const, detail: 'Only 6 fiscal years.' }];
    const warned = { ...exampleFit, result: { ...exampleResult, warnings } };
    await answer(warned);
    await answerList();
    const statement = (): string =>
      page().querySelector('section[aria-labelledby=statement]')?.textContent ?? '';
    expect(statement()).toContain('Only 6 fiscal years.');
    fixture.destroy();
    TestBed.resetTestingModule();

    evidence = { state: 'ready', evidence: exampleEvidence, bootstrap: null };
    start(['cfo']);
    await answer(warned);
    await answerList();
    expect(statement()).toContain(exampleEvidence.verdict.sentence);
    expect(statement()).not.toContain('Only 6 fiscal years.');
  });

  it('hands out the replication pack with the cautions beside it', async () => {
    start(['cfo']);
    await answer(exampleFit);
    await answerList();
    const pack = page().querySelector(`a[href="${address}/replication"]`);
    expect(pack?.textContent).toBe('Export replication pack');
    expect(pack?.hasAttribute('download')).toBeTrue();
    expect(
      page().querySelector('section[aria-labelledby=made] kv-caution-line')?.textContent,
    ).toContain('All cautions');
  });

  it('opens the lineage of a figure that is selected', async () => {
    start(['cfo']);
    await answer(exampleFit);
    await answerList();
    button(/Each extra 1 of capex/).click();
    const lineage = http.expectOne(`${address}/lineage/slope.0`);
    expect(lineage.request.method).toBe('GET');
    button(/place 1 to 2 of 3/).click();
    expect(lineage.cancelled).toBeTrue();
    http.expectOne(`${address}/lineage/rank-set`);
    expect(words()).not.toContain('Change specification');
  });

  it('counts while it runs, can be cancelled, and shows how it ended', async () => {
    start(['analyst']);
    const running = { ...exampleFit.fit, state: 'running' as const, hash: null, standing: null };
    const progress = { phase: 'Estimating', done: 1200, total: 4000 };
    await answer({ ...exampleFit, fit: running, result: null, progress });
    await answerList();
    expect(words()).toContain('Fitting Velmara among 2 peers');
    expect(words()).toContain('Estimating: 1,200 of 4,000');
    button(/Cancel/).click();
    const cancel = http.expectOne({ method: 'DELETE', url: address });
    cancel.flush(null, { status: 204, statusText: 'No content' });
    await settled(450);
    await answer({ ...exampleFit, fit: { ...running, state: 'cancelled' }, result: null });
    await answerList();
    expect(words()).toContain('The fit of Velmara among 2 peers was cancelled');
  });

  it('says why a fit failed, with what it concerns', async () => {
    start(['analyst']);
    await answer({
      ...exampleFit,
      fit: { ...exampleFit.fit, state: 'failed' },
      result: null,
      failure: {
        code: 'no-variation',
        detail: 'capex never varies within a company.',
        subjects: ['capex', 'row 3'],
      },
    });
    await answerList();
    expect(words()).toContain('Velmara among 2 peers could not be fitted');
    expect(words()).toContain('capex never varies within a company.');
    expect([...page().querySelectorAll('[role=alert] li')].map((each) => each.textContent)).toEqual(
      ['capex', 'row 3'],
    );
  });
});
