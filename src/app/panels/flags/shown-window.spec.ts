import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import type { CoverageWindow } from '@panel-data';
import { FlagsStore } from './flags-store';
import { ShownWindow } from './shown-window';

describe('the line that only a window is shown', () => {
  it('takes no room without one, and keeps the focus once all are shown again', async () => {
    const only = signal<CoverageWindow | null>(null);
    const showAll = () => {
      only.set(null);
    };
    TestBed.configureTestingModule({
      providers: [{ provide: FlagsStore, useValue: { only, showAll } }],
    });
    const fixture = TestBed.createComponent(ShownWindow);
    const page = fixture.nativeElement as HTMLElement;
    await fixture.whenStable();
    expect(getComputedStyle(page).display).toBe('none');
    only.set({ firstYear: 2010, lastYear: 2015, companies: ['Kesdrin'], rows: 6 });
    await fixture.whenStable();
    expect(page.textContent).toContain('Only the fully covered 1 company, FY2010–FY2015');
    const button = page.querySelector('button');
    button?.focus();
    button?.click();
    await fixture.whenStable();
    expect(document.activeElement?.textContent).toContain('All companies and years are shown.');
  });
});
