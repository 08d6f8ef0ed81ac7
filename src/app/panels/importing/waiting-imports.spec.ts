import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { type OpenImport, problemType } from '@contract';
import { Confirm } from '../../ui/confirm';
import { uuid } from './testing/import-replies';
import { WaitingImports } from './waiting-imports';

const waiting = (last: number, change: Partial<OpenImport> = {}): OpenImport => ({
  id: uuid(last),
  fileName: `file-${last}.csv`,
  state: 'mapped',
  at: '2026-03-04T12:00:00.000Z',
  by: 'Ilvo Brenn',
  ...change,
});

describe('the imports that wait', () => {
  let fixture: ComponentFixture<WaitingImports>;
  let http: HttpTestingController;
  let asked: string[];
  let answer: boolean;

  async function begin(imports: readonly OpenImport[]): Promise<void> {
    asked = [];
    answer = true;
    const confirm: Pick<Confirm, 'ask'> = {
      ask: ({ title }) => {
        asked.push(title);
        return Promise.resolve(answer);
      },
    };
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter([]),
        { provide: Confirm, useValue: confirm },
      ],
    });
    http = TestBed.inject(HttpTestingController);
    fixture = TestBed.createComponent(WaitingImports);
    document.body.append(host());
    http.expectOne('/api/imports').flush({ imports });
    await settled();
  }

  afterEach(() => {
    host().remove();
    http.verify();
  });

  function host(): HTMLElement {
    return fixture.nativeElement as HTMLElement;
  }

  function words(): string {
    return host().textContent.replace(/\s+/g, ' ').trim();
  }

  async function settled(): Promise<void> {
    await new Promise((resolve) => setTimeout(resolve));
    await fixture.whenStable();
  }

  async function press(label: string): Promise<void> {
    host().querySelector<HTMLElement>(`[aria-label="${label}"]`)?.click();
    await settled();
  }

  it('take no room where there are none', async () => {
    await begin([]);
    expect(words()).toBe('');
    expect(host().classList).toContain('none');
  });

  it('say which file, when, by whom and how far it is, and lead on', async () => {
    await begin([waiting(1)]);
    expect(words()).toMatch(
      /^An import is waiting: file-1\.csv, brought in 4 Mar 2026, \d\d:\d\d by Ilvo Brenn\. Its columns are not checked yet\. ?Continue ?Discard$/,
    );
    expect(host().querySelector('a')?.getAttribute('href')).toBe(`/panel/import/${uuid(1)}`);
  });

  it('are listed, three at first; one that is being made a version cannot be discarded', async () => {
    await begin([waiting(1, { state: 'committing' }), waiting(2), waiting(3), waiting(4)]);
    expect(words()).toContain('4 imports are waiting:');
    expect(host().querySelectorAll('li').length).toBe(3);
    expect(host().querySelector('[aria-label="Discard file-1.csv"]')).toBeNull();
    host().querySelector<HTMLButtonElement>('.all')?.click();
    await settled();
    expect(host().querySelectorAll('li').length).toBe(4);
  });

  it('are discarded only after asking, and the focus stays near', async () => {
    await begin([waiting(1), waiting(2)]);
    answer = false;
    await press('Discard file-2.csv');
    expect(asked).toEqual(['Discard the import of file-2.csv?']);
    answer = true;
    await press('Discard file-2.csv');
    http.expectOne({ method: 'DELETE', url: `/api/imports/${uuid(2)}` }).flush(null);
    await settled();
    expect(words()).toContain('The import of file-2.csv is discarded.');
    expect(host().querySelectorAll('li').length).toBe(1);
    expect(document.activeElement?.getAttribute('role')).toBe('status');
  });

  it('are read again when one cannot be discarded, and say why', async () => {
    await begin([waiting(1)]);
    await press('Discard file-1.csv');
    http
      .expectOne({ method: 'DELETE', url: `/api/imports/${uuid(1)}` })
      .flush(
        { type: problemType('conflict'), title: 'This import is a panel version', status: 409 },
        { status: 409, statusText: 'Conflict' },
      );
    await settled();
    http.expectOne('/api/imports').flush({ imports: [] });
    await settled();
    expect(words()).toContain('This import is a panel version');
    expect(host().querySelectorAll('li').length).toBe(0);
  });
});
