import { NgTemplateOutlet } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { type FigureKind, NumberFormat } from './number-format';

/**
 * One figure of a table or list, with its interval when bounds are given. With a `figure` key it is a button:
 * Enter or a click asks for its lineage.
 *
 * `<kv-figure [value]="slope.estimate" [low]="slope.low" [high]="slope.high" kind="plain" figure="slope.0"
 *   (opened)="lineage.open({ fitId }, $event)" />`
 */
@Component({
  selector: 'kv-figure',
  imports: [NgTemplateOutlet],
  template: `
    @if (figure(); as key) {
      <button
        type="button"
        aria-haspopup="dialog"
        [title]="'Exactly ' + full() + '. Select to see how it came about.'"
        (click)="opened.emit(key)"
      >
        <ng-container [ngTemplateOutlet]="text" />
      </button>
    } @else {
      <span [title]="full()"><ng-container [ngTemplateOutlet]="text" /></span>
    }
    <ng-template #text
      ><span class="value">{{ sign() }}{{ valueText() }}</span>
      @if (boundsText(); as bounds) {
        <span class="bounds">&ngsp;{{ bounds }}</span>
      }
    </ng-template>
  `,
  styleUrl: './figure.css',
  host: { class: 'kv-number', '[class.beside-parentheses]': 'leavesRoom()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Figure {
  readonly #numbers = inject(NumberFormat);

  /** In the panel's unit when it is money. */
  readonly value = input.required<number | null>();
  /** Bounds of the interval; leave both out for a bare figure. Null says that there is no interval. */
  readonly low = input<number | null>();
  readonly high = input<number | null>();
  /** Which bounds do not exist because nothing there is ruled out. */
  readonly unbounded = input<'low' | 'high' | 'both'>();
  readonly kind = input<FigureKind>('money');
  /** Digits after the point, to align a column: NumberFormat.columnDigits(values). */
  readonly digits = input<number>();
  /** Writes a plus sign before a positive figure, for differences and slopes. */
  readonly hasPlus = input(false);
  /** The figure's key in its fit's lineage. */
  readonly figure = input<string>();

  readonly opened = output<string>();

  protected readonly full = computed(() => this.#numbers.full(this.value(), this.kind()));
  protected readonly sign = computed(() => {
    const value = this.value();
    return this.hasPlus() && value !== null && value > 0 ? '+' : '';
  });
  protected readonly valueText = computed(() =>
    this.#numbers.figure(this.value(), this.kind(), this.digits()),
  );
  /** In a column of parentheses a positive figure leaves room for one, so that the digits align. */
  protected readonly leavesRoom = computed(
    () => this.#numbers.negatives() === 'parentheses' && !this.valueText().endsWith(')'),
  );
  protected readonly boundsText = computed(() => {
    const [estimate, low, high] = [this.value(), this.low(), this.high()];
    if (estimate === null || low === undefined || high === undefined) return '';
    const value = { estimate, low, high, unbounded: this.unbounded() };
    const bounds = this.#numbers.bounds(value, this.kind(), this.digits());
    return low === null && high === null ? bounds : `(${bounds})`;
  });
}
