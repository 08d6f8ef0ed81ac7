import { DOCUMENT } from '@angular/common';
import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import type { EvidenceQuestion } from './questions';

/** Links to headings further down the page. */
@Component({
  selector: 'kv-question-list',
  template: `
    <nav class="kv-no-print" [attr.aria-label]="label()">
      <ul>
        @for (question of questions(); track question.id) {
          <li>
            <a [href]="path() + '#' + question.id" (click)="goTo($event, question.id)">
              {{ question.words }}
            </a>
          </li>
        }
      </ul>
    </nav>
  `,
  styles: `
    ul {
      display: flex;
      flex-wrap: wrap;
      gap: 0 24px;
      padding: 0;
      list-style: none;
      font-size: 13px;
    }
    a {
      display: block;
      padding-block: 4px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class QuestionList {
  readonly #document = inject(DOCUMENT);

  readonly questions = input.required<readonly EvidenceQuestion[]>();

  readonly label = input('Questions of the evidence');

  protected path(): string {
    return this.#document.location.pathname;
  }

  /** Scrolls as the browser does, past what stands over the page's head; a new tab follows the address by itself. */
  protected goTo(event: MouseEvent, id: string): void {
    if (event.ctrlKey || event.metaKey || event.shiftKey) return;
    event.preventDefault();
    const heading = this.#document.getElementById(id);
    heading?.scrollIntoView();
    heading?.focus({ preventScroll: true });
  }
}
