import { TestBed } from '@angular/core/testing';
import { NumberFormat } from '../../ui/number-format';
import { readBlockText } from '../../ui/block-text';
import { DeskGridHarness } from './testing/desk-grid-harness';
import { small, wide } from './testing/desk-panels';

describe('the cells of a panel on the desk', () => {
  let desk: DeskGridHarness;

  beforeEach(() => {
    sessionStorage.clear();
  });
  afterEach(() => {
    sessionStorage.clear();
    desk.end();
  });

  describe('selecting', () => {
    it('draws a block with Shift and arrows, and goes back to one cell with Escape', async () => {
      desk = await DeskGridHarness.open();
      await desk.click(0, 'figure-0');
      expect(desk.chosen).toEqual([]);
      await desk.press('ArrowDown', { shiftKey: true });
      await desk.press('ArrowRight', { shiftKey: true });
      expect(desk.chosen).toEqual(['0:figure-0', '0:figure-1', '1:figure-0', '1:figure-1']);
      expect(document.activeElement).toBe(desk.cell(1, 'figure-1'));
      expect(desk.words).toContain('2 × 2 cells selected');
      await desk.press('Escape');
      expect(desk.chosen).toEqual([]);
      await desk.press('ArrowLeft');
      expect(document.activeElement).toBe(desk.cell(1, 'figure-0'));
      expect(desk.chosen).toEqual([]);
    });

    it('draws to the edge, takes every figure, and follows Shift and click', async () => {
      desk = await DeskGridHarness.open();
      await desk.click(1, 'figure-1');
      await desk.press('ArrowDown', { shiftKey: true, ctrlKey: true });
      expect(desk.chosen).toEqual(['1:figure-1', '2:figure-1', '3:figure-1']);
      await desk.press('a', { ctrlKey: true });
      expect(desk.chosen.length).toBe(12);
      await desk.click(3, 'company');
      await desk.click(2, 'figure-0', { shiftKey: true });
      expect(desk.chosen).toEqual([
        ...['2:company', '2:year', '2:figure-0'],
        ...['3:company', '3:year', '3:figure-0'],
      ]);
    });

    it('draws with the mouse while it is held', async () => {
      desk = await DeskGridHarness.open();
      await desk.drag('mouse', [0, 'figure-0'], [2, 'figure-1']);
      const over = new PointerEvent('pointermove', { bubbles: true, pointerId: 7, buttons: 0 });
      desk.cell(3, 'figure-2').dispatchEvent(over);
      await desk.settled();
      expect(desk.chosen.length).toBe(6);
    });

    it('draws with a finger only where a finger selects: by dragging, or from touch to touch', async () => {
      desk = await DeskGridHarness.open();
      await desk.drag('touch', [0, 'figure-0'], [2, 'figure-1']);
      expect(desk.chosen).toEqual([]);
      desk.named('Select by touch').click();
      await desk.settled();
      await desk.drag('touch', [1, 'figure-0'], [2, 'figure-1'], [3, 'figure-1']);
      expect(desk.chosen.length).toBe(6);
      await desk.drag('touch', [0, 'figure-0']);
      expect(desk.chosen).toEqual([]);
      await desk.drag('touch', [1, 'figure-1']);
      expect(desk.chosen).toEqual(['0:figure-0', '0:figure-1', '1:figure-0', '1:figure-1']);
      desk.named('Touch selects: stop').click();
      await desk.settled();
      await desk.drag('touch', [2, 'figure-0'], [3, 'figure-1']);
      expect(desk.chosen).toEqual([]);
    });

    it('goes on past the edge, to cells that were not drawn yet', async () => {
      desk = await DeskGridHarness.open(wide());
      const from = desk.cell(0, 'figure-0');
      const pointer = { bubbles: true, pointerId: 7, isPrimary: true, buttons: 1 };
      const init = { ...pointer, pointerType: 'mouse' };
      from.dispatchEvent(new PointerEvent('pointerdown', init));
      const grid = from.closest('kv-panel-grid') ?? desk.page;
      const { right, bottom } = grid.getBoundingClientRect();
      const past = { ...init, clientX: right + 5, clientY: bottom + 5 };
      desk.page.dispatchEvent(new PointerEvent('pointermove', past));
      await desk.until(() => /[2-9]\d × \d\d cells selected/.test(desk.words));
      document.dispatchEvent(new PointerEvent('pointerup', init));
      await desk.settled();
      const size = /(\d+) × (\d+) cells selected/.exec(desk.words);
      expect(Number(size?.[1])).toBeGreaterThan(19);
      expect(Number(size?.[2])).toBeGreaterThan(9);
      await new Promise((resolve) => setTimeout(resolve, 150));
      expect(desk.words).toContain(size?.[0] ?? 'a block');
    });

    it('tells assistive technology which cells are selected, and how many', async () => {
      desk = await DeskGridHarness.open(wide());
      await desk.click(0, 'figure-0');
      expect(desk.told).toEqual([]);
      expect(desk.page.querySelector('[role=grid]')?.getAttribute('aria-multiselectable')).toBe(
        'true',
      );
      await desk.press('ArrowDown', { shiftKey: true });
      await desk.press('ArrowRight', { shiftKey: true });
      expect(desk.told).toEqual(['0:figure-0', '0:figure-1', '1:figure-0', '1:figure-1']);
      const said = desk.page.querySelector('kv-block-said');
      expect(said?.getAttribute('role')).toBe('status');
      await desk.until(() => said?.textContent !== '');
      expect(said?.textContent).toBe('2 × 2 cells selected');
      await desk.press('ArrowDown', { shiftKey: true, ctrlKey: true });
      expect(desk.told).toContain('59:figure-1');
      await desk.press('Escape');
      expect(desk.told).toEqual([]);
      await desk.until(() => said?.textContent === '');
      expect(said?.textContent).toBe('');
    });
  });

  describe('the clipboard', () => {
    it('gets every digit in the unit that is shown, and says the unit', async () => {
      desk = await DeskGridHarness.open();
      TestBed.inject(NumberFormat).unit.set('thousands');
      await desk.settled();
      await desk.click(0, 'company');
      await desk.press('ArrowRight', { shiftKey: true, ctrlKey: true });
      expect(desk.copied()).toBe('Sarvane\t2010\t100125\t\t50000\t2');
      await desk.settled();
      expect(desk.words).toContain('1 × 6 cells copied at full precision, money in EUR k');
    });

    it('brings a block of 50 × 20 there and back, and into other cells, without losing a bit', async () => {
      const panel = wide();
      desk = await DeskGridHarness.open(panel);
      await desk.click(0, 'figure-0');
      for (let times = 0; times < 49; times++)
        document.activeElement?.dispatchEvent(
          new KeyboardEvent('keydown', { key: 'ArrowDown', shiftKey: true, bubbles: true }),
        );
      for (let times = 0; times < 19; times++)
        document.activeElement?.dispatchEvent(
          new KeyboardEvent('keydown', { key: 'ArrowRight', shiftKey: true, bubbles: true }),
        );
      await desk.settled();
      const text = desk.copied();
      const block = readBlockText(text);
      expect([block.length, block[0].length]).toEqual([50, 20]);
      const value = (row: number, column: number) => panel.rows.values[column][row];
      block.forEach((cells, row) => {
        cells.forEach((shown, column) => {
          expect(shown === '' ? null : Number(shown)).toBe(value(row, column));
        });
      });
      // Onto themselves: nothing differs.
      await desk.goTo(0, 0);
      await desk.paste(text);
      expect(desk.words).toContain('Nothing differs from before');
      // One row down and one column to the right.
      await desk.goTo(1, 1);
      await desk.paste(text);
      for (let row = 0; row < 50; row++)
        for (let column = 0; column < 20; column++)
          expect(desk.edited[row + 1].values[column + 1]).toBe(value(row, column));
      expect(desk.edited[0].values).toEqual(panel.rows.values.map((column) => column[0]));
      desk.named(/^Undo: /).click();
      await desk.settled();
      expect(desk.edited.map(({ values }) => values[1])).toEqual([...panel.rows.values[1]]);
    });

    it('fills a block with one figure, and empties what is cut', async () => {
      desk = await DeskGridHarness.open();
      await desk.click(0, 'figure-1');
      await desk.press('ArrowDown', { shiftKey: true });
      await desk.paste('(1.234,5)\r\n');
      expect(desk.edited.map(({ values }) => values[1])).toEqual([-1234.5, -1234.5, 90, 91]);
      expect(desk.copied('cut')).toBe('-1234.5\n-1234.5');
      await desk.settled();
      expect(desk.edited.map(({ values }) => values[1])).toEqual([null, null, 90, 91]);
    });

    it('is refused as a whole where it does not fit or holds no number', async () => {
      desk = await DeskGridHarness.open();
      await desk.click(2, 'figure-2');
      await desk.paste('1\t2\n3\t4\n5\t6');
      const notice = desk.page.querySelector('[role=alert]')?.textContent ?? '';
      expect(notice).toContain('1 row would be below the last row');
      expect(notice).toContain('1 column would be to the right of Book equity');
      await desk.click(2, 'figure-1');
      await desk.paste('1\n2 or so');
      expect(desk.page.querySelector('[role=alert]')?.textContent).toContain(
        'Velmara 2011, Capex: found “2 or so”',
      );
      expect(desk.edited.map(({ values }) => values[1])).toEqual([null, 11, 90, 91]);
      expect(desk.page.querySelector('kv-save-bar')).toBeNull();
    });

    it('takes nothing in from somebody who may only read', async () => {
      desk = await DeskGridHarness.open(small, { mayChange: false }, ['cfo']);
      await desk.click(0, 'figure-0');
      await desk.paste('5');
      await desk.press('Delete');
      await desk.press('F2');
      expect(desk.copied()).toBe('100.125');
      expect(desk.edited.map(({ values }) => values[0])).toEqual([100.125, 110, 900, 910]);
      expect(desk.words).not.toContain('Add row');
    });
  });
});
