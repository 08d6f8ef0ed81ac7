import {
  CSP_NONCE,
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
} from '@angular/core';
import type { PanelColumn } from '@contract';
import { AgGridAngular } from 'ag-grid-angular';
import type { ColDef, GridApi, RowClassRules, ValueFormatterParams } from 'ag-grid-community';
import { type FigureKind, NumberFormat } from '../ui/number-format';
import { gridModules, gridTheme } from './grid-settings';
import { type PanelRow, columnTitle } from './panel-rows';

/** The panel's rows: sortable, filterable, with the line of the imported file that each came from. */
@Component({
  selector: 'kv-panel-grid',
  imports: [AgGridAngular],
  template: `
    <ag-grid-angular
      [modules]="modules"
      [theme]="theme"
      [styleNonce]="nonce"
      [rowData]="shown()"
      [columnDefs]="columnDefs()"
      [defaultColDef]="defaultColDef"
      [rowClassRules]="rowClassRules()"
      [getRowId]="rowId"
      [overlayComponentParams]="overlays"
      [autoSizeStrategy]="sizing"
      [ensureDomOrder]="true"
      [suppressColumnVirtualisation]="true"
      (gridReady)="api.set($event.api)"
      (firstDataRendered)="isRendered.set(true)"
    />
  `,
  styleUrl: './panel-grid.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PanelGrid {
  readonly #numbers = inject(NumberFormat);

  readonly rows = input.required<readonly PanelRow[]>();
  readonly columns = input.required<readonly PanelColumn[]>();
  readonly ownCompany = input<string | null>(null);
  /** Line of the file whose row is to be looked at. */
  readonly focusedRow = input<number | null>(null);

  protected readonly modules = [...gridModules];
  protected readonly theme = gridTheme;
  protected readonly nonce = inject(CSP_NONCE, { optional: true }) ?? undefined;
  protected readonly sizing = { type: 'fitCellContents' } as const;
  protected readonly overlays = {
    noRows: { overlayText: 'No row lacks a figure' },
    noMatchingRows: { overlayText: 'No row fits the filters' },
  };
  protected readonly defaultColDef: ColDef<PanelRow> = { sortable: true, resizable: true };
  protected readonly api = signal<GridApi<PanelRow> | null>(null);
  protected readonly isRendered = signal(false);
  protected readonly shown = computed(() => [...this.rows()]);

  protected readonly rowClassRules = computed<RowClassRules<PanelRow>>(() => {
    const own = this.ownCompany();
    const focused = this.focusedRow();
    return {
      'kv-own-row': ({ data }) => own !== null && data?.company === own,
      'kv-focused-row': ({ data }) => focused !== null && data?.fileRow === focused,
    };
  });

  protected readonly columnDefs = computed<ColDef<PanelRow>[]>(() => [
    {
      colId: 'company',
      headerName: 'Company',
      field: 'company',
      filter: 'agTextColumnFilter',
      minWidth: 120,
    },
    { colId: 'year', headerName: 'Year', field: 'year', ...whole },
    ...this.columns().map((column, index) => this.#figureColumn(column, index)),
    { colId: 'fileRow', headerName: 'Line of file', field: 'fileRow', ...whole },
  ]);

  constructor() {
    effect(() => {
      const api = this.api();
      const row = this.focusedRow();
      if (api === null || row === null || !this.isRendered()) return;
      const node = api.getRowNode(String(row));
      api.redrawRows();
      if (node === undefined || node.rowIndex === null) return;
      api.ensureNodeVisible(node, 'middle');
      api.setFocusedCell(node.rowIndex, 'company');
    });
  }

  protected readonly rowId = ({ data }: { readonly data: PanelRow }): string =>
    String(data.fileRow);

  #figureColumn(column: PanelColumn, index: number): ColDef<PanelRow> {
    const kind: FigureKind = column.role === 'other' ? 'plain' : 'money';
    const values = this.rows().map((row) => row.values[index]);
    const digits = this.#numbers.columnDigits(values, kind);
    const format = (value: number | null | undefined) => this.#numbers.figure(value, kind, digits);
    return {
      colId: `figure-${index}`,
      headerName: columnTitle(column),
      valueGetter: ({ data }) => data?.values[index] ?? null,
      valueFormatter: ({ value }: ValueFormatterParams<PanelRow, number | null>) => format(value),
      filter: 'agNumberColumnFilter',
      // What a person types is in the unit that is shown.
      filterValueGetter: ({ data }) => {
        const value = data?.values[index] ?? null;
        return value === null ? null : this.#numbers.shown(value, kind);
      },
      headerClass: 'kv-number-header',
      cellClass: 'kv-number-cell',
      cellClassRules: { 'kv-missing-cell': ({ value }) => value === null },
    };
  }
}

const whole: ColDef<PanelRow> = {
  filter: 'agNumberColumnFilter',
  headerClass: 'kv-number-header',
  cellClass: 'kv-number-cell',
};
