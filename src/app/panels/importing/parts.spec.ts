import { TestBed } from '@angular/core/testing';
import { type FileMending, type ImportFinding, noMending } from '@contract';
import { ChangeTable } from './change-table';
import { CurrencyPart } from './currency-part';
import { FiscalYearPart } from './fiscal-year-part';
import { type MappingEntry, startingEntry } from './mapping-entry';
import { OtherColumns } from './other-columns';
import { PricePart } from './price-part';
import { ReviewTable } from './review-table';
import { SpellingList } from './spelling-list';
import { flowCheck, flowDraft, flowVersion, uuid } from './testing/import-replies';

const entry = startingEntry(flowDraft, undefined, flowVersion);

function setField(host: HTMLElement, label: string, value: string): void {
  const field = host.querySelector<HTMLInputElement | HTMLSelectElement>(`[aria-label="${label}"]`);
  if (field === null) throw new Error(`expected a field “${label}”; found none`);
  field.value = value;
  field.dispatchEvent(new Event('change'));
}

function pasteInto(host: HTMLElement, text: string): void {
  const clipboardData = new DataTransfer();
  clipboardData.setData('text/plain', text);
  const area = host.querySelector('textarea');
  area?.dispatchEvent(new ClipboardEvent('paste', { clipboardData, cancelable: true }));
}

function pressIn(host: HTMLElement, name: string): void {
  const found = [...host.querySelectorAll('button')].find(
    (each) => each.textContent.replace(/\s+/g, ' ').trim() === name,
  );
  if (found === undefined) throw new Error(`expected a button “${name}”; found none`);
  found.click();
}

describe('the other columns of a file', () => {
  it('come along as figures or texts, with their own unit and measure', async () => {
    const fixture = TestBed.createComponent(OtherColumns);
    const host = fixture.nativeElement as HTMLElement;
    const changes: Partial<MappingEntry>[] = [];
    fixture.componentInstance.entryChanged.subscribe((change) => changes.push(change));
    fixture.componentRef.setInput('draft', flowDraft);
    fixture.componentRef.setInput('entry', entry);
    await fixture.whenStable();
    const rows = [...host.querySelectorAll('tbody th')].map((each) => each.textContent);
    expect(rows).toEqual(['mv', 'capex', 'equity', 'staff', 'cur']);
    setField(host, 'cur: brought in as', 'text');
    expect(changes[0].attributes).toEqual(['cur']);
    expect(changes[0].others).toEqual(['staff']);
    setField(host, 'mv: unit in the file', 'thousands');
    expect(changes[1].columns).toEqual([{ column: 'mv', unit: 'thousands', measure: null }]);
    setField(host, 'staff: measures', 'flow');
    expect(changes[2].columns).toEqual([{ column: 'staff', unit: null, measure: 'flow' }]);
  });
});

describe('the column that names each row’s currency', () => {
  it('is said to be used so among the other columns, not left out', async () => {
    const fixture = TestBed.createComponent(OtherColumns);
    const host = fixture.nativeElement as HTMLElement;
    fixture.componentRef.setInput('draft', flowDraft);
    fixture.componentRef.setInput('entry', { ...entry, currencyColumn: 'cur' });
    await fixture.whenStable();
    const chosen = (header: string): string | undefined =>
      host
        .querySelector<HTMLSelectElement>(`[aria-label="${header}: brought in as"]`)
        ?.selectedOptions[0].textContent.trim();
    expect(chosen('cur')).toBe('each row’s currency');
    expect(chosen('staff')).toBe('a figure');
    fixture.componentRef.setInput('entry', { ...entry, others: [] });
    await fixture.whenStable();
    expect(chosen('cur')).toBe('left out');
    expect(chosen('staff')).toBe('left out');
  });
});

