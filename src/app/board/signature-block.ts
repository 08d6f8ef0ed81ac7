import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { EditionReply } from '@contract';
import { Mark } from '../ui/mark';
import { shortSha } from './edition-words';

/** The foot of an edition: waits for a signature, or who signed or returned it, when, and why. */
@Component({
  selector: 'kv-signature-block',
  imports: [DatePipe, Mark, MatButton],
  template: `
    @let edition = reply().edition;
    <div class="words">
      <h2>
        @if (edition.decision; as decision) {
          <kv-mark [kind]="decision.kind === 'signed' ? 'fine' : 'caution'" />
          {{ decision.kind === 'signed' ? 'Signed' : 'Returned' }} by {{ decision.by }} on
          {{ decision.at | date: "d MMM y 'at' HH:mm" }}
        } @else {
          <kv-mark kind="caution" /> Edition {{ edition.number }} waits for a signature
        }
      </h2>
      @if (edition.decision?.comment; as comment) {
        <p class="comment">{{ comment }}</p>
      }
      @if (edition.supersededBy !== null) {
        <p>Edition {{ edition.supersededBy }} was signed later and supersedes it.</p>
      }
      @if (reply().maySign) {
        <p>
          {{ warningsText() }} Signing freezes nothing new: it puts your name and the time under
          this edition as it stands, SHA-256
          <span class="kv-number">{{ shortSha(edition.sha256) }}</span>. You did not publish it, so
          you may sign.
        </p>
      } @else if (edition.decision === null && reply().whyNot) {
        <p>{{ reply().whyNot }}</p>
      }
    </div>
    @if (reply().mayReturn) {
      <div class="actions kv-no-print">
        <button matButton="outlined" type="button" (click)="returnWanted.emit()">
          Return with a comment
        </button>
        @if (reply().maySign) {
          <button matButton="filled" type="button" (click)="signWanted.emit()">
            Sign edition {{ edition.number }}
          </button>
        }
      </div>
    }
  `,
  styles: `
    :host {
      display: flex;
      flex-wrap: wrap;
      align-items: flex-start;
      justify-content: space-between;
      gap: 16px 32px;
      padding-block-start: 16px;
      border-block-start: var(--kv-rule);
    }
    .words {
      flex: 1 1 320px;
      display: grid;
      gap: 4px;
      min-inline-size: 0;
      overflow-wrap: anywhere;
    }
    .words p {
      font-size: 13px;
    }
    .comment {
      white-space: pre-line;
    }
    .actions {
      display: flex;
      flex-wrap: wrap;
      gap: 8px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignatureBlock {
  readonly reply = input.required<EditionReply>();
  readonly signWanted = output();
  readonly returnWanted = output();

  protected readonly shortSha = shortSha;
  protected readonly warningsText = computed(() => {
    const count = this.reply().content.fit.warnings.length;
    if (count === 0) return 'The fit has no warnings.';
    return count === 1
      ? '1 warning stands above: read it first.'
      : `${count} warnings stand above: read them first.`;
  });
}
