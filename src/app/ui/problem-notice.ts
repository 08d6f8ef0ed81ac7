import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { Mark } from './mark';
import type { ShownProblem } from './problem';

/** A problem in its place on the page: what was wanted, what was found, where, what to do. */
@Component({
  selector: 'kv-problem-notice',
  imports: [Mark],
  template: `
    <kv-mark kind="error" />
    <div class="words">
      <p class="title">{{ problem().title }}</p>
      @if (problem().detail; as detail) {
        <p>{{ detail }}</p>
      }
      @if (problem().places; as places) {
        <ul>
          @for (place of places; track $index) {
            <li>{{ place }}</li>
          }
        </ul>
      }
      @if (problem().whatToDo; as advice) {
        <p>{{ advice }}</p>
      }
      @if (problem().requestId; as id) {
        <p class="kv-caption">
          Request <span class="kv-number">{{ id }}</span>
        </p>
      }
      <p class="actions">
        @if (canRetry()) {
          <button type="button" class="kv-link" (click)="retried.emit()">Try again</button>
        }
        @if (canDismiss()) {
          <button type="button" class="kv-link" (click)="dismissed.emit()">Close</button>
        }
        <ng-content />
      </p>
    </div>
  `,
  styles: `
    :host {
      display: flex;
      gap: 12px;
      padding-block: 8px;
    }
    .title {
      font-weight: 500;
    }
    ul {
      padding-inline-start: 16px;
    }
    .actions {
      display: flex;
      flex-wrap: wrap;
      gap: 16px;
    }
    .actions:empty {
      display: none;
    }
    .words {
      display: grid;
      gap: 4px;
      min-inline-size: 0;
      overflow-wrap: anywhere;
    }
  `,
  host: { role: 'alert' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProblemNotice {
  readonly problem = input.required<ShownProblem>();
  readonly canRetry = input(false);
  readonly canDismiss = input(false);
  readonly retried = output();
  readonly dismissed = output();
}
