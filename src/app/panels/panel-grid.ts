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
import type {
  CellEditRequestEvent,
  CellPosition,
  ColDef,
  GridApi,
  RowClassRules,
  TabToNextCellParams,
} from 'ag-grid-community';
import { NumberFormat } from '../ui/number-format';
import type { ShownProblem } from '../ui/problem';
import { blockCommand } from './editing/block-keys';
import { followPointer } from './editing/block-pointer';
import { type GridPlace, rangeOf } from './editing/cell-block';
import { type ShownGrid, copiedText } from './editing/copy-cells';
import { changedRows } from './editing/changed-rows';
import { GridBlock } from './editing/grid-block';
import {
  type GivenCells,
  type GridSelection,
  emptiedCells,
  rowsIn,
  selectionOf,
  sizeWords,
} from './editing/grid-selection';
import { type PanelEdits, cellKey, noEdits, rowKey } from './editing/panel-edits';
import { pastedCells, typedFigure } from './editing/paste-cells';
import { figureText, shiftOf } from './editing/shown-figure';
import { gridColumns } from './grid-columns';
import { figureAt, gridColumnIds, leadingColumns } from './grid-places';
import { gridHeadHeight, gridModules, gridRowHeight, gridTheme } from './grid-settings';
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
      (cellEditRequest)="take($event)"
    />
  `,
  styleUrl: './panel-grid.css',
  host: {
    '(copy)': 'copy($event)',
    '(cut)': 'cut($event)',
    '(paste)': 'paste($event)',
  },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PanelGrid {
  readonly #numbers = inject(NumberFormat);
  readonly #host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;

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
  protected readonly overlays = {
    noRows: { overlayText: 'No row fits what is chosen above' },
    noMatchingRows: { overlayText: 'No row fits the filters' },
  };
  protected readonly defaultColDef: ColDef<PanelRow> = {
    sortable: true,
    resizable: true,
    flex: 1,
    minWidth: 128,
  };
  readonly #api = signal<GridApi<PanelRow> | null>(null);
  protected readonly block = signal<GridBlock | null>(null);
  protected readonly isRendered = signal(false);
  /** New each time that the grid has taken over rows. */
  protected readonly tick = signal(0);
  /**
   * What the grid was given, and the rows whose figures changed since: comparing 200,000 rows by their ids at each
   * change of a cell would be felt. A row that changes keeps its place, also where the grid is sorted by it.
   */
  readonly #given = linkedSignal<readonly PanelRow[], GivenRows>({
    source: this.rows,
    computation: (rows, previous) => {
      const isFirst = previous === undefined || untracked(this.#api) === null;
      const changed = isFirst ? null : changedRows(previous.source, rows);
      return changed === null
        ? { rowData: [...rows], changed: [] }
        : { rowData: previous?.value.rowData ?? [], changed };
    },
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
  readonly #columnIds = computed(() => gridColumnIds(this.columns()));
  protected readonly columnDefs = computed(() => {
    // Cells are written after this has run: a change of the person's sign has to make new columns, as one of the unit does.
    this.#numbers.negatives();
    const factor = this.#numbers.factor();
    const columns = this.columns();
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

  constructor() {
    const stopFollowing = followPointer(
      this.#host,
      () => this.block(),
      () => this.#columnIds(),
    );
    // Before the grid, which has plans of its own for some of the keys.
    const readKey = (event: KeyboardEvent): void => {
      this.#readKey(event);
    };
    this.#host.addEventListener('keydown', readKey, { capture: true });
    inject(DestroyRef).onDestroy(() => {
      stopFollowing();
      this.#host.removeEventListener('keydown', readKey, { capture: true });
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
        this.selected.emit(selectionOf(this.block()?.block() ?? null, this.shown()));
      },
    });
    afterRenderEffect({
      write: () => {
        const focus = this.#wanted();
        this.rows();
        this.tick();
        if (focus === null || focus === this.#followed || !this.isRendered()) return;
        if (this.#follow(focus)) this.#followed = focus;
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

  /** Goes to a cell once its row is in the grid. */
  look(focus: RowFocus): void {
    this.#wanted.set(focus);
  }

  /** Puts the focus back to the cell that had it. */
  focus(): void {
    const head = this.block()?.block()?.head;
    if (head !== undefined) this.goTo(head);
  }

  protected readonly rowId = ({ data }: { readonly data: PanelRow }): string => rowKey(data);

  /** Tab leaves the grid, as in any grid of the page; while a cell is edited it goes on to the next one. */
  protected readonly tabToNextCell = ({
    editing,
    nextCellPosition,
  }: TabToNextCellParams<PanelRow>): CellPosition | boolean =>
    editing ? (nextCellPosition ?? true) : false;

  protected begin(api: GridApi<PanelRow>): void {
    this.#api.set(api);
    this.block.set(new GridBlock(api, () => this.#columnIds()));
  }

  protected take({ data, column, newValue }: CellEditRequestEvent<PanelRow, unknown>): void {
    const figure = figureAt(this.#columnIds().indexOf(column.getColId()), this.columns());
    if (figure === undefined || typeof newValue !== 'string') return;
    const outcome = typedFigure(newValue, data, figure, this.shown());
    if ('problem' in outcome) this.refused.emit(outcome.problem);
    else
      this.cellsGiven.emit({
        changes: [outcome],
        done: outcome.value === null ? 'emptied' : 'typed',
      });
  }

  protected copy(event: ClipboardEvent): void {
    const block = this.#isAtCell(event) ? this.block()?.block() : null;
    if (block == null || event.clipboardData === null) return;
    const range = rangeOf(block);
    event.clipboardData.setData('text/plain', copiedText(range, this.shown()));
    event.preventDefault();
    const size = sizeWords(range);
    this.copied.emit(`${size} copied at full precision, money in ${this.#numbers.unitLabel()}`);
  }

  protected cut(event: ClipboardEvent): void {
    this.copy(event);
    if (event.defaultPrevented) this.#empty('cut');
  }

  protected paste(event: ClipboardEvent): void {
    const block = this.#isAtCell(event) ? this.block()?.block() : null;
    const text = event.clipboardData?.getData('text/plain') ?? '';
    if (block == null || text === '' || !this.mayChange()) return;
    event.preventDefault();
    const outcome = pastedCells(text, rangeOf(block), this.shown());
    if (outcome.kind === 'refused') {
      this.refused.emit(outcome.problem);
      return;
    }
    this.cellsGiven.emit({ changes: outcome.changes, done: 'pasted' });
    this.block()?.select(outcome.range);
  }

  #empty(done: 'emptied' | 'cut'): void {
    const block = this.block()?.block();
    if (block == null || !this.mayChange()) return;
    this.cellsGiven.emit({ changes: emptiedCells(rangeOf(block), this.shown()), done });
  }

  #readKey(event: KeyboardEvent): void {
    const command = this.#isAtCell(event) ? blockCommand(event) : undefined;
    const block = this.block();
    if (command === undefined || block === null) return;
    if (command.kind === 'collapse' && block.drawnRange === null) return;
    event.preventDefault();
    event.stopPropagation();
    block.followFocus();
    if (command.kind === 'draw') block.draw(command.direction, command.far);
    else if (command.kind === 'collapse') block.collapse();
    else if (command.kind === 'empty') this.#empty('emptied');
    else if (this.columns().length > 0 && block.extent.rows > 0)
      block.select({
        firstRow: 0,
        lastRow: block.extent.rows - 1,
        firstColumn: leadingColumns,
        lastColumn: leadingColumns + this.columns().length - 1,
      });
  }

  /** Not in the field of a cell that is being edited, nor in the header. */
  #isAtCell({ target }: Event): boolean {
    return target instanceof Element && target.matches('.ag-cell');
  }

  /** @returns whether the row is there. */
  #follow(focus: RowFocus): boolean {
    const api = this.#api();
    const asked = this.rows().find((row) => isAsked(row, focus));
    const node = asked === undefined ? undefined : api?.getRowNode(rowKey(asked));
    if (api === null || node === undefined) return false;
    // A filter of the grid may hide the row that is asked for: then the filters give way.
    if (node.rowIndex === null) api.setFilterModel(null);
    if (node.rowIndex === null) return false;
    api.redrawRows();
    api.ensureNodeVisible(node, 'middle');
    const { column } = focus;
    this.goTo({ row: node.rowIndex, column: column === undefined ? 0 : leadingColumns + column });
    return true;
  }
}

interface GivenRows {
  readonly rowData: PanelRow[];
  readonly changed: readonly PanelRow[];
}

/** Left free under the rows where the columns do not fit and scroll. */
const scrollBarHeight = 18;
