import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { NumberFormat } from './number-format';

/** Long work that does not block the page: what is done, of how much, and the way to stop it. */
@Component({
  selector: 'kv-progress-line',
  template: `
    <p role="status">{{ text() }}</p>
    <progress [attr.value]="share()" max="1" [attr.aria-label]="phase()"></progress>
    @if (canCancel()) {
      <button type="button" class="kv-link" (click)="cancelled.emit()">Cancel</button>
    }
  `,
  styles: `
    :host {
      display: grid;
      grid-template-columns: 1fr auto;
      align-items: center;
      gap: 4px 16px;
    }
    p {
      font-variant-numeric: tabular-nums;
    }
    progress {
      appearance: none;
      grid-row: 2;
      inline-size: 100%;
      block-size: 4px;
      border: 0;
      background: var(--kv-hairline);
      accent-color: var(--kv-spruce);
    }
    progress::-webkit-progress-bar {
      background: var(--kv-hairline);
    }
    progress::-webkit-progress-value {
      background: var(--kv-spruce);
    }
    progress::-moz-progress-bar {
      background: var(--kv-spruce);
    }
    .kv-link {
      grid-row: 1 / span 2;
      grid-column: 2;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProgressLine {
  readonly #numbers = inject(NumberFormat);

  /** What is being done, in words: `Estimating without each company in turn`. */
  readonly phase = input.required<string>();
  readonly done = input<number>();
  readonly total = input<number>();
  readonly canCancel = input(false);

  readonly cancelled = output();

  protected readonly share = computed(() => {
    const [done, total] = [this.done(), this.total()];
    return done === undefined || !total ? null : Math.min(1, done / total);
  });
  protected readonly text = computed(() => {
    const [done, total] = [this.done(), this.total()];
    if (done === undefined || !total) return this.phase();
    const counts = [done, total].map((count) => this.#numbers.headline(count, 'count'));
    return `${this.phase()}: ${counts.join(' of ')}`;
  });
}
