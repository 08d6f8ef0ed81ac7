import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { ImportReply } from '@contract';
import { Mark } from '../../ui/mark';
import { ProgressLine } from '../../ui/progress-line';
import { CommitForm } from './commit-form';

/** The last step: a note, the rows being written, and what to do when that did not work. */
@Component({
  selector: 'kv-bring-in-part',
  imports: [CommitForm, Mark, ProgressLine],
  template: `
    @if (draft().state === 'committing') {
      <kv-progress-line
        phase="Writing rows"
        [done]="draft().progress?.done"
        [total]="draft().progress?.of"
        [canCancel]="!isBusy()"
        (cancelled)="cancelled.emit()"
      />
      <p class="kv-caption">
        It goes on when this page is left. After cancelling, the import stands here as it was
        checked.
      </p>
    } @else {
      @if (draft().state === 'failed') {
        <p role="alert">
          <kv-mark kind="error" /> Bringing it in did not work:
          {{ draft().failure ?? 'the server gave no reason.' }} Nothing was kept of it; it can be
          tried again.
        </p>
      }
      <p>
        The version never changes afterwards. A missing cell stays missing: it is shown as “n/a” and
        its row is left out of a fit.
      </p>
      <kv-commit-form
        [action]="action()"
        [isBusy]="isBusy()"
        (committed)="committed.emit($event)"
      />
    }
  `,
  styleUrl: './entries.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BringInPart {
  readonly draft = input.required<ImportReply>();
  /** `Bring in as version 2`. */
  readonly action = input.required<string>();
  readonly isBusy = input(false);
  readonly committed = output<string>();
  readonly cancelled = output();
}
