import { TestBed } from '@angular/core/testing';
import { DeskGridHarness } from './testing/desk-grid-harness';
import { UnsavedEdits } from './unsaved-edits';

describe('the figures of a panel on the desk', () => {
  let desk: DeskGridHarness;

  beforeEach(() => {
    sessionStorage.clear();
  });
  afterEach(() => {
    sessionStorage.clear();
    desk.end();
  });

  describe('changing cells', () => {
    it('begins with what is typed or with every digit, and reads figures as people write them', async () => {
      desk = await DeskGridHarness.open();
      await desk.click(0, 'figure-0');
      await desk.press('F2');
      const field = document.activeElement as HTMLInputElement;
      expect(field.getAttribute('aria-label')).toBe('Market value of Sarvane in 2010');
      expect(field.value).toBe('100.125');
      field.value = '1.234,5';
      await desk.press('Enter');
      expect(desk.edited[0].values[0]).toBe(1234.5);
      expect(document.activeElement).toBe(desk.cell(1, 'figure-0'));
      expect(desk.cell(0, 'figure-0').classList).toContain('kv-edited-cell');
      await desk.press('7');
      expect((document.activeElement as HTMLInputElement).value).toBe('7');
      await desk.press('Escape');
      expect(desk.edited[1].values[0]).toBe(110);
      expect(desk.words).toContain('1 cell changed in version 4');
    });

    it('takes no text for a figure, and says what was typed', async () => {
      desk = await DeskGridHarness.open();
      await desk.click(1, 'figure-1');
      await desk.type('twelve');
      expect(desk.page.querySelector('[role=alert]')?.textContent).toContain(
        'Sarvane 2011, Capex: found “twelve”',
      );
      expect(desk.edited[1].values[1]).toBe(11);
    });

    it('empties a block, and undoes and redoes step by step', async () => {
      desk = await DeskGridHarness.open();
      await desk.click(2, 'figure-0');
      await desk.press('ArrowRight', { shiftKey: true });
      await desk.press('Delete');
      expect(desk.edited[2].values).toEqual([null, null, 450]);
      await desk.press('z', { ctrlKey: true });
      expect(desk.edited[2].values).toEqual([900, 90, 450]);
      expect(desk.page.querySelector('kv-save-bar')).toBeNull();
      await desk.press('y', { ctrlKey: true });
      expect(desk.edited[2].values).toEqual([null, null, 450]);
      expect(desk.named('Undo: 2 cells emptied')).toBeDefined();
      desk.named('Discard').click();
      await desk.settled();
      expect(desk.edited[2].values).toEqual([900, 90, 450]);
      desk.named('Undo: 2 cells discarded').click();
      await desk.settled();
      expect(desk.edited[2].values).toEqual([null, null, 450]);
    });

    it('tells a cell in full, and what it held before', async () => {
      desk = await DeskGridHarness.open();
      await desk.click(0, 'figure-0');
      expect(desk.page.querySelector('kv-cell-line')?.textContent).toContain('100.125');
      expect(desk.words).toContain('Sarvane 2010, line 2 of the file, column “mv”');
      await desk.type('90');
      await desk.click(0, 'figure-0');
      expect(desk.page.querySelector('kv-cell-line')?.textContent).toContain('saved: 100.125');
    });

    it('comes back after a reload, and warns before it is left', async () => {
      desk = await DeskGridHarness.open();
      await desk.click(0, 'figure-1');
      await desk.type('8');
      const unsaved = TestBed.inject(UnsavedEdits);
      const leaving = new Event('beforeunload', { cancelable: true });
      unsaved.holdBack(leaving);
      expect(leaving.defaultPrevented).toBeTrue();
      desk.fixture.destroy();
      expect(await unsaved.mayLeave()).toBeTrue();
      desk = await DeskGridHarness.open();
      expect(desk.words).toContain('Changed before and not saved yet: 1 cell.');
      expect(desk.edited[0].values[1]).toBe(8);
      desk.named('Close').focus();
      desk.named('Close').click();
      await desk.settled();
      expect(desk.words).not.toContain('Changed before');
      expect(document.activeElement?.closest('kv-panel-grid')).not.toBeNull();
    });
  });

  describe('rows', () => {
    it('are added by company and year, and taken out', async () => {
      desk = await DeskGridHarness.open();
      desk.named('Add row…').click();
      await desk.settled();
      const dialog = document.querySelector('kv-add-row-dialog');
      if (dialog === null) throw new Error('expected a dialog');
      const [company, year] = dialog.querySelectorAll('input');
      const give = (field: HTMLInputElement, text: string): void => {
        field.value = text;
        field.dispatchEvent(new Event('input'));
      };
      give(company, 'Sarvane');
      give(year, '2011');
      desk.named('Add row', dialog).click();
      await desk.settled();
      expect(dialog.textContent).toContain('Sarvane has a row for 2011 already');
      give(year, '2012');
      desk.named('Add row', dialog).click();
      await desk.until(() => desk.edited.length === 5);
      expect(desk.edited.map((row) => `${row.company} ${row.year}`)[2]).toBe('Sarvane 2012');
      expect(document.activeElement).toBe(desk.cell(2, 'figure-0'));
      expect(desk.cell(2, 'fileRow').textContent).toContain('added');
      // Without figures it goes without a question.
      desk.named('Remove row').click();
      await desk.settled();
      expect(desk.edited.length).toBe(4);
    });

    it('of a name that the panel spells otherwise are added only after a question', async () => {
      desk = await DeskGridHarness.open();
      desk.named('Add row…').click();
      await desk.settled();
      const dialog = desk.dialog('kv-add-row-dialog');
      await desk.write('[name=company]', ' sarvane', dialog);
      await desk.write('[name=year]', '2012', dialog);
      desk.named('Add row', dialog).click();
      await desk.settled();
      expect(dialog.textContent).toContain('The panel has no company “sarvane”. Is it “Sarvane”?');
      expect(desk.edited.length).toBe(4);
      // Another name like one of the panel's is asked about anew.
      await desk.write('[name=company]', 'Velmarra', dialog);
      desk.named('Add row', dialog).click();
      await desk.settled();
      expect(dialog.textContent).toContain('Is it “Velmara”?');
      desk.named('Use “Velmara”', dialog).click();
      await desk.until(() => desk.edited.length === 5);
      expect(desk.edited.map((row) => `${row.company} ${row.year}`)[4]).toBe('Velmara 2012');
    });

    it('may be of a company that is like another one and not the same', async () => {
      desk = await DeskGridHarness.open();
      desk.named('Add row…').click();
      await desk.until(() => document.activeElement?.getAttribute('name') === 'company');
      const dialog = desk.dialog('kv-add-row-dialog');
      await desk.write('[name=company]', 'SARVANE', dialog);
      await desk.write('[name=year]', '2010', dialog);
      desk.named('Add row', dialog).click();
      await desk.settled();
      desk.named('Use “Sarvane”', dialog).click();
      await desk.settled();
      expect(dialog.textContent).toContain('Sarvane has a row for 2010 already');
      expect(document.activeElement?.getAttribute('name')).toBe('year');
      await desk.write('[name=company]', 'SARVANE', dialog);
      desk.named('Add as a company of its own', dialog).click();
      await desk.until(() => desk.edited.length === 5);
      expect(desk.edited[0].company).toBe('SARVANE');
    });

    it('with figures are taken out only after a question', async () => {
      desk = await DeskGridHarness.open();
      await desk.click(3, 'year');
      await desk.press('ArrowUp', { shiftKey: true });
      desk.named('Remove 2 rows').click();
      await desk.until(() => document.querySelector('kv-confirm-dialog') !== null);
      const dialog = document.querySelector('kv-confirm-dialog');
      expect(dialog?.textContent).toContain('Remove 2 rows?');
      desk.named('Remove rows', document).click();
      await desk.until(() => desk.edited.length === 2);
      expect(desk.edited.map(({ company }) => company)).toEqual(['Sarvane', 'Sarvane']);
      expect(desk.words).toContain('2 rows changed in version 4');
    });
  });
});
