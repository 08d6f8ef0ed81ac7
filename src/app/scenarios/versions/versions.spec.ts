import { HttpTestingController } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import type { ScenarioVersion } from '@contract';
import { DraftKeeper } from '../draft-keeper';
import { openScenario, savedScenario } from '../testing/opened-scenario';
import { BothVersions } from './both-versions';
import { changeWords } from './copied-notice';
import { ScenarioVersions } from './scenario-versions';

function textOf(page: HTMLElement): string {
  return page.textContent.replace(/\s+/g, ' ');
}

function press(page: HTMLElement, name: string): void {
  const buttons = [...page.querySelectorAll('button')];
  const found = buttons.find(
    (each) => each.textContent.trim() === name || each.getAttribute('aria-label') === name,
  );
  if (found === undefined) throw new Error(`expected a button ${name}; found none`);
  found.click();
}

describe('two versions on the page', () => {
  /** One's own plan of version 1 has 150, and version 2 is stored with 200. */
  async function met() {
    const { state, desk } = openScenario({ saved: savedScenario(1, 120) });
    desk.setAmount({ year: 2026, regressor: 0, value: 150 });
    desk.setAmount({ year: 2026, regressor: 1, value: 900 });
    state.setSaved(savedScenario(2, 200));
    const fixture = TestBed.createComponent(BothVersions);
    await fixture.whenStable();
    return { state, fixture, page: fixture.nativeElement as HTMLElement };
  }

  it('stand side by side, cell by cell', async () => {
    const { page } = await met();
    expect(textOf(page)).toContain('I. Vandresson saved version 2 meanwhile.');
    const rows = [...page.querySelectorAll('tbody tr')].map((row) =>
      textOf(row as HTMLElement).trim(),
    );
    expect(rows).toEqual(['Capex FY2026 150 200', 'Book equity FY2026 900 1,000']);
  });

  it('come together as chosen, one’s own where nothing is chosen', async () => {
    const { page, state, fixture } = await met();
    page.querySelector<HTMLInputElement>('tbody tr:first-child td:last-child input')!.click();
    await fixture.whenStable();
    press(page, 'Go on with the choice');
    expect(state.text().plan[0].values).toEqual([200, 900]);
    expect(state.theirs()).toBeNull();
    await fixture.whenStable();
    expect(page.querySelector('table')).toBeNull();
  });

  it('give way to all of theirs, or all of one’s own', async () => {
    const { page, state } = await met();
    press(page, 'Take all of theirs');
    expect(state.text().plan[0].values).toEqual([200, 1000]);
    expect(state.isChanged()).toBeFalse();
  });
});

describe('earlier versions', () => {
  const older: ScenarioVersion = {
    ...savedScenario(1, 120),
    note: 'before the review',
    createdBy: 'M. Oduya',
    createdAt: '2026-11-10T09:00:00.000Z',
  };

  async function listed() {
    const { state } = openScenario({ saved: savedScenario(2, 200), role: 'analyst' });
    const fixture = TestBed.createComponent(ScenarioVersions);
    let saves = 0;
    fixture.componentInstance.saveWanted.subscribe(() => (saves += 1));
    fixture.detectChanges();
    const http = TestBed.inject(HttpTestingController);
    const newest = { ...older, ...savedScenario(2, 200), createdAt: '2026-11-14T09:00:00.000Z' };
    http
      .expectOne('/api/scenarios/00000000-0000-4000-8000-000000000009/versions')
      .flush({ versions: [newest, older] });
    await new Promise((resolve) => setTimeout(resolve));
    await fixture.whenStable();
    return { state, fixture, page: fixture.nativeElement as HTMLElement, saves: () => saves };
  }

  it('are listed with note, who and when', async () => {
    const { page } = await listed();
    const rows = [...page.querySelectorAll('tbody tr')].map((row) => textOf(row as HTMLElement));
    expect(rows.length).toBe(2);
    expect(rows[0]).toContain('newest');
    expect(rows[1]).toContain('M. Oduya');
    expect(rows[1]).toContain('before the review');
  });

  it('open beside the plan cell by cell, and come back as a new version', async () => {
    const { page, fixture, state, saves } = await listed();
    press(page, 'Compare version 1');
    await fixture.whenStable();
    const amounts = [...page.querySelectorAll('kv-difference-table tbody tr:last-child > *')];
    expect(amounts.map(({ textContent }) => textContent.trim())).toEqual([
      'Capex FY2026',
      '120',
      '200',
    ]);
    expect(state.text().plan[0].values[0]).toBe(200);
    press(page, 'Put version 1 back');
    expect(state.text().plan[0].values[0]).toBe(120);
    expect(saves()).toBe(1);
    await TestBed.inject(DraftKeeper).drop();
  });
});

describe('what a copy onto another fit says', () => {
  const none = {
    droppedYears: [],
    addedYears: [],
    heldRegressors: [],
    droppedRegressors: [],
    droppedRules: [],
    outlook: [],
    years: [],
  };

  it('names everything that could not be taken over', () => {
    expect(changeWords(none)).toEqual(['The plan came over as it was.']);
    expect(
      changeWords({
        ...none,
        droppedYears: [2026],
        droppedRules: ['capex'],
        outlook: ['It starts from the model level.'],
      }),
    ).toEqual([
      'Left out, for the panel has observed it: FY2026.',
      'Amounts stay, but no longer follow a rule, which gives others here: capex.',
      'It starts from the model level.',
    ]);
  });
});
