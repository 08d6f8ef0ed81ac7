import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  Injector,
  afterNextRender,
  computed,
  inject,
  input,
  signal,
  viewChild,
} from '@angular/core';
import { DatePipe } from '@angular/common';
import { type EditionBlock, apiRoutes, mayCall } from '@contract';
import type { ApiProblem } from '../api/api-problem';
import { SessionStore } from '../api/session-store';
import { ProblemNotice } from '../ui/problem-notice';
import { EditionStore } from './edition-store';
import { blockWords } from './edition-words';

/**
 * What was said about one part of an edition, and a way to say more; for analysts and the CFO. Nothing in a preview,
 * which has no edition yet.
 */
@Component({
  selector: 'kv-block-comments',
  imports: [DatePipe, ProblemNotice],
  template: `
    @if (mayComment()) {
      @if (thread().length > 0) {
        <ul [attr.aria-label]="'Comments on ' + words()">
          @for (comment of thread(); track comment.id) {
            <li>
              <span class="kv-caption">
                {{ comment.by }}, {{ comment.at | date: 'd MMM y, HH:mm' }}, edition
                {{ comment.editionNumber }}
              </span>
              <span class="text">{{ comment.text }}</span>
            </li>
          }
        </ul>
      }
      @if (isWriting()) {
        <form class="kv-no-print" (submit)="$event.preventDefault(); send()">
          <label [attr.for]="'kv-comment-' + block()">Comment on {{ words() }}</label>
          <textarea
            #box
            rows="3"
            maxlength="4000"
            [id]="'kv-comment-' + block()"
            [value]="text()"
            (input)="text.set(box.value)"
            (keydown.escape)="close()"
          ></textarea>
          @if (problem(); as found) {
            <kv-problem-notice [problem]="found.shown" />
          }
          <p>
            <button type="submit" class="kv-link" [disabled]="isEmpty() || isSending()">
              Send the comment
            </button>
            <button type="button" class="kv-link" (click)="close()">Leave it</button>
          </p>
        </form>
      } @else {
        <button
          #opener
          type="button"
          class="kv-link opener kv-no-print"
          [attr.aria-label]="'Comment on ' + words()"
          (click)="open()"
        >
          {{ thread().length > 0 ? 'Answer' : 'Comment' }}
        </button>
      }
    }
  `,
  styleUrl: './block-comments.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BlockComments {
  readonly #injector = inject(Injector);
  readonly #sessions = inject(SessionStore);
  readonly #store = inject(EditionStore, { optional: true });

  readonly block = input.required<EditionBlock>();

  private readonly box = viewChild<ElementRef<HTMLTextAreaElement>>('box');
  private readonly opener = viewChild<ElementRef<HTMLButtonElement>>('opener');

  protected readonly isWriting = signal(false);
  protected readonly isSending = signal(false);
  protected readonly text = signal('');
  protected readonly problem = signal<ApiProblem | null>(null);
  protected readonly isEmpty = computed(() => this.text().trim() === '');
  protected readonly words = computed(() => blockWords[this.block()]);
  protected readonly mayComment = computed(
    () => this.#store !== null && mayCall(apiRoutes.commentEdition, this.#sessions.roles()),
  );
  protected readonly thread = computed(() => {
    const view = this.#store?.view();
    return view?.kind === 'ready'
      ? view.reply.comments.filter(({ block }) => block === this.block())
      : [];
  });

  protected open(): void {
    this.isWriting.set(true);
    this.#focusNext(() => this.box());
  }

  protected close(): void {
    this.isWriting.set(false);
    this.problem.set(null);
    this.#focusNext(() => this.opener());
  }

  protected async send(): Promise<void> {
    if (this.#store === null || this.isEmpty() || this.isSending()) return;
    this.isSending.set(true);
    const found = await this.#store.comment({ block: this.block(), text: this.text().trim() });
    this.isSending.set(false);
    this.problem.set(found);
    if (found !== null) return;
    this.text.set('');
    this.close();
  }

  #focusNext(found: () => ElementRef<HTMLElement> | undefined): void {
    afterNextRender(() => found()?.nativeElement.focus(), { injector: this.#injector });
  }
}
