import { DestroyRef, Directive, ElementRef, afterNextRender, inject, signal } from '@angular/core';

/**
 * Marks the region of a table that is wider than what can be seen of it: `data-more` names the sides on which it goes
 * on, `start`, `end` or both; the styles shade them.
 */
@Directive({
  selector: '[kvTableScroll]',
  host: { '[attr.data-more]': 'more()', '(scroll)': 'look()' },
})
export class TableScroll {
  readonly #region = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;

  protected readonly more = signal<'start' | 'end' | 'start end' | null>(null);

  constructor() {
    const observer = new ResizeObserver(() => {
      this.look();
    });
    afterNextRender(() => {
      for (const watched of [this.#region, ...this.#region.children]) observer.observe(watched);
    });
    inject(DestroyRef).onDestroy(() => {
      observer.disconnect();
    });
  }

  protected look(): void {
    const { scrollLeft, clientWidth, scrollWidth } = this.#region;
    const isBefore = scrollLeft > 1;
    const isAfter = scrollLeft + clientWidth < scrollWidth - 1;
    this.more.set(isBefore && isAfter ? 'start end' : isBefore ? 'start' : isAfter ? 'end' : null);
  }
}