describe('currencies and prices', () => {
  it('ask for rates only where a column names the currency', async () => {
    const fixture = TestBed.createComponent(CurrencyPart);
    const host = fixture.nativeElement as HTMLElement;
    fixture.componentRef.setInput('headers', flowDraft.headers);
    fixture.componentRef.setInput('entry', entry);
    await fixture.whenStable();
    expect(host.querySelector('textarea')).toBeNull();
    expect(host.textContent).toContain('none: all figures are in EUR');
  });

  it('take pasted rates in the place of those of the same currency and year', async () => {
    const fixture = TestBed.createComponent(CurrencyPart);
    const host = fixture.nativeElement as HTMLElement;
    const changes: Partial<MappingEntry>[] = [];
    fixture.componentInstance.entryChanged.subscribe((change) => changes.push(change));
    const usd = { currency: 'USD', year: '2020', average: '', yearEnd: '' };
    fixture.componentRef.setInput('headers', flowDraft.headers);
    fixture.componentRef.setInput('entry', { ...entry, currencyColumn: 'cur', rates: [usd] });
    await fixture.whenStable();
    pasteInto(host, 'USD\t2020\t0.92\t0.9\nUSD\t2021\t0.85\t0.88');
    expect(changes[0].rates).toEqual([
      { currency: 'USD', year: '2020', average: '0.92', yearEnd: '0.9' },
      { currency: 'USD', year: '2021', average: '0.85', yearEnd: '0.88' },
    ]);
    setField(host, 'Row 1, year-end rate', ' 0.9 ');
    expect(changes[1].rates).toEqual([{ ...usd, yearEnd: '0.9' }]);
  });

  it('leave figures as they are unless real terms are chosen', async () => {
    const fixture = TestBed.createComponent(PricePart);
    const host = fixture.nativeElement as HTMLElement;
    const changes: Partial<MappingEntry>[] = [];
    fixture.componentInstance.entryChanged.subscribe((change) => changes.push(change));
    fixture.componentRef.setInput('entry', entry);
    await fixture.whenStable();
    expect(host.querySelector('textarea')).toBeNull();
    host.querySelector<HTMLInputElement>('[type=checkbox]')?.click();
    expect(changes).toEqual([{ isReal: true }]);
    fixture.componentRef.setInput('entry', { ...entry, isReal: true });
    await fixture.whenStable();
    pasteInto(host, 'Year\tIndex\n2020\t104.2');
    expect(changes[1]).toEqual({ index: [{ year: '2020', value: '104.2' }] });
  });
});

describe('fiscal years', () => {
  it('have a rule, a usual month, and companies with another', async () => {
    const fixture = TestBed.createComponent(FiscalYearPart);
    const host = fixture.nativeElement as HTMLElement;
    const changes: MappingEntry['fiscalYears'][] = [];
    fixture.componentInstance.changed.subscribe((change) => changes.push(change));
    fixture.componentRef.setInput('fiscalYears', entry.fiscalYears);
    await fixture.whenStable();
    expect(host.textContent).toContain('a year from April 2022 to March 2023 is 2022');
    host.querySelectorAll<HTMLInputElement>('[type=radio]')[1].click();
    expect(changes[0].rule).toBe('year-of-most-months');
    pressIn(host, 'Add a company');
    expect(changes[1].companies).toEqual([{ company: '', endMonth: 12 }]);
    fixture.componentRef.setInput('fiscalYears', {
      ...entry.fiscalYears,
      companies: [{ company: 'Aldren SE', endMonth: 3 }],
    });
    await fixture.whenStable();
    host.querySelector<HTMLButtonElement>('[aria-label="Remove Aldren SE"]')?.click();
    expect(changes[2].companies).toEqual([]);
  });
});

