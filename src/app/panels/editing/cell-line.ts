import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { NumberFormat } from '../../ui/number-format';
import { columnTitle, kindOf } from '../panel-rows';
import type { LookedAtCell } from './looked-at-cell';
import { figureWords, shiftOf } from './shown-figure';

/** The cell that has the focus, in words: its value with every digit, and where it stands. */
@Component({
  selector: 'kv-cell-line',
  template: `
    @if (cell(); as cell) {
      <p>
        @if (value(); as value) {
          <b>{{ value.title }}</b>&ngsp;<span class="kv-number">{{ value.words }}</span>
          {{ value.unit }}
          @if (value.before; as before) {
            <span>(saved: {{ before }})</span>
          }
          ·
        }
        {{ place() }}
        @if (cell.size) {
          · {{ cell.size }}
        }
      </p>
      @for (flag of cell.flags; track $index) {
        <p>{{ flag }}</p>
      }
      @if (cell.figure && hasHistory()) {
        <button type="button" class="kv-link" (click)="historyWanted.emit()">
          History of this cell
        </button>
      }
    } @else {
      <p>Select a cell to read its full value and where it stands in the file.</p>
    }
  `,
  styles: `
    :host {
      display: flex;
      flex-wrap: wrap;
      align-items: baseline;
      gap: 0 16px;
      min-block-size: 24px;
      color: var(--kv-soft-ink);
      font-size: 12px;
      overflow-wrap: anywhere;
    }
    b {
      font-weight: 500;
    }
    b,
    .kv-number {
      color: var(--kv-ink);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CellLine {
  readonly #numbers = inject(NumberFormat);

  readonly cell = input.required<LookedAtCell | null>();
  /** Whether the cell's row is in a saved version. */
  readonly hasHistory = input(true);
  readonly historyWanted = output();

  protected readonly value = computed(() => {
    const figure = this.cell()?.figure ?? null;
    if (figure === null) return null;
    const { column, value, before } = figure;
    const shift = shiftOf(column, this.#numbers.factor());
    const locale = this.#numbers.locale();
    return {
      title: columnTitle(column),
      words: figureWords(value, shift, locale),
      unit: kindOf(column) === 'money' && value !== null ? this.#numbers.unitLabel() : '',
      before: before === undefined ? null : figureWords(before, shift, locale),
    };
  });
  protected readonly place = computed(() => {
    const cell = this.cell();
    if (cell === null) return '';
    const { company, year, fileRow, figure } = cell;
    const line = fileRow === 0 ? 'row added by hand' : `line ${fileRow} of the file`;
    const column = figure === null ? '' : `, column “${figure.column.name}”`;
    return `${company} ${year}, ${line}${column}`;
  });
}
