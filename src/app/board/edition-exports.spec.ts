import { provideHttpClient } from '@angular/common/http';
import { provideHttpClientTesting } from '@angular/common/http/testing';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { Confirm } from '../ui/confirm';
import type { ConfirmQuestion } from '../ui/confirm-question';
import { EditionExports } from './edition-exports';

describe('taking an edition out', () => {
  let fixture: ComponentFixture<EditionExports>;
  let agrees: boolean;
  let asked: ConfirmQuestion[];
  /** Clicks that the browser would follow. */
  let followed: string[];

  beforeEach(() => {
    agrees = true;
    asked = [];
    followed = [];
    const confirm: Pick<Confirm, 'ask'> = {
      ask: (question) => {
        asked.push(question);
        return Promise.resolve(agrees);
      },
    };
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        { provide: Confirm, useValue: confirm },
      ],
    });
    fixture = TestBed.createComponent(EditionExports);
    fixture.componentRef.setInput('editionId', '00000000-0000-4000-8000-000000000007');
    (fixture.nativeElement as HTMLElement).addEventListener('click', (event) => {
      if (!event.defaultPrevented) followed.push((event.target as HTMLElement).textContent.trim());
      event.preventDefault();
    });
  });

  async function take(confidentiality: string, label: string): Promise<void> {
    fixture.componentRef.setInput('confidentiality', confidentiality);
    await fixture.whenStable();
    const links = [...(fixture.nativeElement as HTMLElement).querySelectorAll('a')];
    links.find((each) => each.textContent.trim() === label)?.click();
    await new Promise((resolve) => setTimeout(resolve));
  }

  it('goes on at once where it is confidential', async () => {
    await take('confidential', 'XLSX');
    expect(asked).toEqual([]);
    expect(followed).toEqual(['XLSX']);
  });

  it('reminds of what inside information is, and goes on only with a yes', async () => {
    await take('inside-information', 'PDF, A4');
    expect(asked[0].detail).toContain('share it only with those allowed to have it');
    expect(followed).toEqual(['PDF, A4']);
    agrees = false;
    await take('inside-information', 'PDF, Letter');
    expect(asked.length).toBe(2);
    expect(followed).toEqual(['PDF, A4']);
  });
});
