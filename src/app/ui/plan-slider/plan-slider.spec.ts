import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { NumberFormat } from '../number-format';
import { PlanSlider } from './plan-slider';

describe('PlanSlider', () => {
  let fixture: ComponentFixture<PlanSlider>;
  let emitted: number[];

  beforeEach(async () => {
    const numbers = TestBed.inject(NumberFormat);
    numbers.currency.set('EUR');
    numbers.panelUnit.set('millions');
    fixture = TestBed.createComponent(PlanSlider);
    set({ label: 'Capex FY2026', value: 1240, base: 1180, min: 0, max: 2400, step: 10 });
    emitted = [];
    fixture.componentInstance.valueChanged.subscribe((value) => emitted.push(value));
    await fixture.whenStable();
  });

  function set(inputs: Record<string, unknown>): void {
    for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
  }

  function find<T extends HTMLElement>(selector: string): T {
    const found = (fixture.nativeElement as HTMLElement).querySelector<T>(selector);
    if (found === null) throw new Error(`expected ${selector} in the slider; found none`);
    return found;
  }

  async function type(text: string): Promise<void> {
    const box = find<HTMLInputElement>('input[type=text]');
    box.value = text;
    box.dispatchEvent(new Event('change'));
    await fixture.whenStable();
  }

  function press(key: string): void {
    find('input[type=range]').dispatchEvent(new KeyboardEvent('keydown', { key }));
  }

  it('speaks its value with the unit', () => {
    expect(find('input[type=range]').getAttribute('aria-valuetext')).toBe('1,240 EUR m');
  });

  it('moves ten steps by page, and stops at the ends', async () => {
    press('PageUp');
    press('PageDown');
    set({ value: 2390 });
    await fixture.whenStable();
    press('PageUp');
    expect(emitted).toEqual([1340, 1140, 2400]);
  });

  it('moves one step by the buttons beside the box', () => {
    find('button[aria-label$="one step more"]').click();
    find('button[aria-label$="one step less"]').click();
    expect(emitted).toEqual([1250, 1230]);
  });

  it('takes a typed number exactly, also beyond the slider’s end', async () => {
    await type('3,123.456');
    expect(emitted).toEqual([3123.456]);
  });

  it('says what it wanted when the text is no number, and changes nothing', async () => {
    await type('lots');
    expect(emitted).toEqual([]);
    expect(find('[role=alert]').textContent).toContain('expected a number, as 1,240; found lots');
  });

  it('takes no amount that has no log where the fit reads logs', async () => {
    set({ isAboveZero: true, min: 10 });
    await type('0');
    expect(find('[role=alert]').textContent).toContain(
      'expected an amount above zero, for the fit reads logs; found 0',
    );
    await type('-5');
    expect(emitted).toEqual([]);
    await type('0.5');
    expect(emitted).toEqual([0.5]);
  });

  it('reads and shows in the person’s unit and emits in the panel’s', async () => {
    TestBed.inject(NumberFormat).unit.set('billions');
    await fixture.whenStable();
    expect(find<HTMLInputElement>('input[type=text]').value).toBe('1.24');
    await type('1.5');
    expect(emitted).toEqual([1500]);
  });

  it('leaves a number that is no money alone when the unit of money changes', async () => {
    set({ label: 'Employees FY2026', value: 12000, base: 11000, kind: 'plain' });
    TestBed.inject(NumberFormat).unit.set('billions');
    await fixture.whenStable();
    expect(find<HTMLInputElement>('input[type=text]').value).toBe('12,000');
    expect(find('input[type=range]').getAttribute('aria-valuetext')).toBe('12,000');
    expect(find('.note').textContent).toContain('+1,000 against base');
    await type('13,000');
    expect(emitted).toEqual([13000]);
  });

  it('shows the difference to base, warns outside what has been seen, and goes back', async () => {
    set({ value: 1680, familiar: { low: 300, high: 1590 } });
    await fixture.whenStable();
    const note = find('.note').textContent.replace(/\s+/g, ' ');
    expect(note).toContain('+500 against base');
    expect(note).toContain('outside what has been seen');
    find('button[aria-label$="reset to base"]').click();
    expect(emitted).toEqual([1180]);
  });
});
