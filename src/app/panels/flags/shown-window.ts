import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  computed,
  inject,
  linkedSignal,
  viewChild,
} from '@angular/core';
import { counted, yearsText } from '../../ui/phrases';
import { FlagsStore } from './flags-store';

/** Says above the rows that only some companies and years are shown, and leads back to all; else it takes no room. */
@Component({
  selector: 'kv-shown-window',
  template: `
    <p #line tabindex="-1">
      {{ words() }}
      @if (store.only() !== null) {
        <button type="button" class="kv-link" (click)="showAll()">
          Show all companies and years
        </button>
      }
    </p>
  `,
  host: { '[hidden]': "words() === ''" },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ShownWindow {
  protected readonly store = inject(FlagsStore);

  private readonly line = viewChild.required<ElementRef<HTMLElement>>('line');

  /** Whether all are shown again by the button here. */
  readonly #isBack = linkedSignal({ source: this.store.only, computation: () => false });
  protected readonly words = computed(() => {
    const only = this.store.only();
    if (only === null) return this.#isBack() ? 'All companies and years are shown.' : '';
    const who = counted(only.companies.length, 'company', 'companies');
    return `Only the fully covered ${who}, ${yearsText(only.firstYear, only.lastYear)}, are shown.`;
  });

  /** The line stays for the focus, which the button had. */
  protected showAll(): void {
    this.store.showAll();
    this.#isBack.set(true);
    this.line().nativeElement.focus();
  }
}
