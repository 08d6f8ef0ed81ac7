import { type Type } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { planBasis } from '../ui/plan/testing/plan-basis';
import { OutlookForm } from './outlook/outlook-form';
import { RangeEntry } from './ranges/range-entry';
import { RuleLines } from './rules/rule-lines';
import { openScenario } from './testing/opened-scenario';

const yearEffects = { last: 5, lastThree: 4, ownLast: 5, ownMean: 3, lastYear: 2025 };

async function shown<T>(component: Type<T>) {
  const fixture = TestBed.createComponent(component);
  await fixture.whenStable();
  const page = fixture.nativeElement as HTMLElement;
  return {
    page,
    text: () => page.textContent.replace(/\s+/g, ' '),
    find: <E extends HTMLElement>(selector: string) => page.querySelector<E>(selector)!,
    click: async (name: string): Promise<void> => {
      const buttons = [...page.querySelectorAll('button')];
      const button = buttons.find(
        (each) => each.getAttribute('aria-label') === name || each.textContent.trim() === name,
      );
      if (button === undefined) throw new Error(`expected a button ${name}; found none`);
      button.click();
      await fixture.whenStable();
    },
    enter: async (selector: string, value: string, type: 'input' | 'change'): Promise<void> => {
      const field = page.querySelector<HTMLInputElement | HTMLSelectElement>(selector)!;
      field.value = value;
      field.dispatchEvent(new Event(type));
      await fixture.whenStable();
    },
  };
}

describe('the rules of a plan', () => {
  it('are set in a form and read as a line in words', async () => {
    const { state } = openScenario();
    const { click, enter, text } = await shown(RuleLines);
    await click('Change rule of capex');
    await enter('select', 'grow', 'change');
    await enter('input', '10', 'input');
    await click('Set rule');
    expect(text()).toContain('Capex grows 10 % a year from FY2025’s 110.');
    expect(state.text().plan[0].values[0]).toBeCloseTo(121, 9);
  });

  it('say in the form what they lack and what the engine refuses', async () => {
    openScenario();
    const { click, enter, text } = await shown(RuleLines);
    await click('Change rule of capex');
    await enter('select', 'grow', 'change');
    await click('Set rule');
    expect(text()).toContain('Expected a rate, as 5 for 5 % a year.');
    await enter('input', '-120', 'input');
    await click('Set rule');
    expect(text()).toContain('capex cannot shrink by more than 100 % a year.');
  });

  it('take equity raises and buybacks, and lose them again', async () => {
    const { state } = openScenario();
    const { click, enter, text } = await shown(RuleLines);
    await click('Add an equity raise or buyback');
    await enter('kv-move-form select', 'buyback', 'change');
    await enter('kv-move-form input', '50', 'input');
    await enter('kv-move-form label:nth-child(3) select', '2027', 'change');
    await click('Add');
    expect(text()).toContain('Buyback of 50 in FY2027.');
    expect(state.text().plan.map(({ values }) => values[1])).toEqual([1000, 950, 950]);
    await click('Remove Buyback of 50 in FY2027');
    expect(state.isChanged()).toBeFalse();
  });
});

describe('the outlook of a plan', () => {
  it('is chosen: start, year effect, confidence of intervals and band', async () => {
    const ownErrors = { years: [2024, 2025], persistence: 0.5, variance: 400 };
    const { state } = openScenario({ basis: { ...planBasis, ownErrors, yearEffects } });
    const { find, enter } = await shown(OutlookForm);
    find<HTMLInputElement>('label:nth-of-type(2) input').click();
    await enter('.fields label:nth-child(1) select', 'given', 'change');
    await enter('.fields input', '7', 'change');
    await enter('.fields label:nth-child(3) select', '0.9', 'change');
    await enter('.fields label:nth-child(4) select', '0.95', 'change');
    expect(state.text().outlook).toEqual({
      start: 'carry-the-gap',
      yearEffect: { given: 7 },
      confidence: 0.9,
      bandConfidence: 0.95,
    });
  });

  it('says why the gap cannot be carried, and asks for no year effect where there are none', async () => {
    openScenario();
    const { find, page, text } = await shown(OutlookForm);
    expect(find<HTMLInputElement>('label:nth-of-type(2) input').disabled).toBeTrue();
    expect(text()).toContain('The gap cannot be carried: This fit was made before');
    expect(page.querySelectorAll('select').length).toBe(2);
  });
});

describe('low and high of a plan', () => {
  it('are taken around the planned amount, and their seed is shown and changed', async () => {
    const { state } = openScenario();
    const { enter, find, text } = await shown(RangeEntry);
    await enter('[aria-label="Low of Capex FY2026"]', '100', 'change');
    await enter('[aria-label="High of Capex FY2026"]', '140', 'change');
    expect(state.text().uncertainty?.ranges[0]).toEqual([{ low: 100, high: 140 }, null]);
    expect(find<HTMLInputElement>('.fields input').value).toBe('1');
    await enter('.fields input', '42', 'change');
    expect(state.text().uncertainty?.seed).toBe(42);
    await enter('[aria-label="Low of Book equity FY2026"]', '1,200', 'change');
    expect(text()).toContain('Book equity FY2026: expected low and high around the planned 1,000.');
    expect(state.text().uncertainty?.ranges[0][1]).toBeNull();
  });

  it('make an amount certain when both are empty', async () => {
    const { state, desk } = openScenario();
    desk.setRange(2026, 0, { low: 100, high: 140 });
    const { enter } = await shown(RangeEntry);
    await enter('[aria-label="Low of Capex FY2026"]', '', 'change');
    await enter('[aria-label="High of Capex FY2026"]', '', 'change');
    expect(state.text().uncertainty?.ranges[0][0]).toBeNull();
  });
});
