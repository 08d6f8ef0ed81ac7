import { DOCUMENT } from '@angular/common';
import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';

/** Leads to a heading further down the page. */
@Component({
  selector: 'kv-heading-link',
  template: `
    <a class="kv-no-print" [href]="path() + '#' + heading()" (click)="goTo($event)">{{
      words()
    }}</a>
  `,
  styles: `
    a {
      display: inline-block;
      padding-block: 4px;
      font-size: 13px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class HeadingLink {
  readonly #document = inject(DOCUMENT);

  /** Id of the heading. */
  readonly heading = input.required<string>();
  readonly words = input.required<string>();

  protected path(): string {
    return this.#document.location.pathname;
  }

  /** Scrolls as the browser does, past what stands over the page's head; a new tab follows the address by itself. */
  protected goTo(event: MouseEvent): void {
    if (event.ctrlKey || event.metaKey || event.shiftKey) return;
    event.preventDefault();
    const heading = this.#document.getElementById(this.heading());
    heading?.scrollIntoView();
    heading?.focus({ preventScroll: true });
  }
}
