import { provideHttpClient } from '@angular/common/http';
import {
  HttpTestingController,
  type TestRequest,
  provideHttpClientTesting,
} from '@angular/common/http/testing';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { Router, provideRouter } from '@angular/router';
import { ImportMapping, type ImportReply, noConversion, noMending, problemType } from '@contract';
import { ImportPage } from './import-page';
import { flowCheck, flowDraft, flowVersion } from './testing/import-replies';

const { reading } = flowDraft;
const fullMapping = ImportMapping.parse({
  ...flowDraft.mapping,
  currency: 'EUR',
  unit: 'millions',
});
const checked: ImportReply = {
  ...flowDraft,
  state: 'checked',
  mapping: fullMapping,
  check: flowCheck,
};

describe('the import page', () => {
  let fixture: ComponentFixture<ImportPage>;
  let http: HttpTestingController;

  async function open(found: ImportReply): Promise<void> {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter([{ path: '**', children: [] }]),
      ],
    });
    http = TestBed.inject(HttpTestingController);
    fixture = TestBed.createComponent(ImportPage);
    fixture.componentRef.setInput('importId', found.id);
    fixture.detectChanges();
    http.expectOne(`/api/imports/${found.id}`).flush(found);
    http.expectOne('/api/panel-versions').flush({ versions: [flowVersion] });
    await settled();
  }

  beforeEach(() => localStorage.clear());
  afterEach(() => {
    http.verify();
    localStorage.clear();
  });

  async function settled(): Promise<void> {
    await new Promise((resolve) => setTimeout(resolve));
    await fixture.whenStable();
  }

  /** The next look at the import while its rows are written. */
  async function nextLook(): Promise<TestRequest> {
    for (let turn = 0; turn < 100; turn++) {
      const [look] = http.match({ method: 'GET', url: `/api/imports/${flowDraft.id}` });
      if (look !== undefined) return look;
      await settled();
    }
    throw new Error('expected another look at the import; there was none');
  }

  function page(): HTMLElement {
    return fixture.nativeElement as HTMLElement;
  }

  function words(): string {
    return (page().textContent ?? '').replace(/\s+/g, ' ');
  }

  function button(name: string): HTMLButtonElement | undefined {
    return [...page().querySelectorAll('button')].find(
      (each) => (each.ariaLabel ?? each.textContent.trim()) === name,
    );
  }

  async function press(name: string): Promise<void> {
    const found = button(name);
    if (found === undefined) throw new Error(`expected a button “${name}”; found none`);
    found.click();
    await settled();
  }

  async function typeInto(selector: string, text: string, event = 'input'): Promise<void> {
    const input = page().querySelector<HTMLInputElement | HTMLSelectElement>(selector);
    if (input === null) throw new Error(`expected a field ${selector}; found none`);
    input.value = text;
    input.dispatchEvent(new Event(event));
    await settled();
  }

  const typeName = (name: string): Promise<void> =>
    typeInto('input[formControlName=panelName]', name);

  it('asks its questions in the order of the work', async () => {
    await open(checked);
    expect([...page().querySelectorAll('h2')].map((each) => each.textContent)).toEqual([
      'How is the file read?',
      'Which column is what?',
      'In which currencies are the figures?',
      'Which year does a fiscal year belong to?',
      'What will come in?',
      'Bring it in',
    ]);
  });

  it('shows first rows with their lines and what each column is taken for', async () => {
    await open(flowDraft);
    const cells = [...page().querySelectorAll('kv-first-rows tbody td')];
    expect(cells.map((cell) => cell.textContent)).toEqual([
      '2',
      'A',
      '2010',
      '1',
      '2',
      'empty',
      '7',
      'EUR',
    ]);
    expect(page().querySelector('kv-first-rows thead')?.textContent).toContain('market value');
    expect(words()).toContain('Becomes version 2: a panel has this name already');
  });

  it('checks with the guess, the newest panel’s currency and unit, and lists what was found', async () => {
    await open(flowDraft);
    await press('Check the file');
    const sent = http.expectOne({ method: 'PUT', url: `/api/imports/${flowDraft.id}/mapping` });
    expect(sent.request.body).toEqual({
      ...flowDraft.mapping,
      attributes: [],
      currency: 'EUR',
      unit: 'millions',
      reading,
      conversion: noConversion,
      mending: noMending,
    });
    sent.flush(checked);
    await settled();
    expect(page().querySelector('h1')?.textContent).toContain('1 finding, none keeps the file out');
    expect(words()).toContain('equity: No value.');
    expect(button('Check the file')).toBeUndefined();
  });

  it('writes the rows in the background, follows them, and goes to the panel version', async () => {
    await open(checked);
    await press('Bring in as version 2');
    const committing: ImportReply = {
      ...checked,
      state: 'committing',
      progress: { done: 11, of: 33 },
    };
    http
      .expectOne({ method: 'POST', url: `/api/imports/${flowDraft.id}/commit` })
      .flush(committing, { status: 202, statusText: 'Accepted' });
    await settled();
    expect(words()).toContain('Writing rows: 11 of 33');
    expect(button('Discard import')).toBeUndefined();
    const look = await nextLook();
    look.flush({ ...checked, state: 'committed', panelVersionId: flowVersion.id });
    await settled();
    expect(TestBed.inject(Router).url).toBe(`/panel/${flowVersion.id}`);
  });

  it('offers another check where somebody made a newer version meanwhile', async () => {
    await open(checked);
    await press('Bring in as version 2');
    http.expectOne({ method: 'POST', url: `/api/imports/${flowDraft.id}/commit` }).flush(
      {
        type: problemType('stale-version'),
        title: 'The panel has a newer version',
        status: 409,
        detail: 'Version 2 was saved after this check. Check again.',
        latestId: flowVersion.id,
      },
      { status: 409, statusText: 'Conflict' },
    );
    await settled();
    expect(words()).toContain('Version 2 was saved after this check.');
    await press('Check again');
    http.expectOne({ method: 'PUT', url: `/api/imports/${flowDraft.id}/mapping` }).flush(checked);
    await settled();
    expect(words()).not.toContain('Version 2 was saved after this check.');
  });

  it('shows how far an import is that somebody comes back to, and cancels it', async () => {
    await open({ ...checked, state: 'committing', progress: { done: 20_000, of: 200_000 } });
    expect(words()).toContain('Writing rows: 20,000 of 200,000');
    const look = await nextLook();
    await press('Cancel');
    http
      .expectOne({ method: 'DELETE', url: `/api/imports/${flowDraft.id}/commit` })
      .flush(null, { status: 204, statusText: 'No Content' });
    await settled();
    expect(look.cancelled).toBeTrue();
    http.expectOne(`/api/imports/${flowDraft.id}`).flush(checked);
    await settled();
    expect(button('Bring in as version 2')).toBeDefined();
  });

  it('leads the focus on to what the check found, since its button goes', async () => {
    await open(flowDraft);
    await press('Check the file');
    http.expectOne({ method: 'PUT', url: `/api/imports/${flowDraft.id}/mapping` }).flush({
      ...checked,
      mapping: flowDraft.mapping,
    });
    await settled();
    const outcome = page().querySelector('#check');
    expect(outcome?.textContent).toBe('What will come in?');
    expect(document.activeElement).toBe(outcome);
  });

  it('keeps what was entered and checked when the writing of it is cancelled', async () => {
    await open(flowDraft);
    await typeName('Own name');
    await press('Check the file');
    const sent = http.expectOne({ method: 'PUT', url: `/api/imports/${flowDraft.id}/mapping` });
    const mapping = ImportMapping.parse(sent.request.body);
    sent.flush({ ...checked, mapping });
    await settled();
    await press('Bring in as version 1');
    http
      .expectOne({ method: 'POST', url: `/api/imports/${flowDraft.id}/commit` })
      .flush({ ...checked, mapping, state: 'committing', progress: { done: 0, of: 33 } });
    await nextLook();
    await press('Cancel');
    http
      .expectOne({ method: 'DELETE', url: `/api/imports/${flowDraft.id}/commit` })
      .flush(null, { status: 204, statusText: 'No Content' });
    await settled();
    http.expectOne(`/api/imports/${flowDraft.id}`).flush({ ...checked, mapping });
    await settled();
    const name = page().querySelector<HTMLInputElement>('input[formControlName=panelName]');
    expect(name?.value).toBe('Own name');
    expect(button('Bring in as version 1')).toBeDefined();
    expect(button('Check again')).toBeUndefined();
  });

  it('says why the last try did not work, and offers another', async () => {
    await open({ ...checked, state: 'failed', failure: 'The disk of the database is full.' });
    expect(page().querySelector('[role=alert]')?.textContent).toContain('The disk of the database');
    expect(button('Bring in as version 2')).toBeDefined();
  });

  it('does not bring in what was not checked', async () => {
    await open(checked);
    expect(button('Bring in as version 2')).toBeDefined();
    await typeName('Another name');
    expect(button('Bring in as version 2')).toBeUndefined();
    expect(button('Check again')).toBeDefined();
    expect(words()).toContain('Becomes a new panel, version 1');
    await typeName('Flow control');
    expect(button('Bring in as version 2')).toBeDefined();
  });

  it('sends a mended cell and a left-out line with the next check', async () => {
    await open(checked);
    await typeInto('[aria-label="Line 2, equity: reads"]', '12.5', 'change');
    expect(button('Bring in as version 2')).toBeUndefined();
    await press('Check again');
    const sent = http.expectOne(`/api/imports/${flowDraft.id}/mapping`);
    const cells = [{ row: 2, column: 'equity', text: '12.5' }];
    expect((sent.request.body as ImportMapping).mending).toEqual({ ...noMending, cells });
    const mending = { ...noMending, cells };
    sent.flush({
      ...checked,
      mapping: { ...fullMapping, mending },
      check: { ...flowCheck, findings: [], findingCount: 0 },
    });
    await settled();
    expect(words()).toContain('equity: mended, reads “12.5”.');
    await press('Line 2, equity: as in the file');
    expect(button('Check again')).toBeDefined();
    await press('Leave line 2 out');
    expect(button('Take line 2 again')).toBeDefined();
  });

  it('does not bring in columns that were changed while the check ran', async () => {
    await open(flowDraft);
    await press('Check the file');
    await typeName('Another name');
    http.expectOne(`/api/imports/${flowDraft.id}/mapping`).flush(checked);
    await settled();
    expect(words()).toContain('The entries have changed since the check');
    expect(page().querySelector('kv-commit-form')).toBeNull();
    expect(button('Check again')?.disabled).toBeFalse();
    await typeName('Flow control');
    expect(button('Bring in as version 2')).toBeDefined();
  });

  it('starts the columns anew when the file is read another way, and keeps the name', async () => {
    await open(flowDraft);
    await typeName('My name');
    page().querySelectorAll<HTMLInputElement>('[name=headerRow]')[1].click();
    await settled();
    const sent = http.expectOne({ method: 'PUT', url: `/api/imports/${flowDraft.id}/reading` });
    expect(sent.request.body).toEqual({ ...reading, headerRow: 2 });
    sent.flush({
      ...flowDraft,
      reading: { ...reading, headerRow: 2 },
      headers: ['name', 'fy', 'mv', 'capex', 'equity', 'staff', 'cur'],
      mapping: { ...flowDraft.mapping, company: 'name' },
    });
    await settled();
    const field = page().querySelector<HTMLInputElement>('input[formControlName=panelName]');
    expect(field?.value).toBe('My name');
    expect(page().querySelector('kv-mapping-form')?.textContent).toContain('name');
  });

  it('offers the rows of rates that the check missed, and holds back until they are given', async () => {
    const currencies = { column: 'cur', rates: [] };
    const mapping = { ...fullMapping, conversion: { ...noConversion, currencies } };
    const missingRates = [{ currency: 'USD', years: [2019, 2020] }];
    await open({ ...checked, mapping, check: { ...flowCheck, missingRates } });
    expect(words()).toContain('Rates are missing: USD for 2019–2020.');
    expect(page().querySelectorAll('kv-currency-part tbody tr').length).toBe(2);
    await typeInto('[aria-label="Row 1, average rate"]', '0.92', 'change');
    await press('Check again');
    const sent = http.expectOne(`/api/imports/${flowDraft.id}/mapping`);
    expect((sent.request.body as ImportMapping).conversion.currencies?.rates).toEqual([
      { currency: 'USD', year: 2019, average: 0.92, yearEnd: null },
    ]);
    sent.flush(checked);
    await settled();
  });

  it('asks for a mended file while a finding keeps this one out', async () => {
    const blocking = { ...flowCheck.findings[0], found: 'abc', isBlocking: true };
    await open({ ...checked, check: { ...flowCheck, findings: [blocking], blockingCount: 1 } });
    expect(page().querySelector('h1')?.textContent).toContain('1 keeps the file out');
    expect(page().querySelector('kv-commit-form')).toBeNull();
    expect(button('Choose the mended file')).toBeDefined();
  });

  it('says what is missing and sends nothing', async () => {
    await open({
      ...flowDraft,
      mapping: { ...flowDraft.mapping, capex: undefined, bookEquity: 'mv' },
    });
    await press('Check the file');
    const errors = [...page().querySelectorAll('mat-error')].map((each) => each.textContent.trim());
    expect(errors).toEqual(['Expected a column of the file', '“mv” is chosen for two things']);
  });

  it('keeps the entries when the check fails, and says why', async () => {
    await open(flowDraft);
    await press('Check the file');
    http.expectOne(`/api/imports/${flowDraft.id}/mapping`).flush(
      {
        type: problemType('unreadable-file'),
        title: 'The file cannot be read',
        status: 422,
        detail: 'Reading took more than 30 seconds',
        code: 'parse_timeout',
      },
      { status: 422, statusText: 'Unprocessable Content' },
    );
    await settled();
    const alert = page().querySelector('[role=alert]')?.textContent;
    expect(alert).toContain('more than 30 seconds');
    expect(alert).toContain('Save the one sheet that is needed as CSV');
    expect(button('Check the file')).toBeDefined();
  });

  it('goes on to the panel version of an import that is done', async () => {
    await open({ ...checked, state: 'committed', panelVersionId: flowVersion.id });
    expect(TestBed.inject(Router).url).toBe(`/panel/${flowVersion.id}`);
  });
});
