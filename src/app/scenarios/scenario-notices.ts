import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { Mark } from '../ui/mark';
import { ProblemNotice } from '../ui/problem-notice';
import { ScenarioStore } from './scenario-store';

/** What the person has to know about the plan on the page and the one that is stored. */
@Component({
  selector: 'kv-scenario-notices',
  imports: [DatePipe, Mark, ProblemNotice],
  template: `
    @if (store.problem(); as problem) {
      <kv-problem-notice
        [problem]="problem.shown"
        [canDismiss]="true"
        (dismissed)="store.dismissProblem()"
      />
    }
    @if (store.restoredAt(); as at) {
      <p role="status">
        <kv-mark kind="caution" /> Your unsaved plan of {{ at | date: 'd MMM, HH:mm' }} is back.
        <button type="button" class="kv-link" (click)="store.discard()">Discard the draft</button>
      </p>
    }
    @if (store.confirmation(); as confirmation) {
      <p role="status">
        @if (confirmation.kind === 'agrees') {
          <kv-mark kind="fine" /> Saved as version {{ confirmation.version }}. The server computed
          the same figures.
        } @else {
          <kv-mark kind="error" /> Saved as version {{ confirmation.version }}, but the server
          computed other figures for {{ yearsText(confirmation.years) }} than this page showed. The
          stored figures are the server’s. Load the page again before you use them.
        }
      </p>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 4px;
    }
    :host:empty {
      display: none;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ScenarioNotices {
  protected readonly store = inject(ScenarioStore);

  protected yearsText(years: readonly number[]): string {
    return years.map((year) => `FY${year}`).join(', ');
  }
}
