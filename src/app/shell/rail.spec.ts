import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { maySee, pages, type Role } from '@contract';
import { Rail } from './rail';

describe('Rail', () => {
  async function railOf(...roles: Role[]): Promise<HTMLElement> {
    TestBed.configureTestingModule({ providers: [provideRouter([])] });
    const fixture = TestBed.createComponent(Rail);
    fixture.componentRef.setInput(
      'pages',
      pages.filter((page) => maySee(page, roles)),
    );
    await fixture.whenStable();
    return fixture.nativeElement as HTMLElement;
  }

  function labels(rail: HTMLElement): string[] {
    return [...rail.querySelectorAll('li a')].map((link) => link.textContent.trim());
  }

  it('shows the pages in the order of the work, and a rule before those about the team', async () => {
    const rail = await railOf('analyst', 'billing_admin');
    expect(labels(rail)).toEqual([
      'Panel',
      'Peers',
      'Fit',
      'Scenarios',
      'Board',
      'Seats',
      'Members',
    ]);
    expect(rail.querySelector('.first-after-rule')?.textContent.trim()).toBe('Seats');
  });

  it('draws no rule where a role has only one kind of page', async () => {
    const rail = await railOf('billing_admin');
    expect(labels(rail)).toEqual(['Seats', 'Members']);
    expect(rail.querySelector('.first-after-rule')).toBeNull();
  });

  it('shows a reader the board and nothing else', async () => {
    expect(labels(await railOf('reader'))).toEqual(['Board']);
  });
});
