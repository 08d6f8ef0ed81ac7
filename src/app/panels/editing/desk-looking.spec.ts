import { cellKey } from './panel-edits';
import { DeskGridHarness } from './testing/desk-grid-harness';
import { id, small, version } from './testing/desk-panels';

describe('the rows of a panel on the desk', () => {
  let desk: DeskGridHarness;

  beforeEach(() => {
    sessionStorage.clear();
  });
  afterEach(() => {
    sessionStorage.clear();
    desk.end();
  });

  describe('looking', () => {
    it('finds companies, years and values, and keeps the focus in the field', async () => {
      desk = await DeskGridHarness.open();
      await desk.click(3, 'figure-0');
      await desk.press('f', { ctrlKey: true });
      const field = desk.page.querySelector<HTMLInputElement>('input[type=search]');
      expect(document.activeElement).toBe(field);
      if (field === null) return;
      field.value = '91';
      field.dispatchEvent(new Event('input'));
      await desk.settled();
      expect(desk.words).toContain('2 found');
      await desk.press('Enter');
      expect(desk.words).toContain('1 of 2');
      expect(desk.words).toContain('Velmara 2011');
      expect(document.activeElement).toBe(field);
      await desk.press('Escape');
      expect(document.activeElement).toBe(desk.cell(3, 'figure-0'));
    });

    it('shows the rows with gaps, changes or a flag, and the flags of a cell in words', async () => {
      const place = { company: 'Velmara', year: 2011, column: 0 };
      const flag = { ...place, value: 910, facts: { code: 'sign' } };
      desk = await DeskGridHarness.open(small, {
        flags: new Map([[cellKey(place), [flag]]]),
        flagWords: () => 'Looked at twice',
      });
      const shown = () =>
        [...desk.page.querySelectorAll('.ag-cell[col-id="fileRow"]')].map(
          (each) => each.textContent,
        );
      const choose = async (value: string): Promise<void> => {
        const list = desk.page.querySelector('select');
        if (list === null) throw new Error('expected a choice of rows');
        list.value = value;
        list.dispatchEvent(new Event('change'));
        await desk.settled();
      };
      await choose('gaps');
      expect(shown()).toEqual(['2']);
      await choose('sign');
      expect(shown()).toEqual(['5']);
      expect(desk.cell(0, 'figure-0').classList).toContain('kv-flagged-cell');
      await desk.click(0, 'figure-0');
      expect(desk.words).toContain('Looked at twice');
      await choose('edited');
      expect(desk.words).toContain('No row fits what is chosen above');
    });

    it('shows a cell through the versions of its panel', async () => {
      desk = await DeskGridHarness.open();
      await desk.click(1, 'figure-1');
      desk.named('History of this cell').click();
      await desk.settled();
      desk.http
        .expectOne(
          `/api/panel-versions/${version.id}/cell-history?company=Sarvane&year=2011&column=1`,
        )
        .flush({
          entries: [
            {
              ...{ panelVersionId: id(5), number: 2, value: 12, hasRow: true },
              ...{ header: 'inv', currency: 'EUR', unit: 'millions' },
              ...{ at: version.createdAt, by: 'Mira Oduya', note: 'From the filings' },
              ...{ reason: null, source: null },
            },
            {
              ...{ panelVersionId: version.id, number: 4, value: 11, hasRow: true },
              ...{ header: 'inv', currency: 'EUR', unit: 'millions' },
              ...{ at: version.createdAt, by: 'Ilvo Brenn', note: 'Second look' },
              ...{ reason: 'Misread', source: 'Report 2011, p. 9' },
            },
          ],
        });
      await desk.settled();
      const table = document.querySelector('kv-cell-history-dialog table')?.textContent ?? '';
      for (const said of ['v2', '12', 'Mira Oduya', 'v4', 'Misread', 'Report 2011, p. 9'])
        expect(table).toContain(said);
      document.querySelector<HTMLElement>('kv-cell-history-dialog button')?.click();
      await desk.until(() => document.querySelector('kv-cell-history-dialog') === null);
      expect(document.activeElement).toBe(desk.cell(1, 'figure-1'));
    });

    it('keeps the cell in hand, whatever rows are left out around it', async () => {
      desk = await DeskGridHarness.open();
      await desk.click(2, 'figure-1');
      const shown = desk.page.querySelector('select');
      if (shown === null) throw new Error('expected a choice of rows');
      await desk.click(3, 'figure-1');
      await desk.type('7');
      await desk.click(3, 'figure-1');
      shown.value = 'edited';
      shown.focus();
      shown.dispatchEvent(new Event('change'));
      await desk.until(() => desk.page.querySelectorAll('.ag-cell[col-id=year]').length === 1);
      expect(desk.page.querySelector('kv-cell-line')?.textContent).toContain('Velmara 2011');
      expect(document.activeElement).toBe(shown);
    });
  });
});
