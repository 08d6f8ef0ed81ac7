import { type ComponentFixture, TestBed } from '@angular/core/testing';
import type { WantedPlace } from '../flags/panel-check';
import type { PanelRow } from '../panel-rows';
import { MultiplesSection } from './multiples-section';

function panel(companies: number): PanelRow[] {
  return Array.from({ length: companies }, (_, company) =>
    [2020, 2021].map((year) => ({
      fileRow: 0,
      company: `Company ${String(company).padStart(2, '0')}`,
      year,
      values: [100 + company, 1, 10, 50],
    })),
  ).flat();
}

describe('every company over time', () => {
  let fixture: ComponentFixture<MultiplesSection>;

  async function show(companies: number): Promise<HTMLElement> {
    fixture = TestBed.createComponent(MultiplesSection);
    const inputs = {
      rows: panel(companies),
      columns: [
        { name: 'mv', role: 'marketValue' },
        { name: 'staff', role: 'other' },
        { name: 'inv', role: 'capex' },
        { name: 'equity', role: 'bookEquity' },
      ],
      flags: new Map(),
      ownCompany: 'Company 29',
      source: '',
    };
    for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
    await fixture.whenStable();
    return fixture.nativeElement as HTMLElement;
  }

  function names(page: HTMLElement): string[] {
    return [...page.querySelectorAll('svg text.name')].map((name) => name.textContent.trim());
  }

  function press(page: HTMLElement, name: string): Promise<void> {
    const button = [...page.querySelectorAll('button')].find(
      (each) => each.textContent.trim() === name,
    );
    button?.focus();
    button?.click();
    return fixture.whenStable();
  }

  it('shows two dozen companies at once, the own one first, and turns them over', async () => {
    const page = await show(30);
    expect(names(page).length).toBe(24);
    expect(names(page)[0]).toBe('Company 29');
    expect(page.querySelector('[role=status]')?.textContent).toBe('1 to 24 of 30 companies');
    await press(page, 'More companies');
    expect(names(page)).toEqual([23, 24, 25, 26, 27, 28].map((company) => `Company ${company}`));
    await press(page, 'More companies');
    expect(names(page).length).toBe(6);
    for (const time of ['once', 'once too often']) {
      await press(page, 'Earlier companies');
      expect(names(page)[0]).withContext(time).toBe('Company 29');
    }
    expect(document.activeElement?.textContent.trim()).toBe('Earlier companies');
  });

  it('finds companies by name, and says where none is called so', async () => {
    const page = await show(30);
    const box = page.querySelector('input')!;
    const type = (text: string): Promise<void> => {
      box.value = text;
      box.dispatchEvent(new Event('input'));
      return fixture.whenStable();
    };
    await type('company 1');
    expect(names(page).length).toBe(10);
    await type('nobody');
    expect(page.textContent).toContain('No company is called so.');
  });

  it('leads from a figure to its cell, also where one variable is chosen', async () => {
    const page = await show(2);
    const wanted: WantedPlace[] = [];
    fixture.componentInstance.placeWanted.subscribe((place) => wanted.push(place));
    const select = page.querySelector('select')!;
    select.value = 'Capex';
    select.dispatchEvent(new Event('change'));
    await fixture.whenStable();
    page
      .querySelector('[role=grid]')
      ?.dispatchEvent(new KeyboardEvent('keydown', { key: 'Enter' }));
    expect(wanted).toEqual([{ company: 'Company 00', year: 2020, column: 2 }]);
  });
});
