import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { ChangeDetectionStrategy, Component } from '@angular/core';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatCheckboxHarness } from '@angular/material/checkbox/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import type { FlagDismissal } from '@contract';
import type { Flag } from '@panel-data';
import { ApiProblem } from '../../api/api-problem';
import { NumberFormat } from '../../ui/number-format';
import { AskDismissal } from './ask-dismissal';
import { FlagList } from './flag-list';
import { dismissalOfJump, jump, missing, slip, titles } from './testing/example-flags';

@Component({
  selector: 'kv-spec-root',
  template: '',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class SpecRoot {}

describe('the list of flags', () => {
  let fixture: ComponentFixture<FlagList>;

  async function show(inputs: Record<string, unknown>): Promise<HTMLElement> {
    const numbers = TestBed.inject(NumberFormat);
    numbers.panelUnit.set('millions');
    numbers.unit.set('millions');
    fixture = TestBed.createComponent(FlagList);
    fixture.componentRef.setInput('titles', titles);
    for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
    await fixture.whenStable();
    return fixture.nativeElement as HTMLElement;
  }

  function button(page: HTMLElement, name: string): HTMLButtonElement {
    const found = [...page.querySelectorAll('button')].find(
      (each) =>
        (each.getAttribute('aria-label') ?? each.textContent.replace(/\s+/g, ' ').trim()) === name,
    );
    if (found === undefined) throw new Error(`expected a button ${name}; found none`);
    return found;
  }

  it('leads from each flag to its cell', async () => {
    const page = await show({ flags: { open: [jump, missing], dismissed: [] } });
    const wanted: Flag[] = [];
    fixture.componentInstance.cellWanted.subscribe((flag) => wanted.push(flag));
    button(page, 'Kesdrin FY2016 capex 4,120').click();
    button(page, 'Sarvane FY2010 capex').click();
    expect(wanted).toEqual([jump, missing]);
    expect(page.textContent).not.toContain('Right as it is');
  });

  it('opens the first kind only where there are many, and more on request', async () => {
    const many = Array.from({ length: 20 }, (_, place) => ({ ...missing, year: 2000 + place }));
    const page = await show({ flags: { open: [...many, jump], dismissed: [] } });
    expect(page.querySelectorAll('li').length).toBe(8);
    button(page, 'Show more of 20').focus();
    button(page, 'Show more of 20').click();
    await fixture.whenStable();
    expect(page.querySelectorAll('li').length).toBe(20);
    expect(document.activeElement?.textContent).toContain('Sarvane FY2008');
    button(page, '1 figure jumps as the company’s figures rarely do').click();
    await fixture.whenStable();
    expect(page.querySelectorAll('li').length).toBe(21);
  });

  it('offers to put aside only what is saved, and to take that back', async () => {
    const page = await show({
      flags: {
        open: [missing, slip(2018)],
        dismissed: [{ flag: jump, dismissal: dismissalOfJump }],
      },
      mayDismiss: true,
      isSaved: (flag: Flag) => flag !== missing,
    });
    const [wanted, back]: [Flag[], FlagDismissal[]] = [[], []];
    fixture.componentInstance.dismissWanted.subscribe((flag) => wanted.push(flag));
    fixture.componentInstance.takeBackWanted.subscribe((each) => back.push(each));
    expect(button(page, 'Right as it is: Sarvane FY2010 capex').disabled).toBeTrue();
    button(page, 'Right as it is: Velmara FY2018 book equity').click();
    button(page, 'Take back: Kesdrin FY2016 capex').click();
    expect(wanted.map(({ year }) => year)).toEqual([2018]);
    expect(back).toEqual([dismissalOfJump]);
    expect(page.textContent).toContain('“A new plant, annual report 2016, p. 40”');
    expect(page.textContent).toContain('Ilvo Brenn');
  });

  it('goes on to what stands next once flags are put aside, and says what is left', async () => {
    const [first, second] = [slip(2018), slip(2019)];
    const page = await show({ flags: { open: [missing, first, second], dismissed: [] } });
    const list = fixture.componentInstance;
    const putAside = async (flag: Flag, open: readonly Flag[]): Promise<string> => {
      const from = list.placeOf(flag);
      fixture.componentRef.setInput('flags', { open, dismissed: [] });
      await fixture.whenStable();
      list.goOnFrom(from, 1);
      await fixture.whenStable();
      return (document.activeElement?.textContent ?? '').replace(/\s+/g, ' ').trim();
    };
    const said = () => page.querySelector('[role=status]')?.textContent;
    expect(await putAside(first, [missing, second])).toContain('FY2019');
    expect(said()).toBe('1 flag put aside as right. 2 flags left.');
    (document.activeElement as HTMLElement).blur();
    expect(await putAside(second, [missing])).toBe('1 cell is missing');
    expect(await putAside(missing, [])).toBe('What to look at');
    expect(said()).toContain('Nothing is left to look at.');
  });

  it('goes on to the next dismissal once one is taken back, and to the head after the last', async () => {
    const other = { ...dismissalOfJump, id: 'other' };
    const open = [missing];
    const dismissed = [
      { flag: jump, dismissal: dismissalOfJump },
      { flag: slip(2018), dismissal: other },
    ];
    const page = await show({ flags: { open, dismissed }, mayDismiss: true });
    page.querySelector('details')!.open = true;
    for (const [left, next] of [
      [dismissed.slice(0, 1), 'Kesdrin FY2016'],
      [[], 'What to look at'],
    ] as const) {
      fixture.componentRef.setInput('flags', { open, dismissed: left });
      fixture.componentInstance.goOnAfterTakingBack(jump, left.length);
      await fixture.whenStable();
      expect(document.activeElement?.textContent).toContain(next);
      (document.activeElement as HTMLElement).blur();
    }
    expect(page.querySelector('[role=status]')?.textContent).toContain(
      'Kesdrin FY2016 capex is to be',
    );
  });

  it('says that there is nothing, and that it is still looking', async () => {
    const page = await show({ flags: null });
    expect(page.querySelector('[role=status]')?.textContent).toContain('Looking through');
    fixture.componentRef.setInput('flags', { open: [], dismissed: [] });
    await fixture.whenStable();
    expect(page.textContent).toContain('none of them stands out');
  });
});

describe('putting flags aside', () => {
  it('needs a reason, takes the others along, and stays open where it fails', async () => {
    const fixture = TestBed.createComponent(SpecRoot);
    const loader = TestbedHarnessEnvironment.documentRootLoader(fixture);
    const asked: { flags: readonly Flag[]; reason: string }[] = [];
    let problem: ApiProblem | null = new ApiProblem('conflict', {
      type: 'about:blank',
      title: 'The value has changed',
      status: 409,
    });
    const [flag, other] = [slip(2018), slip(2019)];
    const answer = TestBed.inject(AskDismissal).ask({
      flag,
      alike: [other],
      line: ({ company, year }) => `${company} ${year}`,
      dismiss: (flags, reason) => {
        asked.push({ flags, reason });
        return Promise.resolve(problem);
      },
    });
    while (document.querySelector('kv-dismiss-dialog') === null)
      await new Promise((resolve) => setTimeout(resolve, 5));
    const dialog = document.querySelector('kv-dismiss-dialog')!;

    await (await loader.getHarness(MatButtonHarness.with({ text: 'It is right' }))).click();
    expect(asked).toEqual([]);
    expect(dialog.textContent).toContain('A reason is needed.');

    await (await loader.getHarness(MatInputHarness)).setValue(' Restated ');
    await (await loader.getHarness(MatCheckboxHarness.with({ label: 'All 1' }))).check();
    await (await loader.getHarness(MatButtonHarness.with({ text: 'All 2 are right' }))).click();
    expect(asked).toEqual([{ flags: [flag, other], reason: 'Restated' }]);
    expect(dialog.querySelector('[role=alert]')?.textContent).toContain('The value has changed');

    problem = null;
    await (await loader.getHarness(MatButtonHarness.with({ text: 'All 2 are right' }))).click();
    while (document.querySelector('kv-dismiss-dialog') !== null)
      await new Promise((resolve) => setTimeout(resolve, 5));
    expect(asked.length).toBe(2);
    expect(await answer).toBe(2);
  });
});
