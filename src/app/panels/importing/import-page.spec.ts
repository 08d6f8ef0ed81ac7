import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { Router, provideRouter } from '@angular/router';
import { type ImportReply, type PanelVersionSummary, problemType } from '@contract';
import { ImportPage } from './import-page';

const id = (last: number): string => `0b8b8f4e-0d43-4f2c-9a43-1d3b0f5a00${10 + last}`;

const version: PanelVersionSummary = {
  id: id(1),
  panelId: id(2),
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
  file: { id: id(3), name: 'flow.csv', byteSize: 900, sha256: 'ab'.repeat(32) },
};

const draft: ImportReply = {
  id: id(4),
  fileName: 'flow.csv',
  byteSize: 900,
  state: 'mapped',
  headers: ['firm', 'fy', 'mv', 'capex', 'equity', 'staff'],
  firstRows: [{ row: 2, cells: ['A', '2010', '1', '2', '', '7'] }],
  rowCount: 33,
  mapping: {
    panelName: 'Flow control',
    company: 'firm',
    year: 'fy',
    marketValue: 'mv',
    capex: 'capex',
    bookEquity: 'equity',
    others: ['staff'],
  },
  check: null,
  panelVersionId: null,
};

const check: NonNullable<ImportReply['check']> = {
  companies: 3,
  years: 11,
  firstYear: 2010,
  lastYear: 2020,
  rows: 33,
  completeRows: 32,
  findings: [
    {
      row: 2,
      column: 'equity',
      found: '',
      code: 'missing',
      detail: 'No value.',
      isBlocking: false,
    },
  ],
  findingCount: 1,
  blockingCount: 0,
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
    http.expectOne('/api/panel-versions').flush({ versions: [version] });
    await settled();
  }

  afterEach(() => {
    http.verify();
  });

  async function settled(): Promise<void> {
    await new Promise((resolve) => setTimeout(resolve));
    await fixture.whenStable();
  }

  function page(): HTMLElement {
    return fixture.nativeElement as HTMLElement;
  }

  function words(): string {
    return (page().textContent ?? '').replace(/\s+/g, ' ');
  }

  function button(name: string): HTMLButtonElement | undefined {
    return [...page().querySelectorAll('button')].find((each) => each.textContent.trim() === name);
  }

  async function press(name: string): Promise<void> {
    const found = button(name);
    if (found === undefined) throw new Error(`expected a button “${name}”; found none`);
    found.click();
    await settled();
  }

  async function typeName(name: string): Promise<void> {
    const input = page().querySelector<HTMLInputElement>('input[formControlName=panelName]');
    if (input === null) throw new Error('expected a field for the name; found none');
    input.value = name;
    input.dispatchEvent(new Event('input'));
    await settled();
  }

  it('shows first rows with their lines and what each column is taken for', async () => {
    await open(draft);
    const cells = [...page().querySelectorAll('kv-first-rows tbody td')];
    expect(cells.map((cell) => cell.textContent)).toEqual([
      '2',
      'A',
      '2010',
      '1',
      '2',
      'empty',
      '7',
    ]);
    expect(page().querySelector('kv-first-rows thead')?.textContent).toContain('market value');
    expect(words()).toContain('Becomes version 2: a panel has this name already');
  });

  it('checks with the guess, the newest panel’s currency and unit, and lists what was found', async () => {
    await open(draft);
    await press('Check the file');
    const sent = http.expectOne({ method: 'PUT', url: `/api/imports/${draft.id}/mapping` });
    const mapping = { ...draft.mapping, currency: 'EUR', unit: 'millions' as const };
    expect(sent.request.body).toEqual(mapping);
    sent.flush({ ...draft, state: 'checked', mapping, check });
    await settled();
    expect(page().querySelector('h1')?.textContent).toContain('1 finding, none keeps the file out');
    expect(page().querySelector('kv-finding-table tbody')?.textContent).toContain('empty cell');
    expect(button('Check the file')).toBeUndefined();

    await press('Bring in as version 2');
    http.expectOne({ method: 'POST', url: `/api/imports/${draft.id}/commit` }).flush(version);
    await settled();
    expect(TestBed.inject(Router).url).toBe(`/panel/${version.id}`);
  });

  const checked: ImportReply = {
    ...draft,
    state: 'checked',
    mapping: { ...draft.mapping, currency: 'EUR', unit: 'millions' },
    check,
  };

  it('does not bring in what was not checked', async () => {
    await open(checked);
    expect(button('Bring in as version 2')).toBeDefined();
    await typeName('Another name');
    expect(button('Bring in as version 2')).toBeUndefined();
    expect(words()).toContain('The entries above have changed since');
    expect(words()).toContain('Becomes a new panel, version 1');
    await typeName('Flow control');
    expect(button('Bring in as version 2')).toBeDefined();
  });

  it('does not bring in columns that were changed while the check ran', async () => {
    await open(draft);
    await press('Check the file');
    await typeName('Another name');
    http.expectOne(`/api/imports/${draft.id}/mapping`).flush(checked);
    await settled();
    expect(words()).toContain('The entries above have changed since');
    expect(page().querySelector('kv-commit-form')).toBeNull();
    expect(button('Check the file')?.disabled).toBeFalse();
    await typeName('Flow control');
    expect(button('Bring in as version 2')).toBeDefined();
  });

  it('asks for a mended file while a finding keeps this one out', async () => {
    const blocking = { ...check.findings[0], found: 'abc', isBlocking: true };
    await open({ ...checked, check: { ...check, findings: [blocking], blockingCount: 1 } });
    expect(page().querySelector('h1')?.textContent).toContain('1 keeps the file out');
    expect(page().querySelector('kv-commit-form')).toBeNull();
    expect(button('Choose the mended file')).toBeDefined();
  });

  it('says what is missing and sends nothing', async () => {
    await open({ ...draft, mapping: { ...draft.mapping, capex: undefined, bookEquity: 'mv' } });
    await press('Check the file');
    const errors = [...page().querySelectorAll('mat-error')].map((each) => each.textContent.trim());
    expect(errors).toEqual(['Expected a column of the file', '“mv” is chosen for two things']);
  });

  it('keeps the entries when the check fails, and says why', async () => {
    await open(draft);
    await press('Check the file');
    http.expectOne(`/api/imports/${draft.id}/mapping`).flush(
      {
        type: problemType('unreadable-file'),
        title: 'The file cannot be read',
        status: 422,
        detail: 'expected one column “mv”; found two',
      },
      { status: 422, statusText: 'Unprocessable Content' },
    );
    await settled();
    expect(page().querySelector('[role=alert]')?.textContent).toContain('found two');
    expect(button('Check the file')).toBeDefined();
  });

  it('goes on to the panel version of an import that is done', async () => {
    await open({ ...checked, state: 'committed', panelVersionId: version.id });
    expect(TestBed.inject(Router).url).toBe(`/panel/${version.id}`);
  });
});
