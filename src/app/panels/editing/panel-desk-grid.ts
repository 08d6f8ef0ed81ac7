import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  computed,
  effect,
  inject,
  input,
  output,
  signal,
  untracked,
  viewChild,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { PanelVersionReply, PanelVersionSummary } from '@contract';
import type { CoverageWindow, Flag } from '@panel-data';
import { Mark } from '../../ui/mark';
import { NumberFormat } from '../../ui/number-format';
import { counted } from '../../ui/phrases';
import type { ShownProblem } from '../../ui/problem';
import { ProblemNotice } from '../../ui/problem-notice';
import { PanelGrid } from '../panel-grid';
import { type PanelRow, kindOf } from '../panel-rows';
import type { RowFocus } from '../row-focus';
import { rowsWithin } from '../rows-within';
import { newestOf } from '../versions/version-words';
import { BlockSaid } from './block-said';
import { CellLine } from './cell-line';
import { EditTools } from './edit-tools';
import { editsWords } from './edit-words';
import { obstacleTo } from './edit-limits';
import { EditsStore } from './edits-store';
import { FindField } from './find-field';
import { GridFinds } from './grid-finds';
import { sparingFocus } from './grid-focus';
import type { GivenCells, GridSelection } from './grid-selection';
import { lookedAtCell } from './looked-at-cell';
import { PanelDialogs } from './panel-dialogs';
import { rowKey } from './panel-edits';
import { RowChanges } from './row-changes';
import { RowChoice } from './row-choice';
import { type CellFlags, type RowFilter, filteredRows, flagNames, flagsAt } from './row-filter';
import { SaveBar } from './save-bar';
import { TakeOut } from './take-out';
import { UnsavedEdits } from './unsaved-edits';

