import {
  CSP_NONCE,
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  ElementRef,
  afterRenderEffect,
  computed,
  effect,
  inject,
  input,
  linkedSignal,
  output,
  signal,
  untracked,
} from '@angular/core';
import type { PanelColumn } from '@contract';
import { AgGridAngular } from 'ag-grid-angular';
import type { GridApi, RowClassRules } from 'ag-grid-community';
import { NumberFormat } from '../ui/number-format';
import type { ShownProblem } from '../ui/problem';
import { followPointer } from './editing/block-pointer';
import { type GridPlace, rangeOf } from './editing/cell-block';
import { CellInput } from './editing/cell-input';
import type { ShownGrid } from './editing/copy-cells';
import { type GivenRows, givenRows } from './editing/given-rows';
import { GridBlock } from './editing/grid-block';
import { broughtUp, sparingFocus } from './editing/grid-focus';
import { type GivenCells, type GridSelection, rowsIn, selectionOf } from './editing/grid-selection';
import { type PanelEdits, cellKey, noEdits, rowKey } from './editing/panel-edits';
import { figureText, shiftOf } from './editing/shown-figure';
import type { SelectedBlock } from './editing/selected-table';
import { tellSelection } from './editing/told-selection';
import { gridColumns } from './grid-columns';
import { areSameColumns, gridColumnIds } from './grid-places';
import {
  gridColumn,
  gridHeadHeight,
  gridModules,
  gridOverlays,
  gridRowHeight,
  gridTheme,
  tabToNextCell,
} from './grid-settings';
import type { PanelRow } from './panel-rows';
import { type RowFocus, isAsked } from './row-focus';

