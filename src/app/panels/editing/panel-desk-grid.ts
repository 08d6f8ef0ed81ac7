import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  computed,
  effect,
  inject,
  input,
  linkedSignal,
  output,
  signal,
  untracked,
  viewChild,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { PanelVersionReply, PanelVersionSummary } from '@contract';
import { type Flag, flagCodes } from '@panel-data';
import { Confirm } from '../../ui/confirm';
import { Mark } from '../../ui/mark';
import { NumberFormat } from '../../ui/number-format';
import { counted } from '../../ui/phrases';
import type { ShownProblem } from '../../ui/problem';
import { ProblemNotice } from '../../ui/problem-notice';
import { PanelGrid } from '../panel-grid';
import { type PanelRow, kindOf } from '../panel-rows';
import type { RowFocus } from '../row-focus';
import { CellLine, type LookedAtCell } from './cell-line';
import { editsWords } from './edit-words';
import { EditsStore, mostCells, mostRows } from './edits-store';
import { findCells } from './find-cells';
import { FindField } from './find-field';
import type { GivenCells, GridSelection } from './grid-selection';
import { PanelDialogs } from './panel-dialogs';
import { cellKey, rowKey } from './panel-edits';
import {
  type CellFlags,
  type RowFilter,
  filteredRows,
  flagCounts,
  flagNames,
  flagsAt,
} from './row-filter';
import { SaveBar } from './save-bar';
import { emptyDraft } from './save-lines';
import { UnsavedEdits } from './unsaved-edits';

