import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { EditionPreviewReply, ScenarioReply } from '@contract';
import { SessionStore } from '../api/session-store';
import { NumberFormat } from '../ui/number-format';
import { PublishPage } from './publish-page';
import { editionContent, editionSummary } from './testing/edition-content';

const suggested = 'The market values Velmara 1,800 (1,170 to 2,430) EUR m above its peers';
const preview: EditionPreviewReply = {
  content: editionContent,
  suggestedHeadline: suggested,
  headlineProblems: [],
  hindrances: [],
};
const [frozen] = editionContent.scenarios;
const scenario = (last: number, name: string): ScenarioReply => ({
  id: `00000000-0000-4000-8000-0000000000b${last}`,
  fitId: editionContent.fitId,
  name,
  note: '',
  version: last,
  plan: frozen.plan,
  outlook: { start: 'model-level', yearEffect: 'last', confidence: 0.95, bandConfidence: 0.8 },
  rules: frozen.plan[0].values.map(() => ({ rule: null, moves: [] })),
  uncertainty: null,
  years: frozen.years,
  copiedFrom: null,
  createdBy: 'M. Oduya',
  updatedBy: 'M. Oduya',
  updatedAt: '2026-11-10T09:00:00.000Z',
});
const scenarios = [scenario(1, 'Build-out'), scenario(2, 'Hold')];
const returned = {
  ...editionSummary,
  number: 6,
  state: 'returned',
  decision: {
    kind: 'returned',
    by: 'T. Emmerquist',
    at: '2026-11-13T09:00:00.000Z',
    comment: 'Say more.',
  },
} as const;

describe('the page that composes an edition', () => {
  let fixture: ComponentFixture<PublishPage>;
  let http: HttpTestingController;

  beforeEach(() => {
    sessionStorage.clear();
    TestBed.configureTestingModule({
      providers: [provideHttpClient(), provideHttpClientTesting(), provideRouter([])],
    });
    http = TestBed.inject(HttpTestingController);
    TestBed.inject(NumberFormat).unit.set('millions');
    TestBed.inject(SessionStore).accept({
      session: {
        person: { id: editionSummary.id, name: 'M. Oduya', email: 'm.oduya@velmara.example' },
        workspace: { id: editionSummary.id, name: 'Velmara Finance' },
        roles: ['analyst'],
        preferences: { theme: 'system', unit: 'millions', negatives: 'minus' },
      },
    });
  });
  afterEach(() => {
    http.verify();
    sessionStorage.clear();
  });

  async function settled(ms = 0): Promise<void> {
    await new Promise((resolve) => setTimeout(resolve, ms));
    await fixture.whenStable();
  }

  /** Waits until the choices have rested, and answers what the page asks then. */
  async function answerPreview(reply: EditionPreviewReply = preview): Promise<unknown> {
    await settled(300);
    const request = http.expectOne('/api/editions/preview');
    request.flush(reply);
    await settled();
    return request.request.body;
  }

  async function open(answers?: string): Promise<void> {
    fixture = TestBed.createComponent(PublishPage);
    fixture.componentRef.setInput('fit', editionContent.fitId);
    fixture.componentRef.setInput('answers', answers);
    await settled();
    http.expectOne('/api/fits').flush({ fits: [] });
    await settled();
    http.expectOne(`/api/fits/${editionContent.fitId}/scenarios`).flush({ scenarios });
    http.expectOne('/api/editions').flush({ editions: [returned] });
    await settled();
  }

  const page = () => fixture.nativeElement as HTMLElement;
  const text = () => page().textContent.replace(/\s+/g, ' ');
  const button = (name: string) =>
    [...page().querySelectorAll('button')].find(
      (each) => (each.getAttribute('aria-label') ?? each.textContent.trim()) === name,
    );
  const check = async (name: string): Promise<void> => {
    const label = [...page().querySelectorAll('label')].find((each) =>
      each.textContent.includes(name),
    );
    label?.querySelector('input')?.click();
    await settled();
  };

  it('shows the sheet as the server would freeze it, and publishes what was composed', async () => {
    await open(returned.id);
    await answerPreview();
    expect(text()).toContain('Each extra 1 of capex goes with 2.00 (1.20 to 2.80)');
    await check('Build-out, version 1');
    await check('Hold, version 2');
    await check('inside information');
    button('Earlier: Hold')?.click();
    await settled();
    expect(document.activeElement?.getAttribute('aria-label')).toBe('Earlier: Hold');
    const composed = {
      fitId: editionContent.fitId,
      scenarios: [
        { id: scenarios[1].id, version: 2 },
        { id: scenarios[0].id, version: 1 },
      ],
      confidentiality: 'inside-information',
      comment: '',
      headline: null,
      unit: 'millions',
      answersEditionId: returned.id,
    };
    expect(await answerPreview()).toEqual(composed);
    expect(sessionStorage.length).toBe(1);
    button('Publish edition 7')?.click();
    await settled();
    const request = http.expectOne(
      (each) => each.method === 'POST' && each.url === '/api/editions',
    );
    expect(request.request.body).toEqual(composed);
    request.flush({ type: 'about:blank', title: 'No' }, { status: 409, statusText: 'Conflict' });
    await settled();
    expect(sessionStorage.length).toBe(1);
  });

  it('edits the headline in its place, and marks what no figure says', async () => {
    await open();
    await answerPreview();
    button('Edit the headline')?.click();
    await settled();
    const box = page().querySelector<HTMLTextAreaElement>('kv-headline-editor textarea')!;
    expect(document.activeElement).toBe(box);
    expect(box.value).toBe(suggested);
    box.value = 'Velmara stands 5,000 above its peers';
    box.dispatchEvent(new Event('input'));
    const body = await answerPreview({
      ...preview,
      headlineProblems: [
        { start: 15, end: 20, found: '5,000', detail: '“5,000” is no figure of this edition.' },
      ],
    });
    expect(body).toEqual(
      jasmine.objectContaining({
        headline: 'Velmara stands 5,000 above its peers',
        unit: 'millions',
      }),
    );
    expect(text()).toContain('“5,000” is no figure of this edition.');
    expect(button('Publish edition 7')?.disabled).toBe(true);
    button('Go to 5,000')?.click();
    expect(box.value.slice(box.selectionStart, box.selectionEnd)).toBe('5,000');
    button('As made from the figures')?.click();
    expect(await answerPreview()).toEqual(jasmine.objectContaining({ headline: null }));
    expect(button('Publish edition 7')?.disabled).toBe(false);
  });

  it('says what keeps it from being published', async () => {
    await open();
    await answerPreview({ ...preview, hindrances: ['Every company needs a written reason.'] });
    expect(text()).toContain('Every company needs a written reason.');
    expect(button('Publish edition 7')?.disabled).toBe(true);
  });

  it('finds what was composed again in this tab, and nothing after signing out', async () => {
    await open();
    await answerPreview();
    await check('Hold, version 2');
    await answerPreview();
    fixture.destroy();
    await open();
    expect(await answerPreview()).toEqual(
      jasmine.objectContaining({ scenarios: [{ id: scenarios[1].id, version: 2 }] }),
    );
    expect(localStorage.length).toBe(0);
    TestBed.inject(SessionStore).forget();
    expect(sessionStorage.length).toBe(0);
  });
});
