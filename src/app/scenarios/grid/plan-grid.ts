import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  Injector,
  afterNextRender,
  computed,
  inject,
  input,
  linkedSignal,
  output,
  signal,
} from '@angular/core';
import type { FamiliarRange } from '@prediction';
import { blockText } from '../../ui/block-text';
import { type FigureKind, NumberFormat } from '../../ui/number-format';
import type { PlannedAmount } from '../../ui/plan/change-asked';
import type { BadCell, PastePlace } from '../../ui/plan/paste-amounts';
import { capitalised } from '../../ui/plan/plan-words';
import type { PlannedYear } from '../../ui/plan/read-plan';
import { regressorKind } from '../../ui/plan/regressor-labels';
import { readFigures } from '../../ui/read-figures';
import { type GridPlace, blockBetween, isInBlock, movedPlace } from './grid-cursor';

/** A block from the clipboard, and the cell that its first one goes to. */
export interface PastedText {
  readonly text: string;
  readonly at: PastePlace;
}

const familiarWords: Readonly<Record<FamiliarRange['kind'], string>> = {
  inside: 'inside',
  edge: 'at the edge',
  outside: 'outside',
};

/**
 * The plan as a grid, years down and regressors across: arrow keys lead from cell to cell, typing, Enter or F2 edits,
 * Shift selects a block, and blocks come and go by the clipboard.
 */
