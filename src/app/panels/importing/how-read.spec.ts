import { type ComponentFixture, TestBed } from '@angular/core/testing';
import type { ImportReply, TableReading } from '@contract';
import { HowRead } from './how-read';
import { flowDraft } from './testing/import-replies';

const workbook: ImportReply = {
  ...flowDraft,
  fileName: 'flow.xlsx',
  sheets: [
    { name: 'Market value', rows: 12, columns: 19 },
    { name: 'Capex', rows: 1200, columns: 19 },
  ],
  reading: { ...flowDraft.reading, sheet: 'Market value' },
};

describe('how a file is read', () => {
  let fixture: ComponentFixture<HowRead>;
  let asked: TableReading[];

  async function show(draft: ImportReply): Promise<HTMLElement> {
    fixture = TestBed.createComponent(HowRead);
    asked = [];
    fixture.componentInstance.readingChanged.subscribe((reading) => asked.push(reading));
    fixture.componentRef.setInput('draft', draft);
    await fixture.whenStable();
    return fixture.nativeElement as HTMLElement;
  }

  function choose(host: HTMLElement, label: string, value: string): void {
    const field = [...host.querySelectorAll('label')].find((each) =>
      each.textContent.trim().startsWith(label),
    );
    const select = field?.querySelector('select');
    if (!select) throw new Error(`expected a choice “${label}”; found none`);
    select.value = value;
    select.dispatchEvent(new Event('change'));
  }

  it('says what was recognised, and offers no sheets for a CSV file', async () => {
    const host = await show(flowDraft);
    expect(host.textContent).toContain(
      'Read from the file with the columns named in line 1: 33 rows of a company and year.',
    );
    expect(host.textContent).not.toContain('Sheet (rows × columns)');
    expect(host.textContent).not.toContain('a sheet for each variable');
  });

  it('says that the text is no UTF-8, and lets that be corrected', async () => {
    const reading = { ...flowDraft.reading, encoding: 'windows-1252' } as const;
    const host = await show({ ...flowDraft, reading });
    expect(host.textContent).toContain(
      'Read from the file, its text in Windows-1252, with the columns named in line 1',
    );
    choose(host, 'Encoding of the text', 'utf-16');
    expect(asked).toEqual([{ ...reading, encoding: 'utf-16' }]);
  });

  it('offers no encoding for a workbook', async () => {
    const host = await show(workbook);
    expect(host.textContent).not.toContain('Encoding of the text');
  });

  it('chooses another sheet, with its size beside its name', async () => {
    const host = await show(workbook);
    expect(host.textContent).toContain('Capex (1,200 × 19)');
    choose(host, 'Sheet', 'Capex');
    expect(asked).toEqual([{ ...workbook.reading, sheet: 'Capex', headerRow: 1 }]);
  });

  it('chooses the line that names the columns', async () => {
    const host = await show(workbook);
    host.querySelectorAll<HTMLInputElement>('[name=headerRow]')[1].click();
    expect(asked.map(({ headerRow }) => headerRow)).toEqual([2]);
  });

  it('chooses years in columns, and the column that names the variable', async () => {
    const host = await show(workbook);
    choose(host, 'Layout', 'years-in-columns');
    expect(asked[0].layout).toEqual({ kind: 'years-in-columns', item: null });
    fixture.componentRef.setInput('draft', { ...workbook, reading: asked[0] });
    await fixture.whenStable();
    choose(host, 'Column that names the variable', 'staff');
    expect(asked[1].layout).toEqual({ kind: 'years-in-columns', item: 'staff' });
  });

  it('chooses a sheet a variable: all at first, then without one', async () => {
    const host = await show(workbook);
    choose(host, 'Layout', 'sheet-a-variable');
    expect(asked[0].layout).toEqual({
      kind: 'sheet-a-variable',
      sheets: ['Market value', 'Capex'],
    });
    fixture.componentRef.setInput('draft', { ...workbook, reading: asked[0] });
    await fixture.whenStable();
    host.querySelectorAll<HTMLInputElement>('[type=checkbox]')[0].click();
    expect(asked[1].layout).toEqual({ kind: 'sheet-a-variable', sheets: ['Capex'] });
  });
});
