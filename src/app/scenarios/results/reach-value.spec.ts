import type { PlannedAmount } from '../../ui/plan/change-asked';
import { lagBasis } from '../../ui/plan/testing/plan-basis';
import { ReachValue } from './reach-value';
import { choose, fullBasis, shownResult } from './testing/shown-plan';

describe('reaching a value', () => {
  const answer = (page: HTMLElement) => page.querySelector('.answer')?.textContent.trim();

  function enter(page: HTMLElement, text: string): void {
    const box = page.querySelector('input')!;
    box.value = text;
    box.dispatchEvent(new Event('change'));
  }

  it('begins with the last actual market value in the last year', async () => {
    const { page } = await shownResult(ReachValue);
    // 2,700 + 2 × (150 − 100) − 0.5 × (1,100 − 1,000) = 2,750.
    expect(answer(page)).toBe(
      'Capex of 150.0 in FY2027 brings the expected value of FY2027 to 2,750.',
    );
    expect(page.textContent).toContain(
      'No finite range at 95 %: no value at all can be ruled out.',
    );
  });

  it('follows input, year and target', async () => {
    const { fixture, page } = await shownResult(ReachValue);
    choose(page, 0, 1);
    choose(page, 1, 0);
    enter(page, '2,800');
    await fixture.whenStable();
    // 2,700 + 2 × 30 − 0.5 × (x − 1,000) = 2,800.
    expect(answer(page)).toBe(
      'Book equity of 920.0 in FY2026 brings the expected value of FY2026 to 2,800.',
    );
    expect(page.querySelector('[role="status"]')?.textContent).toContain('Book equity of 920.0');
  });

  it('keeps the target where the text is no number, and says so', async () => {
    const { fixture, page } = await shownResult(ReachValue);
    const before = answer(page);
    enter(page, 'much');
    await fixture.whenStable();
    expect(page.querySelector('[role="alert"]')?.textContent).toContain('Expected a number');
    expect(answer(page)).toBe(before);
  });

  it('hands the amount to the plan, and says where it stands', async () => {
    const { fixture, state, page } = await shownResult(ReachValue);
    const wanted: PlannedAmount[] = [];
    fixture.componentInstance.amountWanted.subscribe((amount) => wanted.push(amount));
    page.querySelector('button')!.click();
    expect(wanted).toEqual([{ year: 2027, regressor: 0, value: 150 }]);
    state.text.update((text) => ({
      ...text,
      plan: [text.plan[0], { year: 2027, values: [150, 1100] }],
    }));
    await fixture.whenStable();
    expect(page.textContent).toContain('Capex FY2027 stands in the plan');
  });

  it('says where the solution lies, and why it is not familiar', async () => {
    const { fixture, page } = await shownResult(ReachValue);
    enter(page, '9,000');
    await fixture.whenStable();
    expect(page.textContent).toContain('FY2027 is outside the familiar range.');
    expect(page.textContent).toContain('above Velmara’s own range');
  });

  it('offers no value where the slope is zero', async () => {
    const basis = { ...fullBasis, coefficients: [3000, 0, -0.5] };
    const { page } = await shownResult(ReachValue, { basis });
    expect(answer(page)).toContain('The slope of capex is zero');
    expect(page.querySelector('button')).toBeNull();
  });

  it('solves for the year before where the model reads a year late', async () => {
    const { page } = await shownResult(ReachValue, { basis: lagBasis });
    expect(answer(page)).toBe(
      'Capex of 125.0 in FY2026 brings the expected value of FY2027 to 2,750.',
    );
    const years = [...page.querySelectorAll('select')[1].options].map(({ text }) => text);
    expect(years).toEqual(['FY2027']);
  });
});
