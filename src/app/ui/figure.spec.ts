import { TestBed } from '@angular/core/testing';
import { Figure } from './figure';
import { NumberFormat } from './number-format';

describe('Figure', () => {
  async function show(inputs: Record<string, unknown>) {
    TestBed.inject(NumberFormat).panelUnit.set('millions');
    const fixture = TestBed.createComponent(Figure);
    for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    return { fixture, host, text: () => host.textContent.trim().replace(/\s+/g, ' ') };
  }

  it('shows a figure with its interval at the same digits', async () => {
    const { text } = await show({ value: 2407.1, low: 1275.2, high: 3539.4 });
    expect(text()).toBe('2,407 (1,275 to 3,539)');
  });

  it('asks for its lineage when selected', async () => {
    const { fixture, host } = await show({ value: 2.8561, kind: 'plain', figure: 'slope.0' });
    const asked: string[] = [];
    fixture.componentInstance.opened.subscribe((key) => asked.push(key));
    host.querySelector('button')?.click();
    expect(asked).toEqual(['slope.0']);
  });

  it('is no button without a lineage, and gives full precision on hover', async () => {
    const { host } = await show({ value: 2407.0987654 });
    expect(host.querySelector('button')).toBeNull();
    expect(host.querySelector('span')?.title).toBe('2,407.0987654');
  });

  it('follows the unit switch', async () => {
    const { fixture, text } = await show({ value: 2407.1 });
    TestBed.inject(NumberFormat).unit.set('billions');
    await fixture.whenStable();
    expect(text()).toBe('2.407');
  });

  it('says that a figure is missing, and that it has no interval', async () => {
    expect((await show({ value: null, low: null, high: null })).text()).toBe('n/a');
    expect((await show({ value: 5, low: null, high: null })).text()).toBe('5.000 no interval');
  });

  it('leaves room for a parenthesis beside a positive figure, so that digits align', async () => {
    TestBed.inject(NumberFormat).negatives.set('parentheses');
    const positive = await show({ value: 5200, digits: 0 });
    const negative = await show({ value: -5200, digits: 0 });
    expect(negative.text()).toBe('(5,200)');
    expect(positive.host).toHaveClass('beside-parentheses');
    expect(negative.host).not.toHaveClass('beside-parentheses');
  });
});
