import { provideHttpClient } from '@angular/common/http';
import { provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import type { PanelColumn } from '@contract';
import { noEdits } from '../editing/panel-edits';
import { type RowFilter, filteredRows } from '../editing/row-filter';
import type { PanelRow } from '../panel-rows';
import { DismissalsStore } from './dismissals-store';
import { FlagsStore } from './flags-store';

const columns: PanelColumn[] = [
  { name: 'mv', role: 'marketValue' },
  { name: 'capex', role: 'capex' },
  { name: 'equity', role: 'bookEquity' },
];

function row(company: string, year: number, ...values: (number | null)[]): PanelRow {
  return { fileRow: 2, company, year, values };
}

const rows: readonly PanelRow[] = [
  row('Kesdrin', 2010, 812, 40.5, 400),
  row('Nordwerk AG', 2010, 100, 5.5, 51),
  row('Nordwerk AG', 2012, 104, 5.75, 52),
  row('NORDWERK', 2013, 108, 5.9, 53),
  row('Velmara', 2010, 812, 40.5, null),
];

describe('the flags of the rows on the screen', () => {
  async function lookedThrough(): Promise<FlagsStore> {
    TestBed.configureTestingModule({
      providers: [provideHttpClient(), provideHttpClientTesting(), DismissalsStore, FlagsStore],
    });
    const store = TestBed.inject(FlagsStore);
    store.lookThrough(rows, columns, null);
    while (store.flags() === null) await new Promise((resolve) => setTimeout(resolve, 10));
    return store;
  }

  it('find the rows that stand in twice, and the companies', async () => {
    const flags = (await lookedThrough()).byCell();
    const shown = (filter: RowFilter): string[] =>
      filteredRows(rows, filter, { edits: noEdits, flags }).map(
        ({ company, year }) => `${company} ${year}`,
      );
    expect(shown('duplicate')).toEqual([
      'Kesdrin 2010',
      'Nordwerk AG 2010',
      'NORDWERK 2013',
      'Velmara 2010',
    ]);
    expect(shown('missing')).toEqual(['Velmara 2010']);
  });

  it('count figures, neither what is missing nor names nor years without a row', async () => {
    const store = await lookedThrough();
    expect(store.flags()?.open.map(({ facts }) => facts.code)).toContain('year-gap');
    expect(store.figuresToLookAt()).toBe(4);
  });
});
