import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { LineageReply } from '@contract';
import { LineageDrawer } from './lineage-drawer';
import { standingLineage } from './testing/standing-lineage';

describe('LineageDrawer', () => {
  let opener: HTMLButtonElement;
  let fixture: ComponentFixture<LineageDrawer>;

  beforeEach(() => {
    TestBed.configureTestingModule({ providers: [provideRouter([])] });
    opener = document.createElement('button');
    document.body.append(opener);
    opener.focus();
    fixture = TestBed.createComponent(LineageDrawer);
  });

  afterEach(() => {
    opener.remove();
  });

  async function show(lineage: LineageReply | null): Promise<HTMLElement> {
    fixture.componentRef.setInput('lineage', lineage);
    await fixture.whenStable();
    return fixture.nativeElement as HTMLElement;
  }

  it('shows the value at full precision in the panel’s unit, with its interval', async () => {
    const host = await show(standingLineage);
    expect(host.querySelector('.value')?.textContent).toBe('2,407.091234 EUR m');
    expect(host.textContent).toContain('95 % interval');
    expect(host.textContent).toContain('1,275.2 to 3,538.98');
  });

  it('leads from each row, also one that a correction added, to its place in the panel', async () => {
    const host = await show(standingLineage);
    const links = [...host.querySelectorAll<HTMLAnchorElement>('tbody a')];
    expect(links.map((link) => link.textContent.trim())).toEqual(['17', 'added']);
    expect(links.map((link) => link.getAttribute('href'))).toEqual([
      `/panel/${standingLineage.panelVersion.id}?company=Velmara&year=2024`,
      `/panel/${standingLineage.panelVersion.id}?company=Velmara&year=2025`,
    ]);
    expect(links.map((link) => link.getAttribute('aria-label'))).toEqual([
      'Velmara FY2024, row 17 in the panel',
      'Velmara FY2025, added row in the panel',
    ]);
  });

  it('says which version was put back where that made the panel’s', async () => {
    const words = (host: HTMLElement) => host.textContent.replace(/\s+/g, ' ');
    expect(words(await show(standingLineage))).toContain('Cold chain v4, EUR m, M. Oduya');
    const panelVersion = {
      ...standingLineage.panelVersion,
      origin: 'restore' as const,
      restoredNumber: 3,
    };
    expect(words(await show({ ...standingLineage, panelVersion }))).toContain(
      'Cold chain v4, EUR m, version 3 put back by M. Oduya on 12 Nov 2026',
    );
  });

  it('gives no link to a panel that the person may not open', async () => {
    fixture.componentRef.setInput('mayOpenPanel', false);
    const host = await show(standingLineage);
    expect(host.querySelector('tbody a')).toBeNull();
    expect(host.querySelector('tbody td')?.textContent.trim()).toBe('17');
  });

  it('takes the focus while it reads, and gives it back to the figure', async () => {
    const host = await show(null);
    expect(host.contains(document.activeElement)).toBeTrue();
    fixture.destroy();
    expect(document.activeElement).toBe(opener);
  });

  it('takes the focus when the reply came before the drawer', async () => {
    const host = await show(standingLineage);
    expect(host.contains(document.activeElement)).toBeTrue();
    fixture.destroy();
    expect(document.activeElement).toBe(opener);
  });

  it('closes on Esc', async () => {
    const host = await show(standingLineage);
    let closed = 0;
    fixture.componentInstance.closed.subscribe(() => (closed += 1));
    host.dispatchEvent(new KeyboardEvent('keydown', { key: 'Escape' }));
    expect(closed).toBe(1);
  });

  it('goes on to a figure that went in', async () => {
    const host = await show(standingLineage);
    const asked: string[] = [];
    fixture.componentInstance.figureSelected.subscribe((figure) => asked.push(figure));
    host.querySelector<HTMLButtonElement>('dl button')?.click();
    expect(asked).toEqual(['intercept.0']);
  });
});
