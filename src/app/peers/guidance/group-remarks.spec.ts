import { TestBed } from '@angular/core/testing';
import { panelCompany, scatteredCompanies } from '../testing/panel-company';
import { GroupRemarks } from './group-remarks';

describe('the remarks on a group', () => {
  async function shown(peers: ReturnType<typeof scatteredCompanies>): Promise<string> {
    const fixture = TestBed.createComponent(GroupRemarks);
    fixture.componentRef.setInput('own', panelCompany('Velmara', { marketValue: 2000 }));
    fixture.componentRef.setInput('peers', peers);
    await fixture.whenStable();
    const page = fixture.nativeElement as HTMLElement;
    return (page.querySelector('[role=status]')?.textContent ?? '').replace(/\s+/g, ' ').trim();
  }

  it('caution of what holds of the group', async () => {
    expect(await shown(scatteredCompanies(3))).toMatch(/^Caution: Small: 4 companies/);
  });

  it('say that there is nothing to mind, and nothing of an empty group', async () => {
    expect(await shown(scatteredCompanies(12))).toMatch(/^In order: Large and long enough/);
    expect(await shown([])).toBe('');
  });
});
