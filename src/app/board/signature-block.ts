import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import type { EditionReply } from '@contract';
import { Mark } from '../ui/mark';
import { counted } from '../ui/phrases';
import { shortSha } from './edition-words';

/** The foot of an edition: waits for a signature, or who signed or returned it, when, and why. */
@Component({
  selector: 'kv-signature-block',
  imports: [DatePipe, Mark, MatButton, RouterLink],
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
        @if (serious().length > 0) {
          <p role="status">{{ countText() }}</p>
        }
        @if (left() > 0) {
          <p>
            Signing is closed until each is opened.
            <button type="button" class="kv-link kv-no-print" (click)="nextWanted.emit()">
              Go to the next one
            </button>
          </p>
        } @else {
          <p>
            Signing freezes nothing new: it puts your name and the time under this edition as it
            stands, SHA-256 <span class="kv-number">{{ shortSha(edition.sha256) }}</span>. You did
            not publish it, so you may sign.
          </p>
        }
      } @else if (edition.decision === null && reply().whyNot) {
        <p>{{ reply().whyNot }}</p>
      }
    </div>
    @if (edition.state === 'returned' && mayAnswer()) {
      <div class="actions kv-no-print">
        <a
          matButton="filled"
          routerLink="/board/publish"
          [queryParams]="{ fit: reply().content.fitId, answers: edition.id }"
        >
          Answer in a new edition
        </a>
      </div>
    }
    @if (reply().mayReturn) {
      <div class="actions kv-no-print">
        <button matButton="outlined" type="button" (click)="returnWanted.emit()">
          Return with a comment
        </button>
        @if (reply().maySign) {
          <button
            matButton="filled"
            type="button"
            [disabled]="left() > 0"
            (click)="signWanted.emit()"
          >
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
  /** Whether the person may publish, and so answer a returned edition. */
  readonly mayAnswer = input(false);
  readonly signWanted = output();
  /** The person wants to go to the next serious warning that is not opened. */
  readonly nextWanted = output();
  readonly returnWanted = output();

  protected readonly shortSha = shortSha;
  protected readonly serious = computed(() =>
    this.reply().content.warnings.filter(({ isSerious }) => isSerious),
  );
  protected readonly left = computed(() => {
    const { openedWarnings } = this.reply();
    return this.serious().filter(({ id }) => !openedWarnings.includes(id)).length;
  });
  protected readonly countText = computed(() => {
    const all = this.serious().length;
    return `${all - this.left()} of ${counted(all, 'serious warning')} opened.`;
  });
}
