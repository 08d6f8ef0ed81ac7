import { type ComponentFixture, TestBed } from '@angular/core/testing';
import type { Preferences } from '@contract';
import { PersonMenu } from './person-menu';

describe('PersonMenu', () => {
  let fixture: ComponentFixture<PersonMenu>;
  let host: HTMLElement;
  let opener: HTMLButtonElement;

  beforeEach(async () => {
    fixture = TestBed.createComponent(PersonMenu);
    fixture.componentRef.setInput('name', 'Mira Oduya');
    fixture.componentRef.setInput('email', 'mira@velmara.example');
    fixture.componentRef.setInput('roles', ['analyst', 'billing_admin']);
    fixture.componentRef.setInput('preferences', {
      theme: 'dark',
      unit: 'millions',
      negatives: 'minus',
    } satisfies Preferences);
    document.body.append((host = fixture.nativeElement as HTMLElement));
    await fixture.whenStable();
    opener = host.querySelector<HTMLButtonElement>('.opener')!;
  });

  async function open(): Promise<void> {
    opener.click();
    await fixture.whenStable();
  }

  it('stays closed until asked, and says so', async () => {
    expect(opener.textContent.trim()).toBe('MO');
    expect(opener.getAttribute('aria-expanded')).toBe('false');
    await open();
    expect(opener.getAttribute('aria-expanded')).toBe('true');
    expect(host.textContent).toContain('analyst, billing admin');
  });

  it('marks the settings in force and tells of a change', async () => {
    await open();
    const changes: Partial<Preferences>[] = [];
    fixture.componentInstance.preferencesChanged.subscribe((change) => changes.push(change));
    const themes = host.querySelectorAll<HTMLInputElement>('input[name=kv-theme]');
    expect([...themes].map((radio) => radio.checked)).toEqual([false, false, true]);
    themes[1].click();
    host.querySelectorAll<HTMLInputElement>('input[name=kv-negatives]')[1].click();
    expect(changes).toEqual([{ theme: 'light' }, { negatives: 'parentheses' }]);
  });

  it('closes on Esc and gives the focus back to its button', async () => {
    await open();
    host.querySelector<HTMLElement>('.panel input')?.focus();
    host.dispatchEvent(new KeyboardEvent('keydown', { key: 'Escape' }));
    await fixture.whenStable();
    expect(host.querySelector('.panel')).toBeNull();
    expect(document.activeElement).toBe(opener);
  });

  it('closes when somebody presses elsewhere', async () => {
    await open();
    document.body.dispatchEvent(new Event('pointerdown', { bubbles: true }));
    await fixture.whenStable();
    expect(host.querySelector('.panel')).toBeNull();
  });
});