describe('the rows to look at', () => {
  it('mark the cell, say why, and can be shown by kind', async () => {
    const fixture = TestBed.createComponent(ReviewTable);
    const host = fixture.nativeElement as HTMLElement;
    const cells = ['A', '2011', 'abc', '2', '3', '7', 'EUR'];
    fixture.componentRef.setInput('check', {
      ...flowCheck,
      findings: [
        {
          row: 3,
          column: 'mv',
          found: 'abc',
          code: 'not-a-number',
          detail: 'Expected a number.',
          isBlocking: true,
        },
        ...flowCheck.findings,
      ],
      findingCount: 2,
      reviewRows: [...flowCheck.reviewRows, { row: 3, cells, isTaken: false, isExcluded: false }],
    });
    fixture.componentRef.setInput('headers', flowDraft.headers);
    fixture.componentRef.setInput('usedHeaders', ['firm', 'fy', 'mv', 'capex', 'equity']);
    fixture.componentRef.setInput('yearHeader', 'fy');
    fixture.componentRef.setInput('mending', noMending);
    await fixture.whenStable();
    expect(host.querySelector('td.error')?.textContent.trim()).toBe('abc');
    expect(host.querySelector('td.caution')?.textContent.trim()).toBe('empty');
    const titles = [...host.querySelectorAll('thead th')].map((each) => each.textContent);
    expect(titles).toEqual(['Line', 'firm', 'fy', 'mv', 'capex', 'equity', 'Row']);
    pressIn(host, 'Not a number 1');
    await fixture.whenStable();
    const lines = [...host.querySelectorAll('tbody th')].map((each) => each.textContent);
    expect(lines).toEqual(['3']);
  });
});

describe('many rows to look at', () => {
  const found = (row: number, change: Partial<ImportFinding>): ImportFinding => ({
    ...{ row, column: 'fy', found: 'FY-19', code: 'year', detail: 'Expected a year.' },
    ...{ isBlocking: true, ...change },
  });

  async function show(findings: readonly ImportFinding[]): Promise<{
    readonly host: HTMLElement;
    readonly mending: () => FileMending;
    readonly press: (name: string) => Promise<void>;
  }> {
    const fixture = TestBed.createComponent(ReviewTable);
    const host = fixture.nativeElement as HTMLElement;
    let mending = noMending;
    const cells = ['A', 'FY-19', '1', '2', '3', '7', 'EUR'];
    const reviewRows = findings.map(({ row }) => ({
      ...{ row, cells, isTaken: false, isExcluded: false },
    }));
    const { length } = findings;
    const check = { ...flowCheck, findings: [...findings], findingCount: length, reviewRows };
    fixture.componentRef.setInput('check', check);
    fixture.componentRef.setInput('headers', flowDraft.headers);
    fixture.componentRef.setInput('usedHeaders', ['firm', 'fy', 'mv']);
    fixture.componentRef.setInput('yearHeader', 'fy');
    fixture.componentRef.setInput('mending', mending);
    fixture.componentInstance.mendingChanged.subscribe((changed) => {
      mending = changed;
      fixture.componentRef.setInput('mending', changed);
    });
    await fixture.whenStable();
    const press = async (name: string): Promise<void> => {
      pressIn(host, name);
      await fixture.whenStable();
    };
    return { host, mending: () => mending, press };
  }

  it('are left out at once, said, and taken again at once, the focus staying there', async () => {
    const { host, mending, press } = await show([
      found(2, { code: 'duplicate' }),
      found(3, { code: 'duplicate', sameAs: 2 }),
      found(4, { code: 'duplicate', sameAs: 2 }),
    ]);
    document.body.append(host);
    await press('Leave out the 2 later lines, keep the first of each: A company and year twice');
    expect(mending().excludedRows).toEqual([3, 4]);
    expect(host.querySelector('[role=status]')?.textContent).toContain('2 lines are left out.');
    expect(document.activeElement?.className).toBe('bulk');
    await press('Undo');
    expect(mending()).toEqual(noMending);
    expect(host.querySelector('[role=status]')?.textContent.trim()).toBe('');
    host.remove();
  });

  it('are mended by one text where they read the same', async () => {
    const { host, mending, press } = await show([found(2, {}), found(3, {}), found(4, {})]);
    expect(host.textContent).not.toContain('Use this for all');
    setField(host, 'Line 3, fy: reads', '2019');
    await new Promise((done) => setTimeout(done));
    await press('Use this for all 3 cells that read “FY-19”');
    expect(mending().cells.map(({ row, text }) => [row, text])).toEqual([
      [3, '2019'],
      [2, '2019'],
      [4, '2019'],
    ]);
    await press('Undo');
    expect(mending().cells.map(({ row }) => row)).toEqual([3]);
  });
});

