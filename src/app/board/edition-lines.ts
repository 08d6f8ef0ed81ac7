import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { EditionLine } from '@contract';
import { Mark } from '../ui/mark';
import { Sentence, type SentenceFigureWanted } from '../ui/sentence';

/** Lines of an edition, each with a mark; their figures open their lineage. */
@Component({
  selector: 'kv-edition-lines',
  imports: [Mark, Sentence],
  template: `
    <ul>
      @for (line of lines(); track $index) {
        <li>
          <kv-mark [kind]="line.kind" />
          <span>
            <span class="kv-visually-hidden">{{
              line.kind === 'fine' ? 'In order:' : 'Caution:'
            }}</span>
            <kv-sentence [sentence]="line.sentence" (opened)="opened.emit($event)" />
            @if (line.figure; as figure) {
              @if (isUnlinked(line)) {
                &ngsp;<button
                  type="button"
                  class="kv-link kv-no-print"
                  (click)="opened.emit({ figure, value: 0 })"
                >
                  See how
                </button>
              }
            }
          </span>
        </li>
      }
    </ul>
  `,
  styles: `
    ul {
      display: grid;
      gap: 8px;
      padding: 0;
      list-style: none;
    }
    li {
      display: flex;
      gap: 10px;
      font-size: 13px;
      line-height: 20px;
    }
    kv-mark {
      margin-block-start: 2px;
    }
    span {
      min-inline-size: 0;
      overflow-wrap: anywhere;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EditionLines {
  readonly lines = input.required<readonly EditionLine[]>();
  readonly opened = output<SentenceFigureWanted>();

  /** Whether no figure of the line's sentence leads to its lineage, so that a link has to. */
  protected isUnlinked({ sentence, figure }: EditionLine): boolean {
    return !sentence.some((part) => 'kind' in part && part.figure === figure);
  }
}
