import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestKey } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment, UnitTestElement } from '@angular/cdk/testing/testbed';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { MatAccordionHarness, MatExpansionPanelHarness } from '@angular/material/expansion/testing';
import { Router, provideRouter } from '@angular/router';
import { SessionStore } from '../../api/session-store';
import { exampleFit } from '../testing/example-fit';
import { exampleNumbers } from '../testing/example-numbers';
import { EvidenceStore } from './evidence-store';
import { QuestionPanels } from './question-panels';
import { exampleEvidence, judgedResult } from './testing/example-evidence';

describe('the questions of the evidence', () => {
  let fixture: ComponentFixture<QuestionPanels>;
  let http: HttpTestingController;

  const page = (): HTMLElement => fixture.nativeElement as HTMLElement;

  beforeEach(() => {
    sessionStorage.clear();
  });

  afterEach(() => {
    fixture.destroy();
    http.verify();
    sessionStorage.clear();
  });

  async function settled(): Promise<void> {
    fixture.detectChanges();
    await new Promise((resolve) => setTimeout(resolve, 10));
    fixture.detectChanges();
  }

  async function show(address = '/'): Promise<void> {
    TestBed.configureTestingModule({
      providers: [
        EvidenceStore,
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter([{ path: '**', children: [] }]),
      ],
    });
    exampleNumbers();
    http = TestBed.inject(HttpTestingController);
    await TestBed.inject(Router).navigateByUrl(address);
    fixture = TestBed.createComponent(QuestionPanels);
    fixture.componentRef.setInput('reply', exampleFit);
    fixture.componentRef.setInput('result', judgedResult);
    document.body.append(page());
    TestBed.inject(EvidenceStore).show(exampleFit.fit.id);
    await settled();
  }

  async function evidenceComes(): Promise<void> {
    http
      .expectOne(`/api/fits/${exampleFit.fit.id}/evidence`)
      .flush({ state: 'ready', evidence: exampleEvidence, bootstrap: null });
    await settled();
  }

  async function showReady(address?: string): Promise<void> {
    await show(address);
    await evidenceComes();
  }

  function panels(): Promise<MatExpansionPanelHarness[]> {
    return TestbedHarnessEnvironment.loader(fixture).getAllHarnesses(MatExpansionPanelHarness);
  }

  async function openOnes(): Promise<(string | null)[]> {
    const all = await panels();
    const states = await Promise.all(all.map((panel) => panel.isExpanded()));
    const titles = await Promise.all(all.map((panel) => panel.getTitle()));
    return titles.filter((_, index) => states[index]);
  }

  function openOrCloseAll(words: string): void {
    const button = page().querySelector<HTMLButtonElement>('.all button');
    expect(button?.textContent?.trim()).toBe(words);
    button?.click();
  }

  it('are closed, each with its answer in a sentence and nothing drawn', async () => {
    await showReady();
    const all = await panels();
    expect(await Promise.all(all.map((panel) => panel.getTitle()))).toEqual([
      'Does one line for all do?',
      'Who drives it?',
      'Is the standing steady?',
      'Could it be only trends?',
      'Which intervals?',
      'What if the model were another?',
      'What do all tests say?',
      'What does the model not explain?',
    ]);
    expect(await Promise.all(all.map((panel) => panel.getDescription()))).toEqual([
      'No: company levels differ, so each company keeps its own.',
      'The standing moves most without Kesdrin: to 1,500 from 1,810 EUR m.',
      'The gap moves by 0.49 (−62.40 to 63.40) EUR m a year, p 0.980: no drift is shown, so one standing is kept for all years.',
      'Changes from year to year give slopes inside the intervals of this fit, so trends alone do not make them.',
      'The choice matters: zero lies inside the interval under two-way, not under the others.',
      'The standing lies on the same side of zero in every model that gives one.',
      '3 tests looked at, 1 of them judged together by Holm’s correction at 5 %: 1 rejects what it assumes.',
      'Velmara 2014 stands out most: 600 EUR m above what is expected.',
    ]);
    expect(await openOnes()).toEqual([]);
    expect(page().querySelector('.meaning, kv-chart-frame')).toBeNull();
  });

  it('say their answer once: open, it is read in full under the question', async () => {
    await showReady();
    const [first] = await panels();
    await first.expand();
    expect(await first.getDescription()).toBeNull();
    expect(await first.getTextContent()).toMatch(
      /No: company levels differ, so each company keeps its own\. One pooled line explains/,
    );
  });

  it('draw the charts of the one that is opened, and of no other', async () => {
    await showReady();
    const [, drivers] = await panels();
    await drivers.expand();
    expect(page().querySelectorAll('kv-chart-frame').length).toBe(1);
    await drivers.collapse();
    expect(await openOnes()).toEqual([]);
  });

  it('are operated by keyboard, from one to the next', async () => {
    await showReady();
    const [first] =
      await TestbedHarnessEnvironment.loader(fixture).getAllHarnesses(MatAccordionHarness);
    expect(await first.isMulti()).toBeTrue();
    const headers = page().querySelectorAll<HTMLElement>('mat-expansion-panel-header');
    headers[0].focus();
    const press = (key: TestKey): Promise<void> => {
      const focused = document.activeElement;
      if (focused === null) throw new Error('expected a header to have the focus; found nothing');
      return new UnitTestElement(focused, settled).sendKeys(key);
    };
    await press(TestKey.DOWN_ARROW);
    expect(document.activeElement).toBe(headers[1]);
    await press(TestKey.ENTER);
    expect(await openOnes()).toEqual(['Who drives it?']);
  });

  it('are opened by an address that ends with one, which is scrolled to and takes the focus', async () => {
    await show('/fit/1#which-intervals');
    expect(await openOnes()).toEqual([]);
    const scrolled = spyOn(Element.prototype, 'scrollIntoView');
    await evidenceComes();
    expect(await openOnes()).toEqual(['Which intervals?']);
    expect((scrolled.calls.mostRecent().object as Element).id).toBe('which-intervals');
    expect(document.activeElement?.getAttribute('aria-label')).toBe('Which intervals?');

    await TestBed.inject(Router).navigateByUrl('/fit/1#residuals');
    await settled();
    expect(await openOnes()).toEqual(['Which intervals?', 'What does the model not explain?']);
    expect((scrolled.calls.mostRecent().object as Element).id).toBe('residuals');
  });

  it('open all at once and close again', async () => {
    await showReady();
    openOrCloseAll('Open all');
    await settled();
    expect((await openOnes()).length).toBe(8);
    expect(page().querySelectorAll('kv-chart-frame').length).toBe(9);
    openOrCloseAll('Close all');
    await settled();
    expect(await openOnes()).toEqual([]);
    openOrCloseAll('Open all');
  });

  it('are all drawn before the page is printed, and afterwards as they were', async () => {
    await showReady();
    const all = await panels();
    await all[6].expand();
    window.dispatchEvent(new Event('beforeprint'));
    // Looked at without a moment's wait, as the browser does.
    expect(page().querySelectorAll('mat-expansion-panel.mat-expanded').length).toBe(8);
    expect(page().querySelectorAll('kv-chart-frame svg').length).toBe(9);
    expect(page().querySelectorAll('.meaning').length).toBe(8);
    window.dispatchEvent(new Event('afterprint'));
    await settled();
    expect(await openOnes()).toEqual(['What do all tests say?']);
  });

  it('stay open for the session of the browser, on another fit too, until it ends', async () => {
    await showReady();
    await (await panels())[2].expand();
    fixture.destroy();
    TestBed.resetTestingModule();

    await showReady();
    expect(await openOnes()).toEqual(['Is the standing steady?']);
    TestBed.inject(SessionStore).forget();
    await settled();
    expect(await openOnes()).toEqual([]);
    fixture.destroy();
    TestBed.resetTestingModule();

    await showReady();
    expect(await openOnes()).toEqual([]);
  });

  it('pass over what they do not know of an earlier session', async () => {
    sessionStorage.setItem('kinvale.open-questions', 'steady gone');
    await showReady();
    expect(await openOnes()).toEqual(['Is the standing steady?']);
  });
});