describe('spellings and changes', () => {
  it('reads spellings as one under the chosen name, and apart again', async () => {
    const fixture = TestBed.createComponent(SpellingList);
    const host = fixture.nativeElement as HTMLElement;
    const mendings: FileMending[] = [];
    fixture.componentInstance.mendingChanged.subscribe((mending) => mendings.push(mending));
    fixture.componentRef.setInput('spellings', [
      [
        { company: 'Aldren SE', rows: 9 },
        { company: 'Aldren S.E.', rows: 1 },
      ],
    ]);
    fixture.componentRef.setInput('mending', noMending);
    await fixture.whenStable();
    expect(mendings).toEqual([]);
    pressIn(host, 'Read as one: Aldren SE');
    host.querySelectorAll<HTMLInputElement>('[type=radio]')[1].click();
    await fixture.whenStable();
    pressIn(host, 'Read as one: Aldren S.E.');
    expect(mendings.map(({ renames }) => renames)).toEqual([
      [{ from: 'Aldren S.E.', to: 'Aldren SE' }],
      [{ from: 'Aldren SE', to: 'Aldren S.E.' }],
    ]);
    fixture.componentRef.setInput('mending', mendings[0]);
    await fixture.whenStable();
    expect(host.textContent).toContain('Aldren S.E. is read as Aldren SE.');
    pressIn(host, 'Read apart again');
    expect(mendings[2]).toEqual(noMending);
  });

  it('reads a new name as the one that the panel has', async () => {
    const fixture = TestBed.createComponent(SpellingList);
    const host = fixture.nativeElement as HTMLElement;
    const mendings: FileMending[] = [];
    fixture.componentInstance.mendingChanged.subscribe((mending) => mendings.push(mending));
    fixture.componentRef.setInput('spellings', [
      [
        { company: 'Arvo', rows: 0 },
        { company: 'arvo', rows: 2 },
      ],
    ]);
    fixture.componentRef.setInput('mending', noMending);
    await fixture.whenStable();
    const names = [...host.querySelectorAll('.choice')].map((each) => each.textContent.trim());
    expect(names).toEqual(['Arvo in the panel', 'arvo 2 rows']);
    expect(host.querySelector('[type=radio]')).toBeNull();
    pressIn(host, 'Read as one: Arvo');
    expect(mendings[0].renames).toEqual([{ from: 'arvo', to: 'Arvo' }]);
  });

  it('lists each cell that would change, before and after', async () => {
    const fixture = TestBed.createComponent(ChangeTable);
    const host = fixture.nativeElement as HTMLElement;
    const cell = { company: 'Aldren SE', year: 2020, column: 'mv' } as const;
    const none = { column: null, before: null, after: null };
    fixture.componentRef.setInput('mapping', { currency: 'EUR', unit: 'millions' });
    fixture.componentRef.setInput('changes', {
      panelVersionId: uuid(1),
      number: 3,
      addedRows: 1,
      removedRows: 0,
      changedCells: 700,
      listed: [
        { ...cell, kind: 'changed-cell', before: 12, after: null },
        { ...cell, ...none, year: 2021, kind: 'added-row' },
      ],
    });
    await fixture.whenStable();
    const rows = [...host.querySelectorAll('tbody tr')].map((row) =>
      [...row.children].map((each) => each.textContent.trim()),
    );
    expect(rows).toEqual([
      ['Aldren SE', '2020', 'mv', '12.00', 'n/a'],
      ['Aldren SE', '2021', 'row comes', '', ''],
    ]);
    expect(host.querySelector('caption')?.textContent).toContain('money in EUR millions');
    expect(host.textContent).toContain('699 more are counted above');
  });
});
