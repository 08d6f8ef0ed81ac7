import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { By } from '@angular/platform-browser';
import { provideRouter } from '@angular/router';
import {
  type PanelVersionReply,
  type PanelVersionSummary,
  type Role,
  problemType,
} from '@contract';
import { SessionStore } from '../../api/session-store';
import { NumberFormat } from '../../ui/number-format';
import { PageContext } from '../../ui/page-context';
import { PanelGrid } from '../panel-grid';
import type { PanelRow } from '../panel-rows';
import { readBlockText } from '../../ui/block-text';
import { PanelDeskGrid } from './panel-desk-grid';
import { cellKey } from './panel-edits';
import { UnsavedEdits } from './unsaved-edits';

const id = (last: number): string => `0b8b8f4e-0d43-4f2c-9a43-1d3b0f5a00${10 + last}`;

const version: PanelVersionSummary = {
  id: id(1),
  panelId: id(2),
  parentId: null,
  origin: 'import',
  panelName: 'Flow control',
  number: 4,
  currency: 'EUR',
  unit: 'millions',
  note: '',
  companies: 2,
  rows: 4,
  firstYear: 2010,
  lastYear: 2012,
  createdAt: '2026-03-04T12:00:00.000Z',
  createdBy: 'Ilvo Brenn',
  file: { id: id(3), name: 'flow.csv', byteSize: 900, sha256: 'ab'.repeat(32) },
};

const small: PanelVersionReply = {
  version,
  companyHeader: 'firm',
  yearHeader: 'fy',
  columns: [
    { name: 'mv', role: 'marketValue' },
    { name: 'inv', role: 'capex' },
    { name: 'equity', role: 'bookEquity' },
  ],
  rows: {
    fileRow: [2, 3, 4, 5],
    company: ['Sarvane', 'Sarvane', 'Velmara', 'Velmara'],
    year: [2010, 2011, 2010, 2011],
    values: [
      [100.125, 110, 900, 910],
      [null, 11, 90, 91],
      [50, 55, 450, 460],
    ],
  },
};

/** 60 rows of 21 figures with awkward digits. */
function wide(): PanelVersionReply {
  const rows = Array.from({ length: 60 }, (_, row) => row);
  const columns = Array.from({ length: 21 }, (_, column) => column);
  return {
    ...small,
    columns: columns.map((column) => ({
      name: `c${column}`,
      role: column === 0 ? 'capex' : 'other',
    })),
    rows: {
      fileRow: rows.map((row) => row + 2),
      company: rows.map((row) => `Company ${String(Math.floor(row / 10)).padStart(2, '0')}`),
      year: rows.map((row) => 2000 + (row % 10)),
      values: columns.map((column) =>
        rows.map((row) => ((row * 7 + column) % 13 === 0 ? null : (row - 30) / (column + 3))),
      ),
    },
  };
}

