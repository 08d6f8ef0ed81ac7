import {
  CSP_NONCE,
  ChangeDetectionStrategy,
  Component,
  afterRenderEffect,
  computed,
  inject,
  input,
  signal,
} from '@angular/core';
import type { PanelColumn } from '@contract';
import { AgGridAngular } from 'ag-grid-angular';
import type { CellFocusedEvent, ColDef, GridApi, RowClassRules } from 'ag-grid-community';
import { NumberFormat } from '../ui/number-format';
import { gridColumns, kindOf } from './grid-columns';
import { gridHeadHeight, gridModules, gridRowHeight, gridTheme } from './grid-settings';
import { type PanelRow, columnTitle } from './panel-rows';

/** Which row is asked for. */
export interface RowFocus {
  /** Line of the imported file. */
  readonly line: number;
}

/** The panel's rows: sortable, filterable, with the line of the imported file that each came from. */
@Component({
  selector: 'kv-panel-grid',
  imports: [AgGridAngular],
  template: `
    <ag-grid-angular
      [modules]="modules"
      [theme]="theme"
      [styleNonce]="nonce"
      [style.block-size]="height()"
      [rowData]="shown()"
      [columnDefs]="columnDefs()"
      [defaultColDef]="defaultColDef"
      [rowClassRules]="rowClassRules()"
      [getRowId]="rowId"
      [overlayComponentParams]="overlays"
      [ensureDomOrder]="true"
      (gridReady)="api.set($event.api)"
      (firstDataRendered)="isRendered.set(true)"
      (cellFocused)="readCell($event)"
    />
    <p class="kv-caption">{{ cellWords() || hint }}</p>
  `,
  styleUrl: './panel-grid.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PanelGrid {
  readonly #numbers = inject(NumberFormat);

  /** Every row of the panel: the digits of a column come from all of it, whatever is shown. */
  readonly rows = input.required<readonly PanelRow[]>();
  readonly columns = input.required<readonly PanelColumn[]>();
  /** Leaves out the rows that have every figure. */
  readonly hasOnlyGaps = input(false);
  readonly ownCompany = input<string | null>(null);
  /** The row to look at; each time it is asked for, a new object. */
  readonly focusedRow = input<RowFocus | null>(null);

  protected readonly modules = [...gridModules];
  protected readonly theme = gridTheme;
  protected readonly nonce = inject(CSP_NONCE, { optional: true }) ?? undefined;
  protected readonly hint = 'Select a cell to read its full value and where it stands in the file.';
  protected readonly overlays = {
    noRows: { overlayText: 'No row lacks a figure' },
    noMatchingRows: { overlayText: 'No row fits the filters' },
  };
  protected readonly defaultColDef: ColDef<PanelRow> = {
    sortable: true,
    resizable: true,
    flex: 1,
    minWidth: 128,
  };
  protected readonly api = signal<GridApi<PanelRow> | null>(null);
  protected readonly isRendered = signal(false);
  protected readonly shown = computed(() =>
    this.hasOnlyGaps()
      ? this.rows().filter(({ values }) => values.includes(null))
      : [...this.rows()],
  );
  /** As high as its rows, up to what leaves the page readable. */
  protected readonly height = computed(() => {
    const rows = Math.max(3, this.shown().length) * gridRowHeight;
    return `min(${gridHeadHeight + rows + scrollBarHeight}px, 560px, 72vh)`;
  });
  protected readonly rowClassRules = computed<RowClassRules<PanelRow>>(() => {
    const own = this.ownCompany();
    const focused = this.focusedRow()?.line;
    return {
      'kv-own-row': ({ data }) => own !== null && data?.company === own,
      'kv-focused-row': ({ data }) => focused !== undefined && data?.fileRow === focused,
    };
  });
  protected readonly columnDefs = computed(() => {
    // Cells are written after this has run: a change of the person's sign has to make new columns, as one of the unit does.
    this.#numbers.negatives();
    return gridColumns(this.columns(), this.rows(), this.#numbers);
  });

  readonly #cell = signal<{ readonly row: PanelRow; readonly colId: string } | null>(null);
  /** The focused cell in words, its value with every digit. */
  protected readonly cellWords = computed(() => {
    const cell = this.#cell();
    if (cell === null) return '';
    const { row, colId } = cell;
    const place = `${row.company} ${row.year}, line ${row.fileRow} of the file`;
    const index = this.columns().findIndex((_, each) => `figure-${each}` === colId);
    if (index === -1) return place;
    const column = this.columns()[index];
    const kind = kindOf(column);
    const unit = kind === 'money' ? ` ${this.#numbers.unitLabel()}` : '';
    const value = row.values[index];
    const words = value === null ? 'no value' : `${this.#numbers.full(value, kind)}${unit}`;
    return `${columnTitle(column)} ${words} · ${place}, column “${column.name}”`;
  });

  /** The focus that was followed: a change of filters does not lead there again. */
  #followed: RowFocus | null = null;

  constructor() {
    // After rendering: the grid has its rows by then.
    afterRenderEffect({
      write: () => {
        const api = this.api();
        const focus = this.focusedRow();
        this.shown();
        if (api === null || focus === null || focus === this.#followed || !this.isRendered())
          return;
        const node = api.getRowNode(String(focus.line));
        // A filter of the grid may hide the row that is asked for: then the filters give way.
        if (node?.rowIndex === null) api.setFilterModel(null);
        if (node?.rowIndex == null) return;
        this.#followed = focus;
        api.redrawRows();
        api.ensureNodeVisible(node, 'middle');
        api.setFocusedCell(node.rowIndex, 'company');
      },
    });
  }

  protected readonly rowId = ({ data }: { readonly data: PanelRow }): string =>
    String(data.fileRow);

  protected readCell({ api, rowIndex, column }: CellFocusedEvent<PanelRow>): void {
    const row = rowIndex === null ? undefined : api.getDisplayedRowAtIndex(rowIndex)?.data;
    const colId = typeof column === 'string' ? column : column?.getColId();
    this.#cell.set(row === undefined || colId === undefined ? null : { row, colId });
  }
}

/** Left free under the rows where the columns do not fit and scroll. */
const scrollBarHeight = 18;
