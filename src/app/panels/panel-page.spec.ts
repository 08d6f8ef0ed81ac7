import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { Router, provideRouter } from '@angular/router';
import {
  type PanelVersionReply,
  type PanelVersionSummary,
  type Role,
  problemType,
} from '@contract';
import { SessionStore } from '../api/session-store';
import { exampleId, panelVersion } from '../api/testing/panel-version';
import { PageContext } from '../ui/page-context';
import type { PanelDeskGrid } from './editing/panel-desk-grid';
import { PanelPage } from './panel-page';

const version = panelVersion({ note: 'From the filings', companies: 2, rows: 3, lastYear: 2011 });

const panel: PanelVersionReply = {
  version,
  companyHeader: 'firm',
  yearHeader: 'fy',
  columns: [
    { name: 'mv', role: 'marketValue' },
    { name: 'capex', role: 'capex' },
    { name: 'equity', role: 'bookEquity' },
  ],
  rows: {
    fileRow: [2, 3, 4],
    company: ['Sarvane', 'Sarvane', 'Velmara'],
    year: [2010, 2011, 2011],
    values: [
      [100, 110, 900],
      [null, 11, 90],
      [50, 55, 450],
    ],
  },
};

const peerGroup = {
  id: exampleId(4),
  number: 1,
  panelVersionId: version.id,
  ownCompany: 'Velmara',
  peerCount: 1,
  note: '',
  createdAt: version.createdAt,
  createdBy: 'Ilvo Brenn',
};

