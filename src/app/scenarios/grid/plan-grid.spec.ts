import { type ComponentFixture, TestBed } from '@angular/core/testing';
import type { PlannedAmount } from '../../ui/plan/change-asked';
import { NumberFormat } from '../../ui/number-format';
import { type PastedText, PlanGrid } from './plan-grid';

describe('PlanGrid', () => {
  let fixture: ComponentFixture<PlanGrid>;
  let page: HTMLElement;
  let amounts: PlannedAmount[];
  let pasted: PastedText[];

  beforeEach(async () => {
    const numbers = TestBed.inject(NumberFormat);
    numbers.currency.set('EUR');
    numbers.panelUnit.set('millions');
    fixture = TestBed.createComponent(PlanGrid);
    set({
      labels: ['capex', 'book equity'],
      plan: [
        { year: 2026, values: [110.125, 1000] },
        { year: 2027, values: [120, 1100] },
      ],
      familiar: [],
    });
    [amounts, pasted] = [[], []];
    fixture.componentInstance.amountChanged.subscribe((amount) => amounts.push(amount));
    fixture.componentInstance.pasted.subscribe((text) => pasted.push(text));
    page = fixture.nativeElement as HTMLElement;
    document.body.append(page);
    await fixture.whenStable();
  });

  function set(inputs: Record<string, unknown>): void {
    for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
  }

  const cell = (row: number, column: number) =>
    page.querySelector<HTMLElement>(`[data-place="${row} ${column}"]`)!;
  const box = () => page.querySelector<HTMLInputElement>('td input');

  async function press(key: string, more: KeyboardEventInit = {}): Promise<void> {
    const target = document.activeElement ?? cell(0, 0);
    target.dispatchEvent(
      new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true, ...more }),
    );
    await fixture.whenStable();
  }

  function clipboard(type: 'copy' | 'paste', text = ''): DataTransfer {
    const clipboardData = new DataTransfer();
    if (type === 'paste') clipboardData.setData('text/plain', text);
    const event = new ClipboardEvent(type, { clipboardData, bubbles: true, cancelable: true });
    cell(0, 0).dispatchEvent(event);
    return clipboardData;
  }

  it('has one cell in the order of tabs, which arrow keys move', async () => {
    cell(0, 0).focus();
    await press('ArrowDown');
    await press('ArrowRight');
    expect(document.activeElement).toBe(cell(1, 1));
    expect([...page.querySelectorAll('td[tabindex="0"]')]).toEqual([cell(1, 1)]);
  });

  it('opens a cell with every digit, takes what is typed and goes on down', async () => {
    cell(0, 0).focus();
    await press('Enter');
    expect(box()?.value).toBe('110.125');
    expect(document.activeElement).toBe(box());
    box()!.value = '(1,234.5)';
    await press('Enter');
    expect(amounts).toEqual([{ year: 2026, regressor: 0, value: -1234.5 }]);
    expect(document.activeElement).toBe(cell(1, 0));
  });

  it('starts anew when a digit is typed, and keeps the amount on Escape', async () => {
    cell(0, 1).focus();
    cell(0, 1).click();
    await press('7');
    expect(box()?.value).toBe('7');
    await press('Escape');
    expect(box()).toBeNull();
    expect(amounts).toEqual([]);
    expect(document.activeElement).toBe(cell(0, 1));
  });

  it('says what it wanted when the text is no number, and stays open', async () => {
    cell(0, 0).focus();
    await press('F2');
    box()!.value = 'lots';
    await press('Enter');
    expect(page.querySelector('[role=alert]')?.textContent).toContain(
      'Capex FY2026: expected a number; found lots',
    );
    expect(box()).not.toBeNull();
    expect(amounts).toEqual([]);
  });

  it('reads and shows in the person’s unit, named once, and gives the panel’s', async () => {
    TestBed.inject(NumberFormat).unit.set('billions');
    await fixture.whenStable();
    expect(page.querySelector('th')?.textContent).toContain('EUR bn');
    cell(0, 0).focus();
    await press('Enter');
    expect(box()?.value).toBe('0.110125');
    box()!.value = '0.2';
    await press('Enter');
    expect(amounts[0].value).toBeCloseTo(200, 12);
    TestBed.inject(NumberFormat).unit.set('millions');
  });

  it('copies the block that is selected with every digit', async () => {
    cell(0, 0).focus();
    await press('ArrowRight', { shiftKey: true });
    await press('ArrowDown', { shiftKey: true });
    expect(clipboard('copy').getData('text/plain')).toBe('110.125\t1000\n120\t1100');
    expect(fixture.componentInstance.text(true)).toBe('110.125\t1000\n120\t1100');
  });

  it('gives a pasted block and the cell where it begins', async () => {
    cell(0, 0).focus();
    await press('ArrowDown');
    clipboard('paste', '1\t2\n3\t4');
    expect(pasted).toEqual([{ text: '1\t2\n3\t4', at: { year: 2027, regressor: 0 } }]);
  });

  it('marks pasted cells that were no amounts, with the reason', async () => {
    set({ bad: [{ year: 2027, regressor: 1, text: 'n/a', reason: 'expected a number' }] });
    await fixture.whenStable();
    expect(cell(1, 1).getAttribute('aria-invalid')).toBe('true');
    expect(cell(1, 1).title).toBe('expected a number; found n/a');
    expect(cell(0, 1).getAttribute('aria-invalid')).toBeNull();
  });

  it('asks for the way back and forth', async () => {
    const asked: string[] = [];
    fixture.componentInstance.undoWanted.subscribe(() => asked.push('undo'));
    fixture.componentInstance.redoWanted.subscribe(() => asked.push('redo'));
    cell(0, 0).focus();
    await press('z', { ctrlKey: true });
    await press('y', { ctrlKey: true });
    expect(asked).toEqual(['undo', 'redo']);
  });
});
