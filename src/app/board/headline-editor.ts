import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  computed,
  inject,
  input,
  output,
  viewChild,
} from '@angular/core';
import { MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import type { HeadlineProblem, Sentence as SentenceParts, Unit } from '@contract';
import { unitText } from '@figures';
import { Mark } from '../ui/mark';
import { NumberFormat } from '../ui/number-format';
import { Sentence, type SentenceFigureWanted } from '../ui/sentence';

/** The headline as text, with the figures it is linked to and what no figure says. */
@Component({
  selector: 'kv-headline-editor',
  imports: [Mark, MatFormField, MatHint, MatInput, MatLabel, Sentence],
  template: `
    <mat-form-field appearance="outline" subscriptSizing="dynamic">
      <mat-label>Headline</mat-label>
      <textarea
        #box
        matInput
        rows="3"
        maxlength="600"
        [value]="text()"
        [attr.aria-invalid]="problems().length > 0"
        aria-describedby="kv-headline-problems"
        (input)="textChanged.emit(box.value)"
      ></textarea>
      <mat-hint
        >Amounts in {{ unitWords() }}; every number has to be a figure of the edition</mat-hint
      >
    </mat-form-field>
    <div id="kv-headline-problems" role="status">
      @if (problems().length > 0) {
        <ul>
          @for (problem of problems(); track problem.start) {
            <li>
              <kv-mark kind="error" />
              <span
                >{{ detailOf(problem) }}
                <button
                  type="button"
                  class="kv-link"
                  [attr.aria-label]="'Go to ' + problem.found"
                  (click)="goTo(problem)"
                >
                  Go to it
                </button></span
              >
            </li>
          }
        </ul>
      } @else if (sentence(); as parts) {
        <p class="kv-caption">
          Linked figures are underlined:
          <kv-sentence [sentence]="parts" (opened)="opened.emit($event)" />
        </p>
      }
    </div>
    <p class="actions">
      <button type="button" class="kv-link" (click)="closed.emit()">Done</button>
      @if (isEdited()) {
        <button type="button" class="kv-link" (click)="madeAnew.emit()">
          As made from the figures
        </button>
      }
    </p>
  `,
  styles: `
    :host {
      display: grid;
      gap: 8px;
    }
    mat-form-field {
      inline-size: 100%;
      margin-block-start: 8px;
    }
    ul {
      display: grid;
      gap: 4px;
      padding: 0;
      list-style: none;
    }
    li {
      display: flex;
      gap: 8px;
      font-size: 13px;
    }
    li > span {
      min-inline-size: 0;
      overflow-wrap: anywhere;
    }
    .actions {
      display: flex;
      flex-wrap: wrap;
      gap: 16px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class HeadlineEditor {
  readonly #numbers = inject(NumberFormat);

  readonly text = input.required<string>();
  /** The unit that its amounts are written in. */
  readonly unit = input.required<Unit>();
  readonly isEdited = input.required<boolean>();
  /** The sentence as the server linked it. */
  readonly sentence = input<SentenceParts>();
  readonly problems = input<readonly HeadlineProblem[]>([]);

  readonly textChanged = output<string>();
  readonly madeAnew = output();
  readonly closed = output();
  readonly opened = output<SentenceFigureWanted>();

  private readonly box = viewChild.required<ElementRef<HTMLTextAreaElement>>('box');

  protected readonly unitWords = computed(() => unitText(this.#numbers.currency(), this.unit()));

  focus(): void {
    this.box().nativeElement.focus();
  }

  /** Names the place where the detail does not. */
  protected detailOf({ found, detail }: HeadlineProblem): string {
    return detail.includes(found) ? detail : `“${found}”: ${detail}`;
  }

  /** Shows the place in the text; the problem's offsets are those of the text as it was sent. */
  protected goTo({ found, start }: HeadlineProblem): void {
    const { nativeElement } = this.box();
    const from = nativeElement.value.indexOf(found, Math.max(0, start - found.length));
    nativeElement.focus();
    if (from !== -1) nativeElement.setSelectionRange(from, from + found.length);
  }
}
