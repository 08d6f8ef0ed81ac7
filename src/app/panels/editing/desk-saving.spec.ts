import { type PanelVersionReply, problemType } from '@contract';
import { DeskGridHarness } from './testing/desk-grid-harness';
import { id, small, version } from './testing/desk-panels';

describe('the changes of a panel on the desk', () => {
  let desk: DeskGridHarness;

  beforeEach(() => {
    sessionStorage.clear();
  });
  afterEach(() => {
    sessionStorage.clear();
    desk.end();
  });

  describe('saving', () => {
    const url = `/api/panel-versions/${version.id}/corrections`;

    async function openDialog(): Promise<Element> {
      desk.named('Save as version 5…').click();
      await desk.settled();
      return desk.dialog('kv-save-dialog');
    }

    async function fill(dialog: Element): Promise<void> {
      await desk.write('[name=note]', 'Second look', dialog);
      await desk.write('[name=reason]', 'Was missing', dialog);
      await desk.write('[name=source]', 'Report 2010, p. 81', dialog);
    }

    async function submit(dialog: Element): Promise<void> {
      desk.named('Save version 5', dialog).click();
      await desk.settled();
    }

    it('asks for note, reasons and sources, and sends them', async () => {
      desk = await DeskGridHarness.open();
      await desk.click(0, 'figure-1');
      await desk.type('8');
      await desk.click(3, 'figure-2');
      await desk.press('Delete');
      const dialog = await openDialog();
      await submit(dialog);
      expect(dialog.textContent).toContain(
        'Still needed: a note, a reason for 2 cells and a source for 1 cell.',
      );
      await desk.write('[name=note]', 'Second look', dialog);
      await desk.write('[name=reason]', 'Was missing', dialog);
      await desk.write(
        '[aria-label="Source of Capex, Sarvane 2010"]',
        'Report 2010, p. 81',
        dialog,
      );
      await desk.write(
        '[aria-label="Reason for Book equity, Velmara 2011"]',
        'No such figure',
        dialog,
      );
      await submit(dialog);
      const { request } = desk.http.expectOne({ method: 'POST', url });
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
      desk.http.expectNone(url);
      desk.named('Go on changing', dialog).click();
      await desk.until(() => document.querySelector('kv-save-dialog') === null);
    });

    it('loses nothing where the server refuses, and names who was faster', async () => {
      desk = await DeskGridHarness.open();
      await desk.click(0, 'figure-1');
      await desk.type('8');
      const dialog = await openDialog();
      await desk.write('[name=note]', 'Second look', dialog);
      await desk.write('[name=reason]', 'Was missing', dialog);
      await desk.write('[name=source]', 'Report 2010, p. 81', dialog);
      await submit(dialog);
      desk.http.expectOne(url).flush(
        {
          ...{ type: problemType('bad-request'), title: 'Not as expected', status: 400 },
          errors: [{ pointer: '/cells/0/source', detail: 'expected a page' }],
        },
        { status: 400, statusText: 'Bad Request' },
      );
      await desk.settled();
      expect(dialog.querySelector('tbody')?.textContent).toContain('expected a page');
      await submit(dialog);
      desk.http.expectOne(url).flush(
        {
          ...{ type: problemType('stale-version'), title: 'A newer version exists', status: 409 },
          detail: 'Mira Oduya made version 5 of this panel meanwhile.',
          latestId: id(6),
        },
        { status: 409, statusText: 'Conflict' },
      );
      await desk.settled();
      expect(dialog.textContent).toContain('Mira Oduya made version 5');
      expect(desk.named('Save version 5', dialog).disabled).toBeTrue();
      expect(desk.named('Carry my 1 cell onto the newer version', dialog)).toBeDefined();
      desk.named('Go on changing', dialog).click();
      await desk.until(() => document.querySelector('kv-save-dialog') === null);
      expect(desk.edited[0].values[1]).toBe(8);
      expect(desk.words).toContain('A newer version was saved meanwhile');
      expect(() => desk.named('Save as version 5…')).toThrow();
    });

    it('leads on to the version that was saved, with the cell in hand', async () => {
      desk = await DeskGridHarness.open();
      await desk.click(2, 'figure-1');
      await desk.type('8');
      const dialog = await openDialog();
      await fill(dialog);
      await submit(dialog);
      const made = { ...version, id: id(7), number: 5, origin: 'correction' as const };
      desk.http.expectOne(url).flush(made);
      await desk.until(() => desk.savedId !== undefined);
      expect(desk.savedId).toBe(id(7));
      expect(desk.mayLeaveOnceSaved).toBeTrue();
      expect(desk.page.querySelector('kv-save-bar')).toBeNull();
      expect(desk.edited[2].values[1]).toBe(8);
      expect(sessionStorage.length).toBe(0);
      const held = desk.cell(3, 'figure-1');
      expect(document.activeElement).toBe(held);
      const values = small.rows.values.map((column, at) =>
        at === 1 ? column.map((value, row) => (row === 2 ? 8 : value)) : [...column],
      );
      await desk.give({
        panel: { ...small, version: made, rows: { ...small.rows, values } },
        versions: [made, version],
      });
      expect(document.activeElement).toBe(held);
      expect(desk.page.querySelector('.said')?.textContent).toBe('Version 5 saved');
      expect(desk.cell(2, 'figure-1').textContent).toContain('8');
      await desk.type('5');
      expect(desk.words).toContain('1 cell changed in version 5');
    });

    it('brings back note, reasons and sources with the cells after a reload', async () => {
      desk = await DeskGridHarness.open();
      await desk.click(0, 'figure-1');
      await desk.type('8');
      let dialog = await openDialog();
      await fill(dialog);
      await desk.write('[aria-label="Source of Capex, Sarvane 2010"]', 'p. 9', dialog);
      desk.end();
      document.querySelectorAll('.cdk-overlay-container').forEach((each) => {
        each.remove();
      });
      desk = await DeskGridHarness.open();
      dialog = await openDialog();
      const texts = [...dialog.querySelectorAll<HTMLInputElement>('textarea, input')].map(
        ({ value }) => value,
      );
      expect(texts).toEqual(['Second look', 'Was missing', 'Report 2010, p. 81', '', 'p. 9']);
      desk.named('Go on changing', dialog).click();
      await desk.until(() => document.querySelector('kv-save-dialog') === null);
    });
  });

  describe('that were overtaken', () => {
    const newer = { ...version, id: id(6), number: 5, createdBy: 'Mira Oduya', note: 'Third look' };
    const [market, , equity] = small.rows.values;
    const newerPanel: PanelVersionReply = {
      ...small,
      version: newer,
      rows: { ...small.rows, values: [market, [9, 11, 90, 91], equity] },
    };

    it('are carried onto the newer version, the ones in conflict as the person chooses', async () => {
      desk = await DeskGridHarness.open();
      await desk.click(0, 'figure-1');
      await desk.type('8');
      await desk.click(3, 'figure-0');
      await desk.type('7');
      await desk.give({ versions: [newer, version] });
      desk.named('Carry onto the newer version…').click();
      await desk.settled();
      desk.http.expectOne(`/api/panel-versions/${newer.id}`).flush(newerPanel);
      await desk.settled();
      const dialog = desk.dialog('kv-carry-dialog');
      const said = (dialog.textContent ?? '').replace(/\s+/g, ' ');
      for (const words of [
        'Carry 2 cells onto the newer version',
        'Version 5 by Mira Oduya: “Third look”',
        'Carried: 1 cell, unchanged in version 5.',
        'In conflict: 1 change; choose below.',
      ])
        expect(said).toContain(words);
      const row = [...dialog.querySelectorAll('tbody td')].map((each) => each.textContent.trim());
      expect(row).toEqual(['no value', '9', '8']);
      desk.named('Carry over', dialog).click();
      await desk.settled();
      expect(dialog.textContent).toContain('Still needed: a choice for 1 conflict.');
      dialog.querySelector<HTMLElement>('[aria-label="Capex, Sarvane 2010: mine, 8"]')?.click();
      await desk.settled();
      desk.named('Carry over', dialog).click();
      await desk.until(() => desk.savedId !== undefined);
      expect(desk.savedId).toBe(newer.id);
      expect(desk.mayLeaveOnceSaved).toBeTrue();
      await desk.give({ panel: newerPanel, versions: [newer, version] });
      expect(desk.words).toContain('2 cells changed in version 5');
      expect(desk.edited.map(({ values }) => values[1])).toEqual([8, 11, 90, 91]);
      expect(desk.edited[3].values[0]).toBe(7);
      expect(desk.named('Save as version 6…')).toBeDefined();
    });

    it('stay where they are where the newer version is in another unit', async () => {
      desk = await DeskGridHarness.open();
      await desk.click(0, 'figure-1');
      await desk.type('8');
      await desk.give({ versions: [newer, version] });
      desk.named('Carry onto the newer version…').click();
      await desk.settled();
      const inUnits = { ...newerPanel, version: { ...newer, unit: 'units' as const } };
      desk.http.expectOne(`/api/panel-versions/${newer.id}`).flush(inUnits);
      await desk.settled();
      const dialog = desk.dialog('kv-carry-dialog');
      expect(dialog.textContent).toContain('figures cannot be carried from one to the other');
      expect(desk.named('Carry over', dialog).disabled).toBeTrue();
      desk.named('Not now', dialog).click();
      await desk.until(() => document.querySelector('kv-carry-dialog') === null);
      expect(desk.edited[0].values[1]).toBe(8);
    });
  });
});
