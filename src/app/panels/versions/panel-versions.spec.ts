import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatCheckboxHarness } from '@angular/material/checkbox/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { provideRouter } from '@angular/router';
import { type PanelVersionSummary, problemType } from '@contract';
import { NumberFormat } from '../../ui/number-format';
import { PanelVersions } from './panel-versions';
import { originWords } from './version-words';

const id = (last: number): string => `0b8b8f4e-0d43-4f2c-9a43-1d3b0f5a00${10 + last}`;

const first: PanelVersionSummary = {
  id: id(1),
  panelId: id(9),
  parentId: null,
  origin: 'import',
  panelName: 'Flow control',
  number: 1,
  currency: 'EUR',
  unit: 'millions',
  note: 'From the filings',
  companies: 2,
  rows: 3,
  firstYear: 2010,
  lastYear: 2011,
  createdAt: '2026-03-04T12:00:00.000Z',
  createdBy: 'Ilvo Brenn',
  file: { id: id(3), name: 'flow.csv', byteSize: 900, sha256: 'ab'.repeat(32) },
};
const second: PanelVersionSummary = {
  ...first,
  id: id(2),
  number: 2,
  parentId: first.id,
  origin: 'correction',
};
const third: PanelVersionSummary = {
  ...first,
  id: id(4),
  number: 3,
  parentId: second.id,
  origin: 'restore',
};
const elsewhere: PanelVersionSummary = { ...first, id: id(5), panelId: id(8), panelName: 'Pumps' };

describe('panel versions', () => {
  let fixture: ComponentFixture<PanelVersions>;
  let http: HttpTestingController;

  async function show(mayChange = true): Promise<HTMLElement> {
    TestBed.configureTestingModule({
      providers: [provideHttpClient(), provideHttpClientTesting(), provideRouter([])],
    });
    http = TestBed.inject(HttpTestingController);
    const numbers = TestBed.inject(NumberFormat);
    numbers.currency.set('EUR');
    numbers.panelUnit.set('millions');
    fixture = TestBed.createComponent(PanelVersions);
    const inputs = {
      versions: [elsewhere, third, second, first],
      shownId: third.id,
      columns: [{ name: 'capex_eur', role: 'capex' }],
      mayChange,
    };
    for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
    await fixture.whenStable();
    return fixture.nativeElement as HTMLElement;
  }

  afterEach(() => {
    http.verify();
  });

  function words(page: HTMLElement): string {
    return page.textContent.replace(/\s+/g, ' ');
  }

  async function compare(...names: string[]): Promise<void> {
    const loader = TestbedHarnessEnvironment.loader(fixture);
    for (const name of names)
      await (
        await loader.getHarness(
          MatCheckboxHarness.with({ selector: `:has([aria-label="Compare ${name}"])` }),
        )
      ).check();
  }

  it('says of each what made it, and hands it out', async () => {
    const page = await show();
    expect(originWords(first, [first])).toBe('from a file');
    expect(words(page)).toContain('corrections of v1');
    expect(words(page)).toContain('an older version put back, after v2');
    const link = (name: string) =>
      page.querySelector(`a[aria-label="${name}"]`)?.getAttribute('href');
    expect(link('CSV of Flow control v2')).toBe(`/api/panel-versions/${second.id}/export/csv`);
    expect(link('XLSX of Flow control v2')).toBe(`/api/panel-versions/${second.id}/export/xlsx`);
    expect(link('Download flow.csv of version 2')).toBe(`/api/files/${second.file.id}`);
  });

  it('compares two of one panel, the older one first', async () => {
    const page = await show();
    await compare('Flow control v3', 'Flow control v1');
    const loader = TestbedHarnessEnvironment.loader(fixture);
    const other = await loader.getHarness(
      MatCheckboxHarness.with({ selector: ':has([aria-label="Compare Pumps v1"])' }),
    );
    expect(await other.isDisabled()).toBeTrue();
    await (await loader.getHarness(MatButtonHarness.with({ text: 'Compare v1 with v3' }))).click();
    http.expectOne(`/api/panel-versions/${first.id}/differences/${third.id}`).flush({
      addedRows: 1,
      removedRows: 0,
      changedCells: 2,
      listed: [
        {
          company: 'Sarvane',
          year: 2010,
          kind: 'changed-cell',
          column: 'capex_eur',
          before: null,
          after: 11.25,
        },
        {
          company: 'Velmara',
          year: 2011,
          kind: 'changed-cell',
          column: 'staff',
          before: 7,
          after: 8,
        },
        {
          company: 'Velmara',
          year: 2012,
          kind: 'added-row',
          column: null,
          before: null,
          after: null,
        },
      ],
    });
    await fixture.whenStable();
    expect(words(page)).toContain('2 cells changed and 1 row added.');
    const cells = () =>
      [...page.querySelectorAll('kv-version-differences tbody tr')].map((row) =>
        [...row.querySelectorAll('th, td')].map((cell) => cell.textContent.trim()),
      );
    expect(cells()).toEqual([
      ['Sarvane', 'FY2010', 'Capex', 'n/a', '11.25'],
      ['Velmara', 'FY2011', 'staff', '7', '8'],
      ['Velmara', 'FY2012', 'row added', '', ''],
    ]);
    const select = page.querySelector('select')!;
    select.value = 'Sarvane';
    select.dispatchEvent(new Event('change'));
    await fixture.whenStable();
    expect(cells().length).toBe(1);
    expect(document.activeElement?.textContent).toContain('From Flow control v1 to v3');
  });

  it('puts an older version back with a note, and says which version that made', async () => {
    const page = await show();
    const made: string[] = [];
    fixture.componentInstance.restored.subscribe((versionId) => made.push(versionId));
    expect(
      page.querySelector('[aria-label="Put Flow control v3 back as a new version"]'),
    ).toBeNull();
    page
      .querySelector<HTMLElement>('[aria-label="Put Flow control v1 back as a new version"]')
      ?.click();
    while (document.querySelector('kv-restore-dialog') === null)
      await new Promise((resolve) => setTimeout(resolve, 5));
    const loader = TestbedHarnessEnvironment.documentRootLoader(fixture);
    const note = await loader.getHarness(MatInputHarness.with({ selector: '[name=note]' }));
    expect(await note.getValue()).toBe('Version 1 put back');
    await note.setValue('v2 was wrong');
    const go = await loader.getHarness(MatButtonHarness.with({ text: 'Put back as version 4' }));
    const url = `/api/panel-versions/${first.id}/restore`;
    await go.click();
    http
      .expectOne(url)
      .flush(
        { type: problemType('conflict'), title: 'A newer version exists', status: 409 },
        { status: 409, statusText: 'Conflict' },
      );
    const notice = () => document.querySelector('kv-restore-dialog [role=alert]');
    while (notice() === null) await new Promise((resolve) => setTimeout(resolve, 5));
    expect(notice()?.textContent).toContain('A newer version exists');
    await go.click();
    const request = http.expectOne(url);
    expect(request.request.body).toEqual({ note: 'v2 was wrong' });
    request.flush({ ...first, id: id(6), number: 4, origin: 'restore' });
    await fixture.whenStable();
    while (document.querySelector('kv-restore-dialog') !== null)
      await new Promise((resolve) => setTimeout(resolve, 5));
    expect(made).toEqual([id(6)]);
  });

  it('lets nobody but an analyst put a version back', async () => {
    const page = await show(false);
    expect(page.querySelector('[aria-label^="Put "]')).toBeNull();
    expect(page.querySelector('a[aria-label="CSV of Flow control v1"]')).not.toBeNull();
  });
});
