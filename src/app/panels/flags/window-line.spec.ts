import { TestBed } from '@angular/core/testing';
import type { PanelRow } from '../panel-rows';
import { WindowLine } from './window-line';

const columns = [{ name: 'mv', role: 'marketValue' as const }];
const window = { firstYear: 2010, lastYear: 2015, companies: ['Kesdrin'], rows: 6 };

function rowsOf(companies: readonly string[], first: number, last: number): PanelRow[] {
  return companies.flatMap((company) =>
    Array.from({ length: last - first + 1 }, (_, step) => ({
      ...{ fileRow: 2, company, year: first + step },
      values: [1],
    })),
  );
}

describe('the line of the fully covered window', () => {
  async function shown(rows: readonly PanelRow[], isAlone = false) {
    const fixture = TestBed.createComponent(WindowLine);
    const inputs = { window, rows, columns, isAlone };
    for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
    await fixture.whenStable();
    const asked: string[] = [];
    fixture.componentInstance.onlyWanted.subscribe(() => asked.push('only'));
    fixture.componentInstance.allWanted.subscribe(() => asked.push('all'));
    const page = fixture.nativeElement as HTMLElement;
    const button = page.querySelector('button');
    return { page, button, asked, fixture };
  }

  it('offers to show nothing else, where there is anything else', async () => {
    const { button, asked } = await shown(rowsOf(['Kesdrin', 'Sarvane'], 2010, 2015));
    expect(button?.textContent.trim()).toBe('Show only these');
    button?.click();
    expect(asked).toEqual(['only']);
    expect((await shown(rowsOf(['Kesdrin'], 2010, 2016))).button).not.toBeNull();
    expect((await shown(rowsOf(['Kesdrin'], 2010, 2015))).button).toBeNull();
  });

  it('leads back to all, and says that it alone is shown', async () => {
    const { page, button, asked } = await shown(rowsOf(['Kesdrin', 'Sarvane'], 2010, 2015), true);
    expect(page.querySelector('[role=status]')?.textContent).toContain('only');
    button?.click();
    expect(asked).toEqual(['all']);
  });

  it('keeps the focus on its button both ways, and says each turn but not how it began', async () => {
    const rows = rowsOf(['Kesdrin', 'Sarvane'], 2010, 2015);
    const { page, button, fixture } = await shown(rows);
    const said = () => page.querySelector('[role=status]')?.textContent;
    expect(said()).toBe('');
    button?.focus();
    for (const isAlone of [true, false]) {
      fixture.componentRef.setInput('isAlone', isAlone);
      await fixture.whenStable();
      expect(document.activeElement).toBe(button);
      expect(said()).toContain(isAlone ? 'only' : 'all companies and years');
    }
  });
});
