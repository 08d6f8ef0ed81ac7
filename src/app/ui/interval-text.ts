import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { type FigureKind, NumberFormat, tableDigits } from './number-format';

/** An estimate in a sentence: `2,407 (1,275 to 3,539)`. */
@Component({
  selector: 'kv-interval-text',
  template: '{{ text() }}',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class IntervalText {
  readonly #numbers = inject(NumberFormat);

  readonly value = input.required<{
    readonly estimate: number;
    readonly low: number | null;
    readonly high: number | null;
  }>();
  readonly kind = input<FigureKind>('money');
  /** 4 in tables, 3 in headlines. */
  readonly significant = input(tableDigits);

  protected readonly text = computed(() =>
    this.#numbers.interval(this.value(), this.kind(), this.significant()),
  );
}
