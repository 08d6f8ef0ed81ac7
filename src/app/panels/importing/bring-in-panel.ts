import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { ProblemNotice } from '../../ui/problem-notice';
import { ProgressLine } from '../../ui/progress-line';
import { BringInStore } from './bring-in-store';
import { FileDrop } from './file-drop';

/** The one step that a panel begins with: a file, or the sample. */
@Component({
  selector: 'kv-bring-in-panel',
  imports: [FileDrop, ProblemNotice, ProgressLine],
  template: `
    @let view = store.view();
    <kv-file-drop [isBusy]="view.kind === 'sending'" (fileTaken)="store.upload($event)" />
    @if (view.kind === 'failed') {
      <kv-problem-notice [problem]="view.problem" />
    }
    @if (view.kind === 'sending') {
      @if (view.share !== null && view.share < 1) {
        <kv-progress-line
          [phase]="'Sending ' + view.what"
          [done]="percent(view.share)"
          [total]="100"
        />
      } @else {
        <p class="late" role="status">Reading {{ view.what }}…</p>
      }
    }
    @if (hasSample()) {
      <p>
        No file at hand?
        <button
          type="button"
          class="kv-link"
          [disabled]="view.kind === 'sending'"
          (click)="store.openSample()"
        >
          Open the sample panel
        </button>
        of 14 invented companies over 18 years.
      </p>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 16px;
      max-inline-size: 640px;
    }
    .kv-link {
      text-decoration: underline;
      text-underline-offset: 2px;
    }
    .late {
      animation: kv-appear 0s 1s both;
    }
    @keyframes kv-appear {
      from {
        visibility: hidden;
      }
    }
  `,
  providers: [BringInStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BringInPanel {
  protected readonly store = inject(BringInStore);

  readonly hasSample = input(true);

  protected percent(share: number): number {
    return Math.round(100 * share);
  }
}
