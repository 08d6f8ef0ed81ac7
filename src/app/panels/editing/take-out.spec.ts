import { TestBed } from '@angular/core/testing';
import { type TableFile, insideInformationCaution, problemType } from '@contract';
import { NumberFormat } from '../../ui/number-format';
import { DeskGridHarness } from './testing/desk-grid-harness';

describe('taking selected cells out', () => {
  let desk: DeskGridHarness;
  let saved: string[];

  beforeEach(async () => {
    sessionStorage.clear();
    saved = [];
    spyOn(HTMLAnchorElement.prototype, 'click').and.callFake(function (this: HTMLAnchorElement) {
      saved.push(this.download);
    });
    desk = await DeskGridHarness.open();
  });
  afterEach(() => {
    sessionStorage.clear();
    desk.end();
  });

  async function choose(format: 'As CSV' | 'As XLSX') {
    desk.named('Take out the selection').click();
    await desk.settled();
    const menu = desk.dialog('[role=menu]');
    expect([...menu.querySelectorAll('[role=menuitem]')].map((item) => item.textContent)).toEqual([
      'As CSV',
      'As XLSX',
    ]);
    desk.named(format, menu).click();
    await desk.settled();
  }

  it('offers nothing while no cell is selected', async () => {
    const button = desk.named('Take out the selection');
    expect(button.getAttribute('aria-disabled')).toBe('true');
    button.click();
    await desk.settled();
    expect(document.querySelector('[role=menu]')).toBeNull();
  });

  it('sends company, year and the columns as they are shown, changes not saved among them', async () => {
    TestBed.inject(NumberFormat).unit.set('thousands');
    await desk.click(0, 'figure-0');
    await desk.type('7.5');
    await desk.click(0, 'figure-0');
    await desk.press('ArrowDown', { shiftKey: true });
    await desk.press('ArrowRight', { shiftKey: true });
    await choose('As XLSX');
    const { request, flush } = answerable(desk.http.expectOne('/api/tables/xlsx'));
    expect(request.columns.map(({ header }) => header)).toEqual([
      ...['Company', 'Year', 'Market value, EUR k', 'Capex, EUR k'],
    ]);
    expect(request.rows).toEqual([
      ['Sarvane', 2010, 7.5, null],
      ['Sarvane', 2011, 110_000, 11_000],
    ]);
    const notes = new Map(request.notes.map(({ label, text }) => [label, text]));
    expect(notes.get('Not saved')).toContain('1 cell');
    expect(notes.get('Caution')).toBe(insideInformationCaution);
    flush(new ArrayBuffer(4));
    await desk.settled();
    expect(saved.length).toBe(1);
    expect(saved[0]).toMatch(/^selection-of-.+-version-4\.xlsx$/);
    expect(desk.words).toContain('2 rows taken out as XLSX');
  });

  it('says why where the server makes none', async () => {
    await desk.click(1, 'figure-1');
    await choose('As CSV');
    const problem = { type: problemType('unavailable'), title: 'Busy just now', status: 503 };
    desk.http
      .expectOne('/api/tables/csv')
      .flush(new TextEncoder().encode(JSON.stringify(problem)).buffer, {
        status: 503,
        statusText: 'Unavailable',
      });
    await desk.settled();
    expect(saved).toEqual([]);
    expect(desk.words).toContain('Busy just now');
  });

  function answerable(sent: ReturnType<typeof desk.http.expectOne>) {
    return {
      request: sent.request.body as TableFile,
      flush: (body: ArrayBuffer) => {
        sent.flush(body);
      },
    };
  }
});