/** The panel's rows: sorted, filtered, selected and copied by block; typed and pasted into where they may be changed. */
@Component({
  selector: 'kv-panel-grid',
  imports: [AgGridAngular],
  template: `
    <ag-grid-angular
      [modules]="modules"
      [theme]="theme"
      [styleNonce]="nonce"
      [style.block-size]="height()"
      [rowData]="shownRows()"
      [columnDefs]="columnDefs()"
      [defaultColDef]="defaultColDef"
      [rowClassRules]="rowClassRules()"
      [getRowId]="rowId"
      [overlayComponentParams]="overlays"
      [ensureDomOrder]="true"
      [readOnlyEdit]="true"
      [stopEditingWhenCellsLoseFocus]="true"
      [enterNavigatesVerticallyAfterEdit]="true"
      [tabToNextCell]="tabToNextCell"
      (gridReady)="begin($event.api)"
      (firstDataRendered)="isRendered.set(true)"
      (cellFocused)="block()?.followFocus()"
      (sortChanged)="block()?.collapse(); shownChanged.emit()"
      (rowDataUpdated)="tick.set(tick() + 1); shownChanged.emit()"
      (filterChanged)="block()?.collapse(); shownChanged.emit()"
      (cellEditRequest)="input.take($event)"
    />
  `,
  styleUrl: './panel-grid.css',
  host: {
    '[class.touch-selects]': 'touchSelects()',
    '(copy)': 'input.copy($event)',
    '(cut)': 'input.cut($event)',
    '(paste)': 'input.paste($event)',
  },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PanelGrid {
  readonly #numbers = inject(NumberFormat);
  readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;

  readonly rows = input.required<readonly PanelRow[]>();
  readonly columns = input.required<readonly PanelColumn[]>();
  /** Digits after the point, by column: the same whatever is shown. */
  readonly digits = input.required<readonly number[]>();
  readonly ownCompany = input<string | null>(null);
  /** The row to look at; each time it is asked for, a new object. */
  readonly focusedRow = input<RowFocus | null>(null);
  readonly mayChange = input(false);
  readonly edits = input<PanelEdits>(noEdits);
  /** By cell key. */
  readonly flags = input<ReadonlyMap<string, unknown>>(new Map());
  /** Whether a finger selects cells; else it scrolls. */
  readonly touchSelects = input(false);

  readonly cellsGiven = output<GivenCells>();
  /** Something that was typed or pasted is not taken. */
  readonly refused = output<ShownProblem>();
  readonly copied = output<string>();
  readonly selected = output<GridSelection | null>();
  /** Other rows are shown, or in another order. */
  readonly shownChanged = output();

  protected readonly modules = [...gridModules];
  protected readonly theme = gridTheme;
  protected readonly nonce = inject(CSP_NONCE, { optional: true }) ?? undefined;
  protected readonly overlays = gridOverlays;
  protected readonly defaultColDef = gridColumn;
  readonly #api = signal<GridApi<PanelRow> | null>(null);
  protected readonly block = signal<GridBlock | null>(null);
  protected readonly isRendered = signal(false);
  /** New each time that the grid has taken over rows. */
  protected readonly tick = signal(0);
  readonly #given = linkedSignal<readonly PanelRow[], GivenRows>({
    source: this.rows,
    computation: (rows, previous) =>
      givenRows(rows, untracked(this.#api) === null ? undefined : previous),
  });
  protected readonly shownRows = computed(() => this.#given().rowData);
  /** As high as its rows, up to what leaves the page readable. */
  protected readonly height = computed(() => {
    const rows = Math.max(3, this.rows().length) * gridRowHeight;
    return `min(${gridHeadHeight + rows + scrollBarHeight}px, 560px, 72vh)`;
  });
  protected readonly rowClassRules = computed<RowClassRules<PanelRow>>(() => {
    const own = this.ownCompany();
    const focus = this.focusedRow();
    return {
      'kv-own-row': ({ data }) => own !== null && data?.company === own,
      'kv-focused-row': ({ data }) => data !== undefined && isAsked(data, focus),
      'kv-added-row': ({ data }) => data !== undefined && this.edits().added.has(rowKey(data)),
    };
  });
  /** The same object as long as the columns are the same: the grid keeps its own with their widths and sorting. */
  readonly #columns = computed(() => this.columns(), { equal: areSameColumns });
  readonly #columnIds = computed(() => gridColumnIds(this.#columns()));
  protected readonly columnDefs = computed(() => {
    // Cells are written after this has run: a change of the person's sign has to make new columns, as one of the unit does.
    this.#numbers.negatives();
    const factor = this.#numbers.factor();
    const columns = this.#columns();
    return gridColumns({
      columns,
      digits: this.digits(),
      numbers: this.#numbers,
      marks: {
        block: () => this.block()?.drawnRange ?? null,
        isEdited: ({ company, year }, column) =>
          this.edits().cells.has(cellKey({ company, year, column })),
        isFlagged: ({ company, year }, column) =>
          this.flags().has(cellKey({ company, year, column })),
      },
      mayEdit: () => this.mayChange(),
      textOf: (row, column) => figureText(row.values[column], shiftOf(columns[column], factor)),
    });
  });

  /** What was asked for last, from outside or within. */
  readonly #wanted = linkedSignal(() => this.focusedRow());
  /** The focus that was followed: a change of filters does not lead there again. */
  #followed: RowFocus | null = null;
  /** The row of the block's head, and the rows among which it was seen there. */
  #held: { readonly key: string; readonly rows: readonly PanelRow[] } | null = null;
  protected readonly input = new CellInput({
    block: () => this.block(),
    columnIds: () => this.#columnIds(),
    shown: () => this.shown(),
    mayChange: () => this.mayChange(),
    moneyUnit: () => this.#numbers.unitLabel(),
    given: (cells) => {
      this.cellsGiven.emit(cells);
    },
    refused: (problem) => {
      this.refused.emit(problem);
    },
    copied: (words) => {
      this.copied.emit(words);
    },
  });

  constructor() {
    const stopFollowing = followPointer(this.host, {
      block: () => this.block(),
      columnIds: () => this.#columnIds(),
      touchSelects: () => this.touchSelects(),
    });
    const stopTelling = tellSelection(this.host);
    // Before the grid, which has plans of its own for some of the keys.
    const readKey = (event: KeyboardEvent): void => {
      this.input.readKey(event);
    };
    this.host.addEventListener('keydown', readKey, { capture: true });
    inject(DestroyRef).onDestroy(() => {
      stopFollowing();
      stopTelling();
      this.host.removeEventListener('keydown', readKey, { capture: true });
    });
    effect(() => {
      const { changed } = this.#given();
      const api = untracked(this.#api);
      for (const row of changed) api?.getRowNode(rowKey(row))?.updateData(row);
      if (changed.length > 0) this.shownChanged.emit();
    });
    // Cells whose value stays the same get or lose their marks with the edits and flags.
    effect(() => {
      this.edits();
      this.flags();
      this.#api()?.refreshCells({ force: true, suppressFlash: true });
    });
    // After rendering: the grid has its rows by then.
    afterRenderEffect({
      write: () => {
        this.rows();
        this.#keepPlace();
        const selection = selectionOf(this.block()?.block() ?? null, this.shown());
        this.#held = selection && { key: rowKey(selection), rows: this.shownRows() };
        this.selected.emit(selection);
      },
    });
    afterRenderEffect({
      write: () => {
        const focus = this.#wanted();
        this.rows();
        this.tick();
        if (focus === null || focus === this.#followed || !this.isRendered()) return;
        const api = this.#api();
        const place = api === null ? null : broughtUp(api, this.rows(), focus);
        if (place === null) return;
        this.goTo(place);
        this.#followed = focus;
      },
    });
  }

  /** What stands in the grid just now. */
  shown(): ShownGrid {
    const api = this.#api();
    return {
      rowCount: api?.getDisplayedRowCount() ?? 0,
      rowAt: (row) => api?.getDisplayedRowAtIndex(row)?.data,
      columns: this.columns(),
      factor: this.#numbers.factor(),
    };
  }

  goTo(place: GridPlace): void {
    this.block()?.goTo(place);
  }

  /** The rows that the selected block touches. */
  selectedRows(): readonly PanelRow[] {
    const block = this.block()?.block() ?? null;
    return block === null ? [] : rowsIn(rangeOf(block), this.shown());
  }

  /** The selected cells; null where none is. */
  selectedBlock(): SelectedBlock | null {
    const block = this.block()?.block() ?? null;
    return block === null ? null : { range: rangeOf(block), grid: this.shown() };
  }

  /** Goes to a cell once its row is in the grid. */
  look(focus: RowFocus): void {
    this.#wanted.set(focus);
  }

  /** Puts the focus back to the cell that had it, or to the first one. */
  focus(): void {
    if (this.shown().rowCount > 0) this.goTo(this.block()?.block()?.head ?? { row: 0, column: 0 });
  }

  protected readonly tabToNextCell = tabToNextCell;
  protected readonly rowId = ({ data }: { readonly data: PanelRow }): string => rowKey(data);

  protected begin(api: GridApi<PanelRow>): void {
    this.#api.set(api);
    this.block.set(new GridBlock(api, () => this.#columnIds()));
  }

  /** Other rows stand in the grid: the block stays with the row that it was in, where that is shown. */
  #keepPlace(): void {
    const [held, block] = [this.#held, this.block()];
    const head = block?.block()?.head;
    if (held === null || held.rows === this.shownRows() || block == null || head === undefined)
      return;
    const row = this.#api()?.getRowNode(held.key)?.rowIndex ?? null;
    if (row !== null && row !== head.row)
      sparingFocus(this.host, () => {
        block.goTo({ row, column: head.column });
      });
  }
}

/** Left free under the rows where the columns do not fit and scroll. */
const scrollBarHeight = 18;