/** The rows of a panel version: looked through, copied, mended and saved as the next version. */
@Component({
  selector: 'kv-panel-rows',
  imports: [
    BlockSaid,
    CellLine,
    EditTools,
    FindField,
    Mark,
    MatButton,
    PanelGrid,
    ProblemNotice,
    RowChoice,
    SaveBar,
    TakeOut,
  ],
  templateUrl: './panel-desk-grid.html',
  styleUrl: './panel-desk-grid.css',
  providers: [EditsStore, PanelDialogs, RowChanges],
  host: {
    '(window:beforeunload)': 'unsaved.holdBack($event)',
    '(keydown)': 'readKey($event)',
  },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PanelDeskGrid {
  readonly #numbers = inject(NumberFormat);
  readonly #dialogs = inject(PanelDialogs);
  readonly #rowChanges = inject(RowChanges);
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
  /** Only its companies and years are shown; all where it is null. */
  readonly only = input<CoverageWindow | null>(null);
  /** A flag in words. */
  readonly flagWords = input<(flag: Flag) => string>(({ facts }) => flagNames[facts.code]);
  readonly mayChange = input(false);
  /** The rows as they would be saved, each time they change. */
  readonly editedChanged = output<readonly PanelRow[]>();
  /** Id of the version to go on with: one that was made, or that took the edits over. */
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
  /** Whether a finger selects cells; else it scrolls. */
  protected readonly touchSelects = signal(false);

  /** Id of a version newer than this one; null for the newest. */
  protected readonly newerId = computed(() => {
    const { version } = this.panel();
    const newest = newestOf(version, this.versions()).id;
    return newest === version.id ? this.store.newerId() : newest;
  });
  /** What was changed in a version that is no longer the newest stays in hand. */
  protected readonly mayEdit = computed(
    () =>
      this.mayChange() &&
      !this.store.isSaved() &&
      (this.newerId() === null || this.store.count() > 0),
  );
  readonly #within = computed(() =>
    rowsWithin(this.store.rows(), this.only(), {
      edits: this.store.edits(),
      asked: this.focusedRow(),
    }),
  );
  protected readonly rows = computed(() =>
    filteredRows(this.#within(), this.filter(), {
      edits: this.store.edits(),
      flags: this.flags(),
    }),
  );
  protected readonly digits = computed(
    () =>
      this.panel().columns.map((column, index) =>
        this.#numbers.columnDigits(
          this.store.savedRows().map(({ values }) => values[index]),
          kindOf(column),
        ),
      ),
    { equal: (left, right) => left.join() === right.join() },
  );
  protected readonly words = computed(() => editsWords(this.store.edits()));
  protected readonly obstacle = computed(() =>
    obstacleTo(this.store.edits(), this.store.rows().length),
  );
  protected readonly isSavedRow = computed(() => {
    const at = this.selection();
    return at !== null && this.store.saved().has(rowKey(at));
  });
  protected readonly cell = computed(() => {
    const at = this.selection();
    if (at === null) return null;
    const flags = flagsAt(this.flags(), at, at.column).map(this.flagWords());
    return lookedAtCell(at, this.store.edits(), this.store.saved(), this.panel().columns, flags);
  });
  protected readonly help = computed(() => {
    const copying =
      'Shift and arrows, or drag: select a block · Ctrl A: all figures · Ctrl C: copy · Ctrl F: find';
    if (this.mayEdit())
      return `${copying} · Type, Enter or F2: change · Ctrl V: paste · Delete: empty · Ctrl Z: undo`;
    return this.mayChange() ? `${copying} · Corrections are made in the newest version` : copying;
  });

  protected readonly finds = new GridFinds(
    () => {
      this.shownTick();
      return untracked(this.grid).shown();
    },
    () => this.digits(),
  );

  protected readonly selectedBlock = () => this.grid().selectedBlock();

  constructor() {
    effect(() => {
      const panel = this.panel();
      untracked(() => {
        this.store.open(panel);
        if (this.filter() === 'edited') this.filter.set('all');
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

  protected give({ changes, done }: GivenCells): void {
    this.closeRefusal();
    const count = this.store.change(changes, done);
    this.said.set(
      count === 0 ? 'Nothing differs from before' : `${counted(count, 'cell')} ${done}`,
    );
  }

  protected closeRefusal(): void {
    this.refusal.set(null);
  }

  /** What closes takes its button along: the focus goes to the cells. */
  protected dismissRefusal(): void {
    this.closeRefusal();
    this.grid().focus();
  }

  protected dismissRestored(): void {
    this.store.dismissRestored();
    this.grid().focus();
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
    const row = await this.#rowChanges.add(this.selection()?.company ?? '');
    if (row === undefined) return;
    this.filter.set('all');
    this.said.set(`Row ${row.company} ${row.year} added`);
    this.grid().look({ company: row.company, year: row.year, column: 0 });
  }

  protected async removeRows(): Promise<void> {
    const rows = this.grid().selectedRows();
    if (!(await this.#rowChanges.remove(rows))) return;
    this.said.set(`${counted(rows.length, 'row')} removed`);
    this.grid().focus();
  }

  protected async save(): Promise<void> {
    const result = await this.#dialogs.save(this.panel());
    if (result?.kind === 'saved') {
      this.said.set(`Version ${this.panel().version.number + 1} saved`);
      this.#goOn(result.panelVersionId);
    }
    if (result?.kind === 'carry') await this.carry();
  }

  protected async carry(): Promise<void> {
    const newerId = this.newerId();
    if (newerId === null || !(await this.#dialogs.carry(this.panel(), newerId))) return;
    this.said.set('The changes are carried onto the newer version');
    this.#goOn(newerId);
  }

  protected openHistory(): void {
    const at = this.selection();
    if (at?.column === undefined) return;
    const place = { company: at.company, year: at.year, column: at.column };
    this.#dialogs.showHistory(this.panel(), place);
  }

  /** The focus stays where it is, so that the next one is a key away. */
  protected goToFind(way: 'next' | 'previous'): void {
    const place = this.finds.step(way);
    if (place === undefined) return;
    const grid = this.grid();
    sparingFocus(grid.host, () => {
      grid.goTo(place);
    });
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

  /** Leads on to the version that has what was changed in this one. */
  #goOn(panelVersionId: string): void {
    this.grid().focus();
    this.unsaved.show(''); // who hears of it leaves this version at once
    this.saved.emit(panelVersionId);
  }
}
