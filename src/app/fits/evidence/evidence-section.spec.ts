import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { Router, provideRouter } from '@angular/router';
import type { EvidenceReply, Role } from '@contract';
import { SessionStore } from '../../api/session-store';
import { ChartHarness } from '../../charts/chart-harness';
import { exampleFit } from '../testing/example-fit';
import { exampleNumbers } from '../testing/example-numbers';
import { EvidenceSection } from './evidence-section';
import { EvidenceStore } from './evidence-store';
import { exampleEvidence, judgedResult } from './testing/example-evidence';

describe('the evidence on the Fit page', () => {
  let fixture: ComponentFixture<EvidenceSection>;
  let http: HttpTestingController;
  const address = `/api/fits/${exampleFit.fit.id}/evidence`;

  /** With every question open. */
  async function open(reply: EvidenceReply, roles: Role[] = ['analyst']): Promise<void> {
    sessionStorage.clear();
    TestBed.configureTestingModule({
      providers: [
        EvidenceStore,
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
    exampleNumbers();
    http = TestBed.inject(HttpTestingController);
    fixture = TestBed.createComponent(EvidenceSection);
    fixture.componentRef.setInput('reply', exampleFit);
    fixture.componentRef.setInput('result', judgedResult);
    TestBed.inject(EvidenceStore).show(exampleFit.fit.id);
    await settled();
    http.expectOne(address).flush(reply);
    await settled();
    button(/^Open all$/).click();
    await settled();
  }

  afterEach(() => {
    sessionStorage.clear();
    fixture.destroy();
    http.verify();
  });

  async function settled(): Promise<void> {
    fixture.detectChanges();
    await new Promise((resolve) => setTimeout(resolve, 10));
    fixture.detectChanges();
  }

  const ready: EvidenceReply = { state: 'ready', evidence: exampleEvidence, bootstrap: null };
  const page = (): HTMLElement => fixture.nativeElement as HTMLElement;
  const words = (): string => (page().textContent ?? '').replace(/\s+/g, ' ');
  const texts = (selector: string): string[] =>
    [...page().querySelectorAll(selector)].map((each) =>
      (each.textContent ?? '').replace(/\s+/g, ' ').trim(),
    );

  function button(name: RegExp): HTMLButtonElement {
    const found = [...page().querySelectorAll('button')].find((each) =>
      name.test((each.textContent ?? '').trim()),
    );
    if (found === undefined) throw new Error(`expected a button ${name}; found none`);
    return found;
  }

  async function charts(): Promise<ChartHarness[]> {
    return TestbedHarnessEnvironment.loader(fixture).getAllHarnesses(ChartHarness);
  }

  it('says first whether the fit can carry a statement, then what speaks against it, serious first', async () => {
    await open(ready);
    expect(texts('kv-verdict-summary .sentence')).toEqual([exampleEvidence.verdict.sentence]);
    expect(texts('kv-verdict-summary li')).toEqual([
      'Serious: Only 3 companies.',
      'Notable: Errors persist by 0.4.',
    ]);
  });

  it('answers eight questions, each under a heading', async () => {
    await open(ready);
    expect(texts('h3')).toEqual([
      'Does one line for all do?',
      'Who drives it?',
      'Is the standing steady?',
      'Could it be only trends?',
      'Which intervals?',
      'What if the model were another?',
      'What do all tests say?',
      'What does the model not explain?',
    ]);
    expect(texts('.meaning').length).toBe(8);
  });

  it('means at most two sentences a question', async () => {
    await open(ready);
    for (const meaning of texts('.meaning'))
      expect(meaning.match(/[.](?= |$)/g)?.length ?? 0)
        .withContext(meaning)
        .toBeLessThanOrEqual(2);
  });

  it('draws each answer, and names each picture by its finding', async () => {
    await open(ready);
    const titles = await Promise.all((await charts()).map((chart) => chart.title()));
    expect(titles).toEqual([
      'Against capex companies share a slope of 2.01 (1.20 to 2.82), one line for all has 2.00 (1.00 to 3.00)',
      'Standing 1,810 (1,170 to 2,450), place 1 to 2 of 3; without any one company from 1,500 to 2,120',
      'Standing 1,810 (1,170 to 2,450), place 1 to 2 of 3; without any one year from 1,700 to 1,950 (2 of 3 known)',
      'Slope on capex 2.01 (1.20 to 2.82), in changes from year to year 1.60 (1.00 to 2.20)',
      'Slope on capex 2.01 (1.20 to 2.82): the interval excludes zero in 2 of 3 ways',
      'Standing above zero in 3 of 3 models that give one, from 1,500 to 1,810',
      '1 of 32 rows has a studentised residual beyond ±3',
      'Residuals scatter most in Velmara, standard deviation 300',
      'Residuals scatter most in 2014, standard deviation 310',
    ]);
    expect(texts('h4')).toEqual(titles.map((title) => title ?? ''));
  });

  it('leads from a company to its reasons among the peers', async () => {
    await open(ready);
    const [, drivers] = await charts();
    await drivers.clickPoint(/^without Sarvane/);
    await settled();
    expect(TestBed.inject(Router).url).toBe(`/peers/${exampleFit.peerGroup.id}?company=Sarvane`);
  });

  it('shows another figure when one is chosen', async () => {
    await open(ready);
    const choice = [...page().querySelectorAll('kv-drivers-block label')].find((label) =>
      label.textContent?.includes('Slope on capex'),
    );
    choice?.querySelector('input')?.click();
    await settled();
    expect(texts('kv-drivers-block .meaning')[0]).toMatch(
      /^The slope on capex moves most without Sarvane: to 1\.10 from 2\.01\./,
    );
  });

  it('leads from the largest residuals to their rows of the panel', async () => {
    await open(ready);
    const links = [...page().querySelectorAll('kv-largest-residuals a')];
    expect(links.map((link) => link.getAttribute('href'))).toEqual([
      `/panel/${exampleFit.panelVersion.id}?company=Velmara&year=2014`,
      `/panel/${exampleFit.panelVersion.id}?company=Sarvane&year=2012`,
    ]);
    expect(links.map((link) => link.textContent?.trim())).toEqual(['5', 'added']);
    expect(links.map((link) => link.getAttribute('aria-label'))).toEqual([
      'Velmara FY2014, row 5 in the panel',
      'Sarvane FY2012, added row in the panel',
    ]);
  });

  it('leads from a point of the residuals to its row of the panel', async () => {
    await open(ready);
    const scatter = page().querySelector('kv-residual-scatter svg[tabindex]');
    scatter?.dispatchEvent(new KeyboardEvent('keydown', { key: 'Enter' }));
    await settled();
    expect(TestBed.inject(Router).url).toBe(
      `/panel/${exampleFit.panelVersion.id}?company=Velmara&year=2014`,
    );
  });

  it('reads out every test with its definition and source', async () => {
    await open(ready);
    expect(texts('kv-tests-block tbody th')).toEqual([
      'Test poolability',
      'Test pesaran-cd',
      'Test hausman',
    ]);
    expect(texts('kv-tests-block tbody tr')[1]).toContain('Assumes many companies.');
    expect(texts('kv-tests-block details')[0]).toBe(
      'Definition of Test poolabilityDefinition of poolability.Source of poolability.',
    );
  });

  it('offers the draws of the bootstrap, counts them and can stop them', async () => {
    await open(ready);
    expect(words()).toContain('of the wild bootstrap, seed 1.');
    button(/Run 9,999 draws/).click();
    const post = http.expectOne({ method: 'POST', url: address.replace('evidence', 'bootstrap') });
    const bootstrap = { seed: 1, state: 'running', progress: null, failure: null } as const;
    post.flush(bootstrap);
    await settled();
    await settled();
    const progress = { done: 4200, total: 9999 };
    http.expectOne(address).flush({ ...ready, bootstrap: { ...bootstrap, progress } });
    await settled();
    expect(words()).toContain('Wild bootstrap, seed 1, draws: 4,200 of 9,999');
    button(/^Cancel$/).click();
    http
      .expectOne({ method: 'DELETE', url: address.replace('evidence', 'bootstrap') })
      .flush(null, { status: 204, statusText: 'No content' });
    await settled();
    await settled();
    http.expectOne(address).flush({ ...ready, bootstrap: { ...bootstrap, state: 'cancelled' } });
    await settled();
    expect(words()).toContain('It was cancelled.');
  });

  it('offers a CFO no draws', async () => {
    await open(ready, ['cfo']);
    expect(words()).toContain('an analyst can run its 9,999 draws');
    expect(texts('button').some((name) => name.includes('Run 9,999'))).toBeFalse();
  });

  it('says why there is no evidence, and still what the result itself answers', async () => {
    await open({ state: 'unavailable', reason: 'Made by engine 1.0.0: fit again.' });
    expect(words()).toContain('Made by engine 1.0.0: fit again.');
    expect(texts('h3')).toEqual(['Does one line for all do?', 'Who drives it?']);
    expect(texts('kv-one-line-block dt')).toEqual([
      'F, company levels',
      'R², one pooled line',
      'R², company levels',
    ]);
  });
});
