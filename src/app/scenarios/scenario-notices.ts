import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, inject, output } from '@angular/core';
import { Mark } from '../ui/mark';
import { ProblemNotice } from '../ui/problem-notice';
import { ScenarioStore } from './scenario-store';

/** What the person has to know about the plan on the page and the one that is stored. */
@Component({
  selector: 'kv-scenario-notices',
  imports: [DatePipe, Mark, ProblemNotice],
  template: `
    @if (store.conflict(); as problem) {
      <kv-problem-notice [problem]="problem.shown">
        <button type="button" class="kv-link" (click)="copyWanted.emit()">Save as a copy</button>
        <button type="button" class="kv-link" (click)="store.openTheirs()">Open theirs</button>
      </kv-problem-notice>
    }
    @if (store.problem(); as problem) {
      <kv-problem-notice
        [problem]="problem.shown"
        [canDismiss]="true"
        (dismissed)="store.dismissProblem()"
      />
    }
    @if (store.setAside(); as mine) {
      <p role="status">
        <kv-mark kind="caution" /> You see version {{ store.ground()?.saved?.version }} by
        {{ store.ground()?.saved?.updatedBy }}. Your own plan is kept as a draft.
        <button type="button" class="kv-link" (click)="store.bringBack()">Bring back mine</button>
      </p>
    }
    @if (store.restoredAt(); as at) {
      <p role="status">
        <kv-mark kind="caution" /> Your unsaved plan of {{ at | date: 'd MMM, HH:mm' }} is back.
        @if (newerThan(at); as saved) {
          {{ saved.updatedBy }} saved version {{ saved.version }} after it.
        }
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

  readonly copyWanted = output();

  protected newerThan(draftAt: string) {
    const saved = this.store.ground()?.saved ?? null;
    return saved !== null && saved.updatedAt > draftAt ? saved : null;
  }

  protected yearsText(years: readonly number[]): string {
    return years.map((year) => `FY${year}`).join(', ');
  }
}
