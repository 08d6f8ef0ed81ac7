import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatCheckboxHarness } from '@angular/material/checkbox/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { provideRouter } from '@angular/router';
import { type PanelVersionSummary, problemType } from '@contract';
import { exampleId, panelVersion } from '../../api/testing/panel-version';
import { NumberFormat } from '../../ui/number-format';
import { PanelVersions } from './panel-versions';
import { originWords } from './version-words';

const first = panelVersion({ note: 'From the filings', companies: 2, rows: 3, lastYear: 2011 });
const second: PanelVersionSummary = {
  ...first,
  id: exampleId(10),
  number: 2,
  parentId: first.id,
  origin: 'correction',
};
const third: PanelVersionSummary = {
  ...first,
  id: exampleId(4),
  number: 3,
  parentId: second.id,
  origin: 'restore',
  restoredNumber: 1,
};
const elsewhere: PanelVersionSummary = {
  ...first,
  id: exampleId(5),
  panelId: exampleId(8),
  panelName: 'Pumps',
};

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
    expect(originWords(first, [first])).toBe('from a file by Ilvo Brenn');
    expect(words(page)).toContain('corrections of v1 by Ilvo Brenn');
    expect(words(page)).toContain('version 1 put back by Ilvo Brenn, after v2');
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
      columns: [
        { name: 'capex_eur', role: 'capex' },
        { name: 'staff', role: 'other' },
      ],
      renamed: [{ role: 'capex', before: 'inv', after: 'capex_eur' }],
      money: { currency: 'EUR', unit: 'millions' },
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
    expect(words(page)).toContain('Capex: the column “inv” is called “capex_eur” in v3.');
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
    request.flush({ ...first, id: exampleId(6), number: 4, origin: 'restore' });
    await fixture.whenStable();
    while (document.querySelector('kv-restore-dialog') !== null)
      await new Promise((resolve) => setTimeout(resolve, 5));
    expect(made).toEqual([exampleId(6)]);
  });

  it('lets nobody but an analyst put a version back', async () => {
    const page = await show(false);
    expect(page.querySelector('[aria-label^="Put "]')).toBeNull();
    expect(page.querySelector('a[aria-label="CSV of Flow control v1"]')).not.toBeNull();
  });
});