describe('the Panel page', () => {
  let fixture: ComponentFixture<PanelPage>;
  let http: HttpTestingController;

  function open(roles: Role[], inputs: Record<string, string> = {}): void {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter([{ path: '**', children: [] }]),
      ],
    });
    TestBed.inject(SessionStore).accept({
      session: {
        person: { id: exampleId(8), name: 'Ilvo Brenn', email: 'ilvo@velmara.example' },
        workspace: { id: exampleId(9), name: 'Velmara' },
        roles,
        preferences: { theme: 'system', unit: 'millions', negatives: 'minus' },
      },
    });
    http = TestBed.inject(HttpTestingController);
    fixture = TestBed.createComponent(PanelPage);
    for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
    fixture.detectChanges();
  }

  afterEach(() => {
    http.verify();
  });

  async function settled(): Promise<void> {
    await new Promise((resolve) => setTimeout(resolve));
    await fixture.whenStable();
  }

  async function answer(
    versions: readonly PanelVersionSummary[],
    group: typeof peerGroup | null = peerGroup,
    shown: PanelVersionReply = panel,
  ): Promise<void> {
    http.expectOne('/api/panel-versions').flush({ versions });
    http.expectOne('/api/desk').flush({
      panelVersion: versions.at(0) ?? null,
      peerGroup: group,
      fit: null,
      editionsWaiting: 0,
    });
    if (versions.length === 0) {
      await settled();
      noImportWaits();
      return;
    }
    http.expectOne(`/api/panel-versions/${version.id}`).flush(shown);
    await settled();
    noImportWaits();
    http.expectOne(`/api/panels/${version.panelId}/flag-dismissals`).flush({ dismissals: [] });
    await until(() => page().querySelector('kv-flag-list .groups') !== null);
    await until(() => page().querySelector('kv-panel-versions') !== null);
  }

  /** Analysts are told of them; nobody else may ask. */
  function noImportWaits(): void {
    const asked = http.match('/api/imports');
    expect(asked.length).toBe(page().querySelector('kv-waiting-imports') === null ? 0 : 1);
    for (const each of asked) each.flush({ imports: [] });
  }

  async function until(isSo: () => boolean): Promise<void> {
    while (!isSo()) await settled();
  }

  function page(): HTMLElement {
    return fixture.nativeElement as HTMLElement;
  }

  function words(): string {
    return (page().textContent ?? '').replace(/\s+/g, ' ');
  }

  function named(name: string): HTMLElement | undefined {
    return [...page().querySelectorAll<HTMLElement>('button, a')].find(
      (each) => each.textContent.trim() === name,
    );
  }

  it('says what is missing, with its place, its unit and its source', async () => {
    open(['analyst']);
    await answer([version]);
    expect(page().querySelector('h1')?.textContent).toContain(
      '2 companies, FY2010–FY2011: 1 cell missing',
    );
    expect(words()).toContain('Flow control, version 1 · EUR m · 3 rows, 2 of them complete');
    expect(page().querySelector('kv-flag-list')?.textContent).toContain('Sarvane FY2010');
    expect(page().querySelector('kv-flag-list')?.textContent).toContain('Velmara FY2011');
    expect(words()).toContain('capex “capex”, book equity “equity”');
  });

  it('offers the next step to an analyst, and the original file to everybody', async () => {
    open(['analyst']);
    await answer([version]);
    expect(named('Choose peers')?.getAttribute('href')).toBe('/peers');
    expect(named('Bring in a file')).toBeDefined();
    expect(page().querySelector('kv-waiting-imports')).not.toBeNull();
    expect(named('flow.csv')?.getAttribute('href')).toBe(`/api/files/${version.file.id}`);
  });

  it('shows the CFO the same without a way to change it', async () => {
    open(['cfo']);
    await answer([version]);
    expect(page().querySelector('h1')?.textContent).toContain('1 cell missing');
    expect(named('Choose peers')).toBeUndefined();
    expect(named('Bring in a file')).toBeUndefined();
    expect(page().querySelector('kv-waiting-imports')).toBeNull();
    expect(named('flow.csv')).toBeDefined();
  });

  it('tells the frame whose figures these are, and that a newer version exists', async () => {
    open(['cfo'], { panelVersionId: version.id });
    await answer([{ ...version, id: exampleId(5), number: 2 }, version]);
    const context = TestBed.inject(PageContext);
    expect(context.ownCompany()).toBe('Velmara');
    expect(context.currency()).toBe('EUR');
    expect(context.lineage()[0].link).toBe(`/panel/${version.id}`);
    expect(context.stale()?.text).toContain('v2');
    expect(context.stale()?.action?.link).toBe(`/panel/${exampleId(5)}`);
  });

  it('names no own company before peers are chosen, nor one that is not in this panel', async () => {
    open(['analyst']);
    await answer([version], { ...peerGroup, ownCompany: 'Elsewhere' });
    expect(TestBed.inject(PageContext).ownCompany()).toBe('');
  });

  it('leads from a missing cell to its row, by company and year', async () => {
    open(['analyst']);
    await answer([version]);
    named('Sarvane FY2010 capex')?.click();
    await until(() => TestBed.inject(Router).url.includes('column='));
    expect(TestBed.inject(Router).url).toBe('/?company=Sarvane&year=2010&column=1');
  });

  describe('the row that the address names', () => {
    const wide: PanelVersionReply = {
      ...panel,
      rows: { ...panel.rows, fileRow: [2, 2, 0] },
    };

    function focused(): unknown {
      const rows = fixture.debugElement.query(({ name }) => name === 'kv-panel-rows');
      return (rows.componentInstance as PanelDeskGrid).focusedRow();
    }

    async function openAt(inputs: Record<string, string>): Promise<void> {
      open(['cfo'], inputs);
      await answer([version], peerGroup, wide);
      await until(() => page().querySelector('kv-panel-rows') !== null);
    }

    it('is told from another of the same line by its company and year', async () => {
      await openAt({ company: 'Sarvane', year: '2011' });
      expect(focused()).toEqual({ company: 'Sarvane', year: 2011 });
      expect(words()).not.toContain('no row');
    });

    it('may have come by a correction, and may be looked at in one column', async () => {
      await openAt({ company: 'Velmara', year: '2011', column: '2' });
      expect(focused()).toEqual({ company: 'Velmara', year: 2011, column: 2 });
    });

    it('is the first of its line where the address names a line', async () => {
      await openAt({ row: '2' });
      expect(focused()).toEqual({ company: 'Sarvane', year: 2010 });
    });

    it('is said to be missing where this version has none', async () => {
      await openAt({ company: 'Kesdrin', year: '2016', row: '2' });
      expect(focused()).toBeNull();
      expect(words()).toContain('This version has no row for Kesdrin FY2016.');
    });

    it('is none where the address is cut short', async () => {
      await openAt({ company: 'Velmara' });
      expect(focused()).toBeNull();
      expect(words()).not.toContain('no row');
    });
  });

  it('offers to say that a figure is right, to analysts and on the newest version only', async () => {
    open(['analyst']);
    await answer([version]);
    expect(
      page().querySelector('[aria-label="Right as it is: Sarvane FY2010 capex"]'),
    ).not.toBeNull();
  });

  it('lets an older version’s flags be', async () => {
    open(['analyst'], { panelVersionId: version.id });
    await answer([{ ...version, id: exampleId(5), number: 2 }, version]);
    expect(page().querySelector('[aria-label^="Right as it is"]')).toBeNull();
  });

  it('stays in its place while it goes on to the version that was saved', async () => {
    open(['analyst']);
    await answer([version]);
    await until(() => page().querySelector('kv-panel-rows .ag-cell') !== null);
    const made = { ...version, id: exampleId(5), number: 2, origin: 'correction' as const };
    const cell = page().querySelector<HTMLElement>('.ag-cell[col-id=figure-0]');
    cell?.focus();
    fixture.debugElement
      .query(({ name }) => name === 'kv-panel-rows')
      .triggerEventHandler('saved', made.id);
    await until(() => TestBed.inject(Router).url.includes(made.id));
    expect(TestBed.inject(Router).url).toBe(`/panel/${made.id}`);
    fixture.componentRef.setInput('panelVersionId', made.id);
    await settled();
    expect(words()).toContain('Flow control, version 1');
    http.expectOne('/api/panel-versions').flush({ versions: [made, version] });
    http.expectOne('/api/desk').flush({
      ...{ panelVersion: made, peerGroup, fit: null, editionsWaiting: 0 },
    });
    http.expectOne(`/api/panel-versions/${made.id}`).flush({ ...panel, version: made });
    await settled();
    expect(words()).toContain('Flow control, version 2');
    expect(page().querySelector('.ag-cell[col-id=figure-0]')).toBe(cell);
    // The flags of the panel stay until it is looked through again; nothing of it is asked for anew.
    expect(page().querySelector('kv-flag-list .groups')).not.toBeNull();
  });

  it('leaves its place for a version that is asked for otherwise', async () => {
    open(['analyst'], { panelVersionId: version.id });
    await answer([version]);
    fixture.componentRef.setInput('panelVersionId', exampleId(5));
    await settled();
    expect(words()).toContain('Reading the panel');
    http.expectOne('/api/panel-versions');
    http.expectOne('/api/desk');
  });

  it('looks through what is typed and not saved', async () => {
    open(['analyst']);
    await answer([version]);
    await until(() => page().querySelector('kv-panel-rows') !== null);
    const rows = panel.rows.company.map((company, row) => ({
      fileRow: panel.rows.fileRow[row],
      company,
      year: panel.rows.year[row],
      values: [panel.rows.values[0][row], -5, panel.rows.values[2][row]],
    }));
    fixture.debugElement
      .query(({ name }) => name === 'kv-panel-rows')
      .triggerEventHandler('editedChanged', rows);
    await until(() => words().includes('3 figures are zero or negative'));
    expect(page().querySelector('h1')?.textContent).toContain('3 figures to look at');
    const dismiss = page().querySelector<HTMLButtonElement>(
      '[aria-label="Right as it is: Sarvane FY2010 capex"]',
    );
    expect(dismiss?.disabled).toBeTrue();
  });

  it('says that a line asked for has no row here', async () => {
    open(['analyst'], { row: '77' });
    await answer([version]);
    expect(words()).toContain('no row from line 77');
  });

  it('begins an empty workspace with one step, or with the sample', async () => {
    open(['analyst', 'billing_admin']);
    await answer([]);
    expect(page().querySelector('h1')?.textContent).toContain('Bring in a panel');
    named('Open the sample panel')?.click();
    await settled();
    http
      .expectOne({ method: 'POST', url: '/api/imports/sample' })
      .flush(
        { type: problemType('internal'), title: 'Something went wrong on our side', status: 500 },
        { status: 500, statusText: 'Internal Server Error' },
      );
    await settled();
    expect(page().querySelector('[role=alert]')?.textContent).toContain('Something went wrong');
    expect(named('Open the sample panel')).toBeDefined();
    expect(page().querySelector('kv-waiting-imports')).not.toBeNull();
  });

  it('tells the CFO of an empty workspace whom to wait for', async () => {
    open(['cfo']);
    await answer([]);
    expect(words()).toContain('as soon as an analyst of your workspace has brought one in');
    expect(page().querySelector('input[type=file]')).toBeNull();
  });

  it('leads from a version that does not exist to the newest', async () => {
    open(['analyst'], { panelVersionId: version.id });
    http.expectOne('/api/panel-versions').flush({ versions: [version] });
    http
      .expectOne('/api/desk')
      .flush({ panelVersion: version, peerGroup: null, fit: null, editionsWaiting: 0 });
    http
      .expectOne(`/api/panel-versions/${version.id}`)
      .flush(
        { type: problemType('not-found'), title: 'Not found', status: 404 },
        { status: 404, statusText: 'Not Found' },
      );
    await settled();
    expect(named('Open the newest panel')?.getAttribute('href')).toBe('/panel');
  });
});
