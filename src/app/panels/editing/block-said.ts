import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { debounceTime } from 'rxjs';

/** Long enough that a block which is still being drawn is not told at each cell. */
const settledMs = 400;

/** Says how many cells are selected, to those who do not see it. */
@Component({
  selector: 'kv-block-said',
  template: `{{ settled() }}`,
  host: { role: 'status', class: 'kv-visually-hidden' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BlockSaid {
  /** `3 × 4 cells selected`; empty for one cell. */
  readonly size = input.required<string>();

  protected readonly settled = toSignal(toObservable(this.size).pipe(debounceTime(settledMs)), {
    initialValue: '',
  });
}