/** The rows of a panel version: looked through, copied, mended and saved as the next version. */
@Component({
  selector: 'kv-panel-rows',
  imports: [CellLine, FindField, Mark, MatButton, PanelGrid, ProblemNotice, SaveBar],
  templateUrl: './panel-desk-grid.html',
  styleUrl: './panel-desk-grid.css',
  providers: [EditsStore, PanelDialogs],
  host: {
    '(window:beforeunload)': 'unsaved.holdBack($event)',
    '(keydown)': 'readKey($event)',
  },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PanelDeskGrid {
  readonly #numbers = inject(NumberFormat);
  readonly #confirm = inject(Confirm);
  readonly #dialogs = inject(PanelDialogs);
  protected readonly unsaved = inject(UnsavedEdits);
  protected readonly store = inject(EditsStore);

  readonly panel = input.required<PanelVersionReply>();
  /** Of every panel, in any order. */
  readonly versions = input.required<readonly PanelVersionSummary[]>();
  readonly ownCompany = input<string | null>(null);
  /** The row to look at; each time it is asked for, a new object. */
  readonly focusedRow = input<RowFocus | null>(null);
  /** By cell key; they may follow the edits. */
  readonly flags = input<CellFlags>(new Map());
  /** A flag in words. */
  readonly flagWords = input<(flag: Flag) => string>(({ facts }) => flagNames[facts.code]);
  readonly mayChange = input(false);
  /** The rows as they would be saved, each time they change. */
  readonly editedChanged = output<readonly PanelRow[]>();
  /** Id of the version that was made. */
  readonly saved = output<string>();

  protected readonly grid = viewChild.required(PanelGrid);
  private readonly findField = viewChild.required(FindField);

  protected readonly filter = signal<RowFilter>('all');
  protected readonly selection = signal<GridSelection | null>(null);
  protected readonly refusal = signal<ShownProblem | null>(null);
  /** What was done last, for the ear and the eye. */
  protected readonly said = signal('');
  /** New each time that the grid shows other rows. */
  protected readonly shownTick = signal(0);
  readonly #draft = signal(emptyDraft);

  readonly #isNewest = computed(() => {
    const { panelId, number } = this.panel().version;
    return !this.versions().some((other) => other.panelId === panelId && other.number > number);
  });
  /** What was changed in a version that is no longer the newest stays in hand. */
  protected readonly mayEdit = computed(
    () => this.mayChange() && (this.#isNewest() || this.store.count() > 0),
  );
  protected readonly rows = computed(() =>
    filteredRows(this.store.rows(), this.filter(), {
      edits: this.store.edits(),
      flags: this.flags(),
    }),
  );
  protected readonly digits = computed(() =>
    this.panel().columns.map((column, index) =>
      this.#numbers.columnDigits(
        this.store.savedRows().map(({ values }) => values[index]),
        kindOf(column),
      ),
    ),
  );
  protected readonly flagChoices = computed(() => {
    const counts = flagCounts(this.flags());
    const codes = flagCodes.filter((code) => counts.has(code) || code === this.filter());
    return codes.map((code) => ({
      code,
      words: `${flagNames[code]} (${(counts.get(code) ?? 0).toLocaleString('en')})`,
    }));
  });
  protected readonly words = computed(() => editsWords(this.store.edits()));
  protected readonly obstacle = computed(() => {
    const { cells, added, removed } = this.store.edits();
    if (cells.size > mostCells) return `One version takes at most ${counted(mostCells, 'cell')}.`;
    if (Math.max(added.size, removed.size) > mostRows)
      return `One version takes at most ${counted(mostRows, 'row')} added and as many removed.`;
    return this.store.rows().length === 0 ? 'A panel needs at least one row.' : '';
  });
  protected readonly isSavedRow = computed(() => {
    const at = this.selection();
    return at !== null && this.store.saved().has(rowKey(at));
  });
  protected readonly cell = computed(() => this.#lookedAt(this.selection()));
  protected readonly help = computed(() => {
    const copying =
      'Shift and arrows, or drag: select a block · Ctrl A: all figures · Ctrl C: copy · Ctrl F: find';
    if (this.mayEdit())
      return `${copying} · Type, Enter or F2: change · Ctrl V: paste · Delete: empty · Ctrl Z: undo`;
    return this.mayChange() ? `${copying} · Corrections are made in the newest version` : copying;
  });

  protected readonly findText = signal('');
  protected readonly finds = computed(() => {
    this.shownTick();
    const text = this.findText();
    return text === '' ? [] : findCells(text, untracked(this.grid).shown(), this.digits());
  });
  protected readonly findAt = linkedSignal({ source: this.finds, computation: () => 0 });

  constructor() {
    effect(() => {
      const panel = this.panel();
      untracked(() => {
        this.store.open(panel);
        this.#draft.set(emptyDraft);
        this.filter.set('all');
        this.closeRefusal();
      });
    });
    effect(() => {
      this.editedChanged.emit(this.store.rows());
    });
    effect(() => {
      this.unsaved.show(this.words());
    });
    // A row that is asked for must be in the grid, whatever was left out before.
    effect(() => {
      if (this.focusedRow() !== null) this.filter.set('all');
    });
    inject(DestroyRef).onDestroy(() => {
      this.unsaved.show('');
    });
  }

  protected choose(value: string): void {
    const codes: readonly RowFilter[] = ['all', 'gaps', 'edited', ...flagCodes];
    this.filter.set(codes.find((code) => code === value) ?? 'all');
  }

  protected give({ changes, done }: GivenCells): void {
    this.closeRefusal();
    const count = this.store.change(changes, done);
    this.said.set(
      count === 0 ? 'Nothing differs from before' : `${counted(count, 'cell')} ${done}`,
    );
  }

  protected refuse(problem: ShownProblem): void {
    this.refusal.set(problem);
  }

  protected closeRefusal(): void {
    this.refusal.set(null);
  }

  protected undo(): void {
    const words = this.store.undoWords();
    if (words === '') return;
    this.store.undo();
    this.said.set(`Undone: ${words}`);
  }

  protected redo(): void {
    const words = this.store.redoWords();
    if (words === '') return;
    this.store.redo();
    this.said.set(`Done again: ${words}`);
  }

  protected discard(): void {
    this.store.discard();
    this.said.set('Nothing is changed any more; Undo brings the changes back');
    this.grid().focus();
  }

  protected async addRow(): Promise<void> {
    const row = await this.#dialogs.askForRow({
      companies: [...new Set(this.store.rows().map(({ company }) => company))],
      company: this.selection()?.company ?? '',
      hasRow: (asked) => this.store.hasRow(asked),
    });
    if (row === undefined) return;
    this.filter.set('all');
    this.store.addRow(row);
    this.said.set(`Row ${row.company} ${row.year} added`);
    this.grid().look({ company: row.company, year: row.year, column: 0 });
  }

  protected async removeRows(): Promise<void> {
    const rows = this.grid().selectedRows();
    if (rows.length === 0) return;
    const full = rows.filter(({ values }) => values.some((value) => value !== null)).length;
    const isSure =
      full === 0 ||
      (await this.#confirm.ask({
        title: `Remove ${counted(rows.length, 'row')}?`,
        detail: `${counted(full, 'row')} of the panel ${full === 1 ? 'has' : 'have'} figures. Undo brings them back; saved versions keep them.`,
        action: rows.length === 1 ? 'Remove row' : 'Remove rows',
      }));
    if (!isSure) return;
    this.store.removeRows(rows);
    this.said.set(`${counted(rows.length, 'row')} removed`);
    this.grid().focus();
  }

  protected async save(): Promise<void> {
    const id = await this.#dialogs.save(this.panel(), this.#draft);
    if (id === undefined) return;
    this.unsaved.show(''); // who hears of it leads on to the version at once
    this.saved.emit(id);
  }

  protected openHistory(): void {
    const at = this.selection();
    if (at?.column === undefined) return;
    const place = { company: at.company, year: at.year, column: at.column };
    this.#dialogs.showHistory(this.panel(), place);
  }

  protected find(text: string): void {
    this.findText.set(text);
  }

  /** The focus stays where it is, so that the next one is a key away. */
  protected goToFind(way: 'next' | 'previous'): void {
    const count = this.finds().length;
    if (count === 0) return;
    const at = this.findAt();
    const next = way === 'next' ? (at % count) + 1 : at <= 1 ? count : at - 1;
    this.findAt.set(next);
    const before = document.activeElement;
    this.grid().goTo(this.finds()[next - 1]);
    if (before instanceof HTMLElement) before.focus();
  }

  protected readKey(event: KeyboardEvent): void {
    const isInField = event.target instanceof HTMLInputElement;
    if (isInField || event.altKey || !(event.ctrlKey || event.metaKey)) return;
    const key = event.key.toLowerCase();
    if (key === 'f') this.findField().focus();
    else if (key === 'z' && !event.shiftKey) this.undo();
    else if (key === 'y' || (key === 'z' && event.shiftKey)) this.redo();
    else return;
    event.preventDefault();
  }

  #lookedAt(at: GridSelection | null): LookedAtCell | null {
    if (at === null) return null;
    const { company, year, column, rows, columns } = at;
    const { cells, added } = this.store.edits();
    const key = rowKey(at);
    const row = this.store.saved().get(key);
    if (row === undefined && !added.has(key)) return null;
    const size = rows * columns === 1 ? '' : `${rows} × ${columns} cells selected`;
    const base = { company, year, fileRow: row?.fileRow ?? 0, size };
    if (column === undefined) return { ...base, figure: null, flags: [] };
    const before = row?.values[column] ?? null;
    const edit = cells.get(cellKey({ company, year, column }));
    return {
      ...base,
      figure: {
        column: this.panel().columns[column],
        value: edit === undefined ? before : edit.value,
        before: edit === undefined ? undefined : before,
      },
      flags: flagsAt(this.flags(), at, column).map(this.flagWords()),
    };
  }
}