@Component({
  selector: 'kv-plan-grid',
  templateUrl: './plan-grid.html',
  styleUrl: './plan-grid.css',
  host: {
    '(keydown)': 'press($event)',
    '(copy)': 'copy($event)',
    '(paste)': 'paste($event)',
  },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanGrid {
  readonly #host = inject<ElementRef<HTMLElement>>(ElementRef);
  readonly #injector = inject(Injector);
  protected readonly numbers = inject(NumberFormat);

  readonly labels = input.required<readonly string[]>();
  readonly plan = input.required<readonly PlannedYear[]>();
  /** Where the years lie that the model can read. */
  readonly familiar =
    input.required<readonly { readonly year: number; readonly familiar: FamiliarRange }[]>();
  /** Regressors whose amounts a rule gives. */
  readonly ruled = input<readonly number[]>([]);
  /** Pasted cells that were no amounts. */
  readonly bad = input<readonly BadCell[]>([]);
  /** Whether only amounts above zero can be read, as where logs are taken of them. */
  readonly isAboveZero = input(false);
  readonly amountChanged = output<PlannedAmount>();
  readonly pasted = output<PastedText>();
  readonly undoWanted = output();
  readonly redoWanted = output();

  readonly #size = computed(() => ({ rows: this.plan().length, columns: this.labels().length }));
  readonly #at = linkedSignal<{ rows: number; columns: number }, GridPlace>({
    source: this.#size,
    computation: ({ rows }, before) =>
      before === undefined
        ? { row: 0, column: 0 }
        : { ...before.value, row: Math.min(before.value.row, rows - 1) },
  });
  readonly #anchor = signal<GridPlace | null>(null);
  readonly #isEditing = signal(false);
  readonly #block = computed(() => blockBetween(this.#anchor() ?? this.#at(), this.#at()));
  protected readonly entry = signal('');
  protected readonly complaint = signal('');
  protected readonly names = computed(() => this.labels().map(capitalised));
  protected readonly digits = computed(() =>
    this.labels().map((_, k) =>
      this.numbers.columnDigits(
        this.plan().map(({ values }) => values[k]),
        this.kindOf(k),
      ),
    ),
  );

  /** The block that is selected, or else the whole plan, as a spreadsheet reads it: every digit, in the unit shown. */
  text(isWhole = false): string {
    const { from, to } = isWhole
      ? blockBetween(
          { row: 0, column: 0 },
          { row: this.#size().rows, column: this.#size().columns },
        )
      : this.#block();
    const rows = this.plan().slice(from.row, to.row + 1);
    return blockText(
      rows.map(({ values }) =>
        values
          .slice(from.column, to.column + 1)
          .map((value, index) => this.#exact(value, from.column + index)),
      ),
    );
  }

  protected kindOf(regressor: number): FigureKind {
    return regressorKind(regressor);
  }

  protected isAt(row: number, column: number): boolean {
    return this.#at().row === row && this.#at().column === column;
  }

  protected isSelected(row: number, column: number): boolean {
    return isInBlock(this.#block(), { row, column });
  }

  protected isEdited(row: number, column: number): boolean {
    return this.#isEditing() && this.isAt(row, column);
  }

  protected isRuled(regressor: number): boolean {
    return this.ruled().includes(regressor);
  }

  protected badReason(row: number, column: number): string | null {
    const { year } = this.plan()[row];
    const cell = this.bad().find((each) => each.year === year && each.regressor === column);
    return cell === undefined ? null : `${cell.reason}; found ${cell.text || 'nothing'}`;
  }

  protected familiarOf(year: number): string {
    const found = this.familiar().find((each) => each.year === year);
    return found === undefined ? 'no figures' : familiarWords[found.familiar.kind];
  }

  protected choose(row: number, column: number, isFurther: boolean): void {
    if (this.isEdited(row, column)) return;
    this.#go({ row, column }, isFurther);
  }

  protected press(event: KeyboardEvent): void {
    if (this.#isEditing()) return;
    const isCommand = event.ctrlKey || event.metaKey;
    const place = movedPlace(event, this.#at(), this.#size());
    if (place !== undefined) this.#go(place, event.shiftKey);
    else if (event.key === 'Enter' || event.key === 'F2') this.edit();
    else if (isCommand && event.key.toLowerCase() === 'z')
      (event.shiftKey ? this.redoWanted : this.undoWanted).emit();
    else if (isCommand && event.key.toLowerCase() === 'y') this.redoWanted.emit();
    else if (isCommand && event.key.toLowerCase() === 'a') this.#selectAll();
    else if (!isCommand && !event.altKey && /^[\d.,(+\-−]$/.test(event.key)) this.#open(event.key);
    else return;
    event.preventDefault();
  }

  protected pressInBox(event: KeyboardEvent, text: string): void {
    event.stopPropagation();
    if (event.key === 'Escape') this.#close();
    else if (event.key === 'Enter') {
      if (!this.#take(text)) return;
      const { row, column } = this.#at();
      this.#close();
      this.#go({ row: Math.min(row + 1, this.#size().rows - 1), column }, false);
    }
  }

  /** A box that is left takes what stands in it; what is no amount is put back, and said. */
  protected leave(text: string): void {
    if (!this.#isEditing()) return;
    this.#take(text);
    this.#isEditing.set(false);
  }

  protected edit(): void {
    const { row, column } = this.#at();
    this.#open(this.#exact(this.plan()[row].values[column], column));
  }

  protected copy(event: ClipboardEvent): void {
    if (this.#isEditing()) return;
    event.clipboardData?.setData('text/plain', this.text());
    event.preventDefault();
  }

  protected paste(event: ClipboardEvent): void {
    if (this.#isEditing()) return;
    const { from } = this.#block();
    const text = event.clipboardData?.getData('text/plain') ?? '';
    event.preventDefault();
    if (text.trim() === '') return;
    this.complaint.set('');
    this.pasted.emit({
      text,
      at: { year: this.plan()[from.row].year, regressor: from.column },
    });
  }

  #selectAll(): void {
    this.#anchor.set({ row: 0, column: 0 });
    const { rows, columns } = this.#size();
    this.#at.set({ row: rows - 1, column: columns - 1 });
    this.#focus();
  }

  #go(place: GridPlace, isFurther: boolean): void {
    this.#anchor.set(isFurther ? (this.#anchor() ?? this.#at()) : null);
    this.#at.set(place);
    this.#focus();
  }

  #open(text: string): void {
    this.entry.set(text);
    this.complaint.set('');
    this.#anchor.set(null);
    this.#isEditing.set(true);
    this.#focus();
  }

  #close(): void {
    this.complaint.set('');
    this.#isEditing.set(false);
    this.#focus();
  }

  #take(text: string): boolean {
    const { row, column } = this.#at();
    const { year, values } = this.plan()[row];
    if (text === this.#exact(values[column], column)) return true;
    const shown = readFigures([[text]])[0][0];
    const name = `${this.names()[column]} FY${year}`;
    if (typeof shown !== 'number') {
      this.complaint.set(`${name}: expected a number; found ${text.trim() || 'nothing'}`);
      return false;
    }
    if (this.isAboveZero() && !(shown > 0)) {
      this.complaint.set(
        `${name}: expected an amount above zero, for the fit reads logs; found ${text.trim()}`,
      );
      return false;
    }
    this.complaint.set('');
    const value = this.kindOf(column) === 'money' ? this.numbers.toPanelUnit(shown) : shown;
    this.amountChanged.emit({ year, regressor: column, value });
    return true;
  }

  #exact(value: number, regressor: number): string {
    return String(Number(this.numbers.shown(value, this.kindOf(regressor)).toPrecision(15)));
  }

  /** The box of the cell while it is edited, and else the cell. */
  #focus(): void {
    afterNextRender(
      () => {
        const { row, column } = this.#at();
        const cell = this.#host.nativeElement.querySelector<HTMLElement>(
          `[data-place="${row} ${column}"]`,
        );
        (cell?.querySelector('input') ?? cell)?.focus();
      },
      { injector: this.#injector },
    );
  }
}