describe('the rows of a panel on the desk', () => {
  let fixture: ComponentFixture<PanelDeskGrid>;
  let http: HttpTestingController;
  let edited: readonly PanelRow[];
  let savedId: string | undefined;
  /** Whether the page could be left the moment that the saved version was told. */
  let mayLeaveOnceSaved: boolean | undefined;

  async function open(
    panel: PanelVersionReply = small,
    inputs: Record<string, unknown> = {},
    roles: Role[] = ['analyst'],
  ): Promise<void> {
    TestBed.resetTestingModule();
    TestBed.configureTestingModule({
      providers: [provideHttpClient(), provideHttpClientTesting(), provideRouter([])],
    });
    TestBed.inject(SessionStore).accept({
      session: {
        person: { id: id(8), name: 'Ilvo Brenn', email: 'ilvo@velmara.example' },
        workspace: { id: id(9), name: 'Velmara' },
        roles,
        preferences: { theme: 'system', unit: 'millions', negatives: 'minus' },
      },
    });
    TestBed.inject(PageContext).show({ currency: 'EUR', unit: 'millions', lineage: [] });
    http = TestBed.inject(HttpTestingController);
    fixture = TestBed.createComponent(PanelDeskGrid);
    const given = { panel, versions: [panel.version], mayChange: true, ...inputs };
    for (const [name, value] of Object.entries(given)) fixture.componentRef.setInput(name, value);
    fixture.componentInstance.editedChanged.subscribe((rows) => (edited = rows));
    fixture.componentInstance.saved.subscribe((saved) => {
      savedId = saved;
      const leaving = new Event('beforeunload', { cancelable: true });
      TestBed.inject(UnsavedEdits).holdBack(leaving);
      mayLeaveOnceSaved = !leaving.defaultPrevented;
    });
    document.body.append(page());
    fixture.detectChanges();
    await settled();
    await settled();
  }

  beforeEach(() => {
    sessionStorage.clear();
    savedId = undefined;
  });

  afterEach(() => {
    http.verify();
    sessionStorage.clear();
    fixture.destroy();
  });

  async function settled(): Promise<void> {
    await fixture.whenStable();
    await new Promise((resolve) => setTimeout(resolve, 30));
    await fixture.whenStable();
  }

  /** Dialogs open and close in their own time. */
  async function until(isSo: () => boolean): Promise<void> {
    for (let times = 0; times < 50 && !isSo(); times++) await settled();
    await settled();
  }

  function page(): HTMLElement {
    return fixture.nativeElement as HTMLElement;
  }

  function words(): string {
    return (page().textContent ?? '').replace(/\s+/g, ' ');
  }

  function cell(row: number, column: string): HTMLElement {
    const found = page().querySelector<HTMLElement>(
      `.ag-row[row-index="${row}"] .ag-cell[col-id="${column}"]`,
    );
    if (found === null) throw new Error(`expected a cell in row ${row}, column ${column}`);
    return found;
  }

  function named(name: string | RegExp, within: ParentNode = page()): HTMLButtonElement {
    const found = [...within.querySelectorAll<HTMLButtonElement>('button')].find((each) => {
      const text = each.textContent.replace(/\s+/g, ' ').trim();
      return typeof name === 'string' ? text === name : name.test(text);
    });
    if (found === undefined) throw new Error(`expected a button ${String(name)}`);
    return found;
  }

  async function click(row: number, column: string, init: MouseEventInit = {}): Promise<void> {
    const at = cell(row, column);
    const kinds = { bubbles: true, cancelable: true, pointerType: 'mouse', ...init };
    at.dispatchEvent(new PointerEvent('pointerdown', kinds));
    // As the browser does by itself.
    if (init.shiftKey !== true) at.focus();
    for (const kind of ['mouseup', 'click']) at.dispatchEvent(new MouseEvent(kind, kinds));
    await settled();
  }

  /** Scrolled to, where the grid has not drawn it. */
  async function goTo(row: number, figure: number): Promise<void> {
    const { componentInstance } = fixture.debugElement.query(By.directive(PanelGrid));
    (componentInstance as PanelGrid).goTo({ row, column: figure + 2 });
    await settled();
  }

  async function press(key: string, init: KeyboardEventInit = {}): Promise<void> {
    const at = document.activeElement ?? document.body;
    at.dispatchEvent(
      new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true, ...init }),
    );
    await settled();
  }

  function copied(kind: 'copy' | 'cut' = 'copy'): string {
    const clipboardData = new DataTransfer();
    const event = new ClipboardEvent(kind, { clipboardData, bubbles: true, cancelable: true });
    document.activeElement?.dispatchEvent(event);
    return clipboardData.getData('text/plain');
  }

  async function paste(text: string): Promise<void> {
    const clipboardData = new DataTransfer();
    clipboardData.setData('text/plain', text);
    document.activeElement?.dispatchEvent(
      new ClipboardEvent('paste', { clipboardData, bubbles: true, cancelable: true }),
    );
    await settled();
  }

  async function type(text: string): Promise<void> {
    await press('F2');
    const field = document.activeElement as HTMLInputElement;
    field.value = text;
    await press('Enter');
  }

  const chosen = () =>
    [...page().querySelectorAll('.kv-block-cell')].map((each) => {
      const row = each.closest('[row-index]')?.getAttribute('row-index') ?? '';
      return `${row}:${each.getAttribute('col-id') ?? ''}`;
    });

  describe('selecting', () => {
    it('draws a block with Shift and arrows, and goes back to one cell with Escape', async () => {
      await open();
      await click(0, 'figure-0');
      expect(chosen()).toEqual([]);
      await press('ArrowDown', { shiftKey: true });
      await press('ArrowRight', { shiftKey: true });
      expect(chosen()).toEqual(['0:figure-0', '0:figure-1', '1:figure-0', '1:figure-1']);
      expect(document.activeElement).toBe(cell(1, 'figure-1'));
      expect(words()).toContain('2 × 2 cells selected');
      await press('Escape');
      expect(chosen()).toEqual([]);
      await press('ArrowLeft');
      expect(document.activeElement).toBe(cell(1, 'figure-0'));
      expect(chosen()).toEqual([]);
    });

    it('draws to the edge, takes every figure, and follows Shift and click', async () => {
      await open();
      await click(1, 'figure-1');
      await press('ArrowDown', { shiftKey: true, ctrlKey: true });
      expect(chosen()).toEqual(['1:figure-1', '2:figure-1', '3:figure-1']);
      await press('a', { ctrlKey: true });
      expect(chosen().length).toBe(12);
      await click(3, 'company');
      await click(2, 'figure-0', { shiftKey: true });
      expect(chosen()).toEqual([
        ...['2:company', '2:year', '2:figure-0'],
        ...['3:company', '3:year', '3:figure-0'],
      ]);
    });

    it('draws with the mouse while it is held', async () => {
      await open();
      const from = cell(0, 'figure-0');
      from.dispatchEvent(
        new PointerEvent('pointerdown', { bubbles: true, cancelable: true, pointerType: 'mouse' }),
      );
      cell(2, 'figure-1').dispatchEvent(new MouseEvent('mouseover', { bubbles: true, buttons: 1 }));
      document.dispatchEvent(new MouseEvent('mouseup', { bubbles: true }));
      cell(3, 'figure-2').dispatchEvent(new MouseEvent('mouseover', { bubbles: true }));
      await settled();
      expect(chosen().length).toBe(6);
    });
  });

  describe('the clipboard', () => {
    it('gets every digit in the unit that is shown, and says the unit', async () => {
      await open();
      TestBed.inject(NumberFormat).unit.set('thousands');
      await settled();
      await click(0, 'company');
      await press('ArrowRight', { shiftKey: true, ctrlKey: true });
      expect(copied()).toBe('Sarvane\t2010\t100125\t\t50000\t2');
      await settled();
      expect(words()).toContain('1 × 6 cells copied at full precision, money in EUR k');
    });

    it('brings a block of 50 × 20 there and back, and into other cells, without losing a bit', async () => {
      const panel = wide();
      await open(panel);
      await click(0, 'figure-0');
      for (let times = 0; times < 49; times++)
        document.activeElement?.dispatchEvent(
          new KeyboardEvent('keydown', { key: 'ArrowDown', shiftKey: true, bubbles: true }),
        );
      for (let times = 0; times < 19; times++)
        document.activeElement?.dispatchEvent(
          new KeyboardEvent('keydown', { key: 'ArrowRight', shiftKey: true, bubbles: true }),
        );
      await settled();
      const text = copied();
      const block = readBlockText(text);
      expect([block.length, block[0].length]).toEqual([50, 20]);
      const value = (row: number, column: number) => panel.rows.values[column][row];
      block.forEach((cells, row) => {
        cells.forEach((shown, column) => {
          expect(shown === '' ? null : Number(shown)).toBe(value(row, column));
        });
      });
      // Onto themselves: nothing differs.
      await goTo(0, 0);
      await paste(text);
      expect(words()).toContain('Nothing differs from before');
      // One row down and one column to the right.
      await goTo(1, 1);
      await paste(text);
      for (let row = 0; row < 50; row++)
        for (let column = 0; column < 20; column++)
          expect(edited[row + 1].values[column + 1]).toBe(value(row, column));
      expect(edited[0].values).toEqual(panel.rows.values.map((column) => column[0]));
      named(/^Undo: /).click();
      await settled();
      expect(edited.map(({ values }) => values[1])).toEqual([...panel.rows.values[1]]);
    });

    it('fills a block with one figure, and empties what is cut', async () => {
      await open();
      await click(0, 'figure-1');
      await press('ArrowDown', { shiftKey: true });
      await paste('(1.234,5)\r\n');
      expect(edited.map(({ values }) => values[1])).toEqual([-1234.5, -1234.5, 90, 91]);
      expect(copied('cut')).toBe('-1234.5\n-1234.5');
      await settled();
      expect(edited.map(({ values }) => values[1])).toEqual([null, null, 90, 91]);
    });

    it('is refused as a whole where it does not fit or holds no number', async () => {
      await open();
      await click(2, 'figure-2');
      await paste('1\t2\n3\t4\n5\t6');
      const notice = page().querySelector('[role=alert]')?.textContent ?? '';
      expect(notice).toContain('1 row would be below the last row');
      expect(notice).toContain('1 column would be to the right of Book equity');
      await click(2, 'figure-1');
      await paste('1\n2 or so');
      expect(page().querySelector('[role=alert]')?.textContent).toContain(
        'Velmara 2011, Capex: found “2 or so”',
      );
      expect(edited.map(({ values }) => values[1])).toEqual([null, 11, 90, 91]);
      expect(page().querySelector('kv-save-bar')).toBeNull();
    });

    it('takes nothing in from somebody who may only read', async () => {
      await open(small, { mayChange: false }, ['cfo']);
      await click(0, 'figure-0');
      await paste('5');
      await press('Delete');
      await press('F2');
      expect(copied()).toBe('100.125');
      expect(edited.map(({ values }) => values[0])).toEqual([100.125, 110, 900, 910]);
      expect(words()).not.toContain('Add row');
    });
  });

  describe('changing cells', () => {
    it('begins with what is typed or with every digit, and reads figures as people write them', async () => {
      await open();
      await click(0, 'figure-0');
      await press('F2');
      const field = document.activeElement as HTMLInputElement;
      expect(field.getAttribute('aria-label')).toBe('Market value of Sarvane in 2010');
      expect(field.value).toBe('100.125');
      field.value = '1.234,5';
      await press('Enter');
      expect(edited[0].values[0]).toBe(1234.5);
      expect(document.activeElement).toBe(cell(1, 'figure-0'));
      expect(cell(0, 'figure-0').classList).toContain('kv-edited-cell');
      await press('7');
      expect((document.activeElement as HTMLInputElement).value).toBe('7');
      await press('Escape');
      expect(edited[1].values[0]).toBe(110);
      expect(words()).toContain('1 cell changed in version 4');
    });

    it('takes no text for a figure, and says what was typed', async () => {
      await open();
      await click(1, 'figure-1');
      await type('twelve');
      expect(page().querySelector('[role=alert]')?.textContent).toContain(
        'Sarvane 2011, Capex: found “twelve”',
      );
      expect(edited[1].values[1]).toBe(11);
    });

    it('empties a block, and undoes and redoes step by step', async () => {
      await open();
      await click(2, 'figure-0');
      await press('ArrowRight', { shiftKey: true });
      await press('Delete');
      expect(edited[2].values).toEqual([null, null, 450]);
      await press('z', { ctrlKey: true });
      expect(edited[2].values).toEqual([900, 90, 450]);
      expect(page().querySelector('kv-save-bar')).toBeNull();
      await press('y', { ctrlKey: true });
      expect(edited[2].values).toEqual([null, null, 450]);
      expect(named('Undo: 2 cells emptied')).toBeDefined();
      named('Discard').click();
      await settled();
      expect(edited[2].values).toEqual([900, 90, 450]);
      named('Undo: 2 cells discarded').click();
      await settled();
      expect(edited[2].values).toEqual([null, null, 450]);
    });

    it('tells a cell in full, and what it held before', async () => {
      await open();
      await click(0, 'figure-0');
      expect(page().querySelector('kv-cell-line')?.textContent).toContain('100.125');
      expect(words()).toContain('Sarvane 2010, line 2 of the file, column “mv”');
      await type('90');
      await click(0, 'figure-0');
      expect(page().querySelector('kv-cell-line')?.textContent).toContain('saved: 100.125');
    });

    it('comes back after a reload, and warns before it is left', async () => {
      await open();
      await click(0, 'figure-1');
      await type('8');
      const unsaved = TestBed.inject(UnsavedEdits);
      const leaving = new Event('beforeunload', { cancelable: true });
      unsaved.holdBack(leaving);
      expect(leaving.defaultPrevented).toBeTrue();
      fixture.destroy();
      expect(await unsaved.mayLeave()).toBeTrue();
      await open();
      expect(words()).toContain('1 cell that were changed before and not saved are back');
      expect(edited[0].values[1]).toBe(8);
    });
  });

  describe('looking', () => {
    it('finds companies, years and values, and keeps the focus in the field', async () => {
      await open();
      await click(3, 'figure-0');
      await press('f', { ctrlKey: true });
      const field = page().querySelector<HTMLInputElement>('input[type=search]');
      expect(document.activeElement).toBe(field);
      if (field === null) return;
      field.value = '91';
      field.dispatchEvent(new Event('input'));
      await settled();
      expect(words()).toContain('2 found');
      await press('Enter');
      expect(words()).toContain('1 of 2');
      expect(words()).toContain('Velmara 2011');
      expect(document.activeElement).toBe(field);
      await press('Escape');
      expect(document.activeElement).toBe(cell(3, 'figure-0'));
    });

    it('shows the rows with gaps, changes or a flag, and the flags of a cell in words', async () => {
      const place = { company: 'Velmara', year: 2011, column: 0 };
      const flag = { ...place, value: 910, facts: { code: 'sign' } };
      await open(small, {
        flags: new Map([[cellKey(place), [flag]]]),
        flagWords: () => 'Looked at twice',
      });
      const shown = () =>
        [...page().querySelectorAll('.ag-cell[col-id="fileRow"]')].map((each) => each.textContent);
      const choose = async (value: string): Promise<void> => {
        const list = page().querySelector('select');
        if (list === null) throw new Error('expected a choice of rows');
        list.value = value;
        list.dispatchEvent(new Event('change'));
        await settled();
      };
      await choose('gaps');
      expect(shown()).toEqual(['2']);
      await choose('sign');
      expect(shown()).toEqual(['5']);
      expect(cell(0, 'figure-0').classList).toContain('kv-flagged-cell');
      await click(0, 'figure-0');
      expect(words()).toContain('Looked at twice');
      await choose('edited');
      expect(words()).toContain('No row fits what is chosen above');
    });

    it('shows a cell through the versions of its panel', async () => {
      await open();
      await click(1, 'figure-1');
      named('History of this cell').click();
      await settled();
      http
        .expectOne(
          `/api/panel-versions/${version.id}/cell-history?company=Sarvane&year=2011&column=1`,
        )
        .flush({
          entries: [
            {
              ...{ panelVersionId: id(5), number: 2, value: 12, hasRow: true },
              ...{ at: version.createdAt, by: 'Mira Oduya', note: 'From the filings' },
              ...{ reason: null, source: null },
            },
            {
              ...{ panelVersionId: version.id, number: 4, value: 11, hasRow: true },
              ...{ at: version.createdAt, by: 'Ilvo Brenn', note: 'Second look' },
              ...{ reason: 'Misread', source: 'Report 2011, p. 9' },
            },
          ],
        });
      await settled();
      const table = document.querySelector('kv-cell-history-dialog table')?.textContent ?? '';
      for (const said of ['v2', '12', 'Mira Oduya', 'v4', 'Misread', 'Report 2011, p. 9'])
        expect(table).toContain(said);
      document.querySelector<HTMLElement>('kv-cell-history-dialog button')?.click();
      await until(() => document.querySelector('kv-cell-history-dialog') === null);
      expect(document.activeElement).toBe(cell(1, 'figure-1'));
    });
  });

  describe('rows', () => {
    it('are added by company and year, and taken out', async () => {
      await open();
      named('Add row…').click();
      await settled();
      const dialog = document.querySelector('kv-add-row-dialog');
      if (dialog === null) throw new Error('expected a dialog');
      const [company, year] = dialog.querySelectorAll('input');
      const give = (field: HTMLInputElement, text: string): void => {
        field.value = text;
        field.dispatchEvent(new Event('input'));
      };
      give(company, 'Sarvane');
      give(year, '2011');
      named('Add row', dialog).click();
      await settled();
      expect(dialog.textContent).toContain('Sarvane has a row for 2011 already');
      give(year, '2012');
      named('Add row', dialog).click();
      await until(() => edited.length === 5);
      expect(edited.map((row) => `${row.company} ${row.year}`)[2]).toBe('Sarvane 2012');
      expect(document.activeElement).toBe(cell(2, 'figure-0'));
      expect(cell(2, 'fileRow').textContent).toContain('added');
      // Without figures it goes without a question.
      named('Remove row').click();
      await settled();
      expect(edited.length).toBe(4);
    });

    it('with figures are taken out only after a question', async () => {
      await open();
      await click(3, 'year');
      await press('ArrowUp', { shiftKey: true });
      named('Remove 2 rows').click();
      await until(() => document.querySelector('kv-confirm-dialog') !== null);
      const dialog = document.querySelector('kv-confirm-dialog');
      expect(dialog?.textContent).toContain('Remove 2 rows?');
      named('Remove rows', document).click();
      await until(() => edited.length === 2);
      expect(edited.map(({ company }) => company)).toEqual(['Sarvane', 'Sarvane']);
      expect(words()).toContain('2 rows changed in version 4');
    });
  });

  describe('saving', () => {
    const url = `/api/panel-versions/${version.id}/corrections`;

    async function openDialog(): Promise<Element> {
      named('Save as version 5…').click();
      await settled();
      const dialog = document.querySelector('kv-save-dialog');
      if (dialog === null) throw new Error('expected a dialog');
      return dialog;
    }

    async function write(dialog: Element, selector: string, text: string): Promise<void> {
      const field = dialog.querySelector<HTMLInputElement>(selector);
      if (field === null) throw new Error(`expected ${selector}`);
      field.value = text;
      field.dispatchEvent(new Event('input'));
      await settled();
    }

    async function submit(dialog: Element): Promise<void> {
      named('Save version 5', dialog).click();
      await settled();
    }

    it('asks for note, reasons and sources, and sends them', async () => {
      await open();
      await click(0, 'figure-1');
      await type('8');
      await click(3, 'figure-2');
      await press('Delete');
      const dialog = await openDialog();
      await submit(dialog);
      expect(dialog.textContent).toContain(
        'Still needed: a note, a reason for 2 cells and a source for 1 cell.',
      );
      await write(dialog, '[name=note]', 'Second look');
      await write(dialog, '[name=reason]', 'Was missing');
      await write(dialog, '[aria-label="Source of Capex, Sarvane 2010"]', 'Report 2010, p. 81');
      await write(dialog, '[aria-label="Reason for Book equity, Velmara 2011"]', 'No such figure');
      await submit(dialog);
      const { request } = http.expectOne({ method: 'POST', url });
      expect(request.body).toEqual({
        note: 'Second look',
        cells: [
          {
            ...{ company: 'Sarvane', year: 2010, column: 1, value: 8 },
            ...{ reason: 'Was missing', source: 'Report 2010, p. 81' },
          },
          {
            ...{ company: 'Velmara', year: 2011, column: 2, value: null },
            ...{ reason: 'No such figure', source: '' },
          },
        ],
        addedRows: [],
        removedRows: [],
      });
      http.expectNone(url);
      named('Go on changing', dialog).click();
      await until(() => document.querySelector('kv-save-dialog') === null);
    });

    it('loses nothing where the server refuses, and names who was faster', async () => {
      await open();
      await click(0, 'figure-1');
      await type('8');
      let dialog = await openDialog();
      await write(dialog, '[name=note]', 'Second look');
      await write(dialog, '[name=reason]', 'Was missing');
      await write(dialog, '[name=source]', 'Report 2010, p. 81');
      await submit(dialog);
      http.expectOne(url).flush(
        {
          ...{ type: problemType('bad-request'), title: 'Not as expected', status: 400 },
          errors: [{ pointer: '/cells/0/source', detail: 'expected a page' }],
        },
        { status: 400, statusText: 'Bad Request' },
      );
      await settled();
      expect(dialog.querySelector('tbody')?.textContent).toContain('expected a page');
      await submit(dialog);
      http.expectOne(url).flush(
        {
          ...{ type: problemType('stale-version'), title: 'A newer version exists', status: 409 },
          detail: 'Mira Oduya made version 5 of this panel meanwhile.',
          latestId: id(6),
        },
        { status: 409, statusText: 'Conflict' },
      );
      await settled();
      expect(dialog.textContent).toContain('Mira Oduya made version 5');
      expect(dialog.querySelector('a[target=_blank]')?.getAttribute('href')).toBe(
        `/panel/${id(6)}`,
      );
      named('Go on changing', dialog).click();
      await until(() => document.querySelector('kv-save-dialog') === null);
      expect(edited[0].values[1]).toBe(8);
      dialog = await openDialog();
      expect(dialog.querySelector<HTMLTextAreaElement>('[name=note]')?.value).toBe('Second look');
      await submit(dialog);
      http.expectOne(url).flush({ ...version, id: id(7), number: 5, origin: 'correction' });
      await until(() => savedId !== undefined);
      expect(savedId).toBe(id(7));
      expect(mayLeaveOnceSaved).toBeTrue();
      expect(page().querySelector('kv-save-bar')).toBeNull();
    });
  });
});
