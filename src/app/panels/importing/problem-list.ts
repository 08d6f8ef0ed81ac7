import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { Mark } from '../../ui/mark';
import { sentence } from '../../ui/phrases';

/** What keeps a part of the entries from being read, a line each. */
@Component({
  selector: 'kv-problem-list',
  imports: [Mark],
  template: `
    @if (problems().length > 0) {
      <div role="alert">
        <ul class="problems">
          @for (words of problems(); track $index) {
            <li><kv-mark kind="error" />{{ asSentence(words) }}</li>
          }
        </ul>
      </div>
    }
  `,
  styleUrl: './entries.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProblemList {
  readonly problems = input.required<readonly string[]>();

  protected asSentence(words: string): string {
    return sentence(words.charAt(0).toUpperCase() + words.slice(1));
  }
}
