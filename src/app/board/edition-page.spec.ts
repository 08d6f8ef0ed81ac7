import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { type EditionReply, type Role, problemType } from '@contract';
import { SessionStore } from '../api/session-store';
import { NumberFormat } from '../ui/number-format';
import { PageContext } from '../ui/page-context';
import { EditionPage } from './edition-page';
import { editionReply, editionSummary } from './testing/edition-content';

const waiting = editionReply;
const signed: EditionReply = {
  ...waiting,
  edition: {
    ...editionSummary,
    state: 'signed',
    decision: { kind: 'signed', by: 'T. Emmerquist', at: '2026-11-15T09:00:00.000Z', comment: '' },
  },
  maySign: false,
  mayReturn: false,
  newerPanelVersion: null,
  whyNot: 'T. Emmerquist has signed this edition already.',
};

describe('the page of an edition', () => {
  let fixture: ComponentFixture<EditionPage>;
  let http: HttpTestingController;
  const path = `/api/editions/${editionSummary.id}`;

  beforeEach(() => {
    TestBed.configureTestingModule({
      providers: [provideHttpClient(), provideHttpClientTesting(), provideRouter([])],
    });
    http = TestBed.inject(HttpTestingController);
    TestBed.inject(NumberFormat).unit.set('millions');
  });
  afterEach(() => {
    http.verify();
  });

  async function settled(): Promise<void> {
    await new Promise((resolve) => setTimeout(resolve));
    await fixture.whenStable();
  }

  async function open(role: Role, reply: EditionReply): Promise<void> {
    TestBed.inject(SessionStore).accept({
      session: {
        person: { id: editionSummary.id, name: 'A. Reader', email: 'a.reader@velmara.example' },
        workspace: { id: editionSummary.id, name: 'Velmara Finance' },
        roles: [role],
        preferences: { theme: 'system', unit: 'millions', negatives: 'minus' },
      },
    });
    fixture = TestBed.createComponent(EditionPage);
    fixture.componentRef.setInput('editionId', editionSummary.id);
    await settled();
    http.expectOne(path).flush(reply);
    http.expectOne('/api/editions').flush({ editions: [reply.edition] });
    await settled();
  }

  const text = () => (fixture.nativeElement as HTMLElement).textContent.replace(/\s+/g, ' ');
  const button = (name: string, within: ParentNode = fixture.nativeElement as HTMLElement) =>
    [...within.querySelectorAll('button')].find((each) => each.textContent.trim() === name);

  it('says that its panel has a newer version', async () => {
    await open('cfo', { ...waiting, newerPanelVersion: { id: editionSummary.id, number: 5 } });
    expect(text()).toContain('Its panel has a newer version, v5: these figures stand on v4.');
  });

  it('reads on one page, from the frozen content alone', async () => {
    await open('cfo', waiting);
    for (const words of [
      'The market values Velmara 1,800 (1,170 to 2,430) EUR m above',
      'Each extra 1 of capex goes with 2.00 (1.20 to 2.80) of market value.',
      'place 1 to 2 of 3',
      'Build-out lifts the expected value of Velmara by 160 (96 to 224) by FY2027',
      'For the November meeting.',
      'Concessions at revalued amounts.',
      'Associations, not causes.',
      editionSummary.sha256,
      'waits for your signature',
    ])
      expect(text()).toContain(words);
  });

  it('keeps signing closed until each serious warning is opened', async () => {
    await open('cfo', waiting);
    expect(text()).toContain('0 of 2 serious warnings opened.');
    expect(button('Sign edition 7')?.disabled).toBe(true);
    button('Go to the next one')?.click();
    expect(document.activeElement?.textContent?.trim()).toBe('Few companies');
    for (const [title, id] of [
      ['Few companies', 'few-companies'],
      ['A sign that hangs on one company', 'sign-change'],
    ]) {
      button(title)?.click();
      await settled();
      const request = http.expectOne(`${path}/warnings/${id}`);
      expect(request.request.method).toBe('PUT');
      request.flush(null);
      await settled();
      expect(button(title)?.getAttribute('aria-expanded')).toBe('true');
    }
    expect(text()).toContain('2 of 2 serious warnings opened.');
    expect(button('Sign edition 7')?.disabled).toBe(false);
    button('Few companies')?.click();
    await settled();
    http.expectNone(`${path}/warnings/few-companies`);
  });

  it('shows warnings open to those who do not sign', async () => {
    await open('analyst', { ...waiting, maySign: false, mayReturn: false });
    expect(button('Few companies')).toBeUndefined();
    expect(text()).toContain('The peer group has 3 companies with figures.');
  });

  it('takes a comment on a block, and shows the thread with its edition', async () => {
    const comment = {
      id: '00000000-0000-4000-8000-0000000000c1',
      editionId: editionSummary.id,
      editionNumber: 6,
      block: 'slopes' as const,
      text: 'Why did capex fall?',
      by: 'T. Emmerquist',
      at: '2026-11-15T09:00:00.000Z',
    };
    await open('analyst', { ...waiting, maySign: false, comments: [comment] });
    const slopes = [...document.querySelectorAll('kv-block-comments')].find((each) =>
      each.textContent.includes('Why did capex fall?'),
    )!;
    expect(slopes.textContent.replace(/\s+/g, ' ')).toContain('T. Emmerquist, 15 Nov 2026');
    expect(slopes.textContent.replace(/\s+/g, ' ')).toContain('edition 6');
    button('Answer', slopes)?.click();
    await settled();
    const box = slopes.querySelector('textarea')!;
    expect(document.activeElement).toBe(box);
    box.value = 'One company left the panel.';
    box.dispatchEvent(new Event('input'));
    await settled();
    button('Send the comment', slopes)?.click();
    await settled();
    const request = http.expectOne(`${path}/comments`);
    expect(request.request.body).toEqual({ block: 'slopes', text: 'One company left the panel.' });
    const answer = { ...comment, id: editionSummary.id, text: 'One company left the panel.' };
    request.flush({ ...waiting, comments: [comment, answer] });
    await settled();
    expect(slopes.textContent).toContain('One company left the panel.');
    expect(document.activeElement?.textContent?.trim()).toBe('Answer');
  });

  it('leads the analyst from a returned edition to its answer', async () => {
    const decision = {
      kind: 'returned' as const,
      by: 'T. Emmerquist',
      at: '2026-11-15T09:00:00.000Z',
      comment: 'Say more.',
    };
    const edition = { ...editionSummary, state: 'returned' as const, decision };
    await open('analyst', { ...waiting, edition, maySign: false, mayReturn: false });
    const link = [...document.querySelectorAll('a')].find(
      (each) => each.textContent.trim() === 'Answer in a new edition',
    );
    expect(link?.getAttribute('href')).toBe(
      `/board/publish?fit=${waiting.content.fitId}&answers=${edition.id}`,
    );
  });

  it('says what checking the record found, with the hashes', async () => {
    await open('reader', signed);
    button('Check the record')?.click();
    await settled();
    http.expectOne(`${path}/verification`).flush({
      isUnchanged: false,
      number: 7,
      computedSha256: 'a'.repeat(64),
      storedSha256: 'b'.repeat(64),
      publishedSha256: 'b'.repeat(64),
      signedSha256: null,
      checkedAt: '2026-11-16T09:00:00.000Z',
      detail: 'Edition 7 was changed.',
    });
    await settled();
    expect(text()).toContain('Edition 7 was changed. Checked 16 Nov 2026');
    expect(text()).toContain('a'.repeat(64));
    expect(text()).toMatch(/recorded when it was signed\s*no record/);
  });

  it('lists who viewed and exported, where the reader is to see it', async () => {
    const access = [
      {
        by: 'T. Emmerquist',
        kind: 'exported' as const,
        format: 'pdf',
        at: '2026-11-15T09:00:00.000Z',
      },
      { by: 'M. Oduya', kind: 'viewed' as const, format: null, at: '2026-11-14T09:00:00.000Z' },
    ];
    await open('analyst', { ...waiting, access });
    expect(text()).toContain('2 people opened it, 1 export');
    expect(text()).toContain('T. Emmerquist exported as PDF 15 Nov 2026');
  });

  it('gives readers neither comments nor the list of who looked', async () => {
    await open('reader', { ...signed, access: null });
    expect(document.querySelector('kv-edition-access')).toBeNull();
    expect(document.querySelector('kv-block-comments button')).toBeNull();
  });

  it('exports in the unit shown, and asks first of inside information', async () => {
    await open('cfo', waiting);
    const links = () =>
      [...document.querySelectorAll('kv-edition-exports a')].map((each) =>
        each.getAttribute('href'),
      );
    expect(links()).toEqual([
      `${path}/export/pdf?unit=millions&paper=a4`,
      `${path}/export/pdf?unit=millions&paper=letter`,
      `${path}/export/xlsx?unit=millions`,
    ]);
    TestBed.inject(NumberFormat).unit.set('billions');
    await settled();
    expect(links().at(2)).toBe(`${path}/export/xlsx?unit=billions`);
  });

  it('has the CFO sign with the password, and says so when it is the wrong one', async () => {
    await open('cfo', { ...waiting, openedWarnings: ['few-companies', 'sign-change'] });
    button('Sign edition 7')?.click();
    await settled();
    const dialog = document.querySelector('kv-sign-dialog')!;
    const box = dialog.querySelector('input')!;
    const send = async (password: string, answer: () => void): Promise<void> => {
      box.value = password;
      box.dispatchEvent(new Event('input'));
      button('Sign edition 7', dialog)?.click();
      await settled();
      answer();
      await settled();
    };
    await send('not it', () => {
      http
        .expectOne(`${path}/sign`)
        .flush(
          { type: problemType('wrong-credentials'), title: 'No', status: 403 },
          { status: 403, statusText: 'Forbidden' },
        );
    });
    expect(dialog.textContent).toContain('This is not the password of your account.');
    await send('a long passphrase', () => {
      const request = http.expectOne(`${path}/sign`);
      expect(request.request.body).toEqual({ password: 'a long passphrase' });
      request.flush(signed);
    });
    expect(text()).toContain('Signed by T. Emmerquist on 15 Nov 2026');
    expect(button('Sign edition 7')).toBeUndefined();
  });

  it('does not return an edition without a comment', async () => {
    await open('cfo', waiting);
    button('Return with a comment')?.click();
    await settled();
    const dialog = document.querySelector('kv-return-dialog')!;
    button('Return edition 7', dialog)?.click();
    await settled();
    expect(dialog.textContent).toContain('expected a comment that says what to change');
    http.expectNone(`${path}/return`);
    button('Keep it', dialog)?.click();
    await settled();
  });

  it('tells the publisher why they cannot sign', async () => {
    const whyNot = 'You published this edition: another person has to sign it.';
    await open('cfo', { ...waiting, maySign: false, mayReturn: false, whyNot });
    expect(text()).toContain(whyNot);
    expect(button('Sign edition 7')).toBeUndefined();
  });

  it('gives readers neither sliders nor links that they cannot open', async () => {
    await open('reader', signed);
    expect(button('Move the sliders')).toBeUndefined();
    expect(TestBed.inject(PageContext).lineage()).toEqual([]);
    expect(text()).toContain('Signed by T. Emmerquist');
  });

  it('reads the standing’s lineage through the edition', async () => {
    await open('reader', signed);
    button('place 1 to 2 of 3')?.click();
    await settled();
    const asked = http.expectOne(`${path}/lineage/rank-set`);
    expect(asked.request.method).toBe('GET');
    asked.flush(
      { type: 'about:blank', title: 'None', status: 404 },
      { status: 404, statusText: 'None' },
    );
  });
});
