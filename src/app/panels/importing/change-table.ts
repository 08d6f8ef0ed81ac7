import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
} from '@angular/core';
import type { CellDifference, ImportChanges, ImportMapping } from '@contract';
import { NumberFormat } from '../../ui/number-format';
import { changeWords, moneyWords } from './check-words';

const shownAtOnce = 50;

const rowWords = {
  'added-row': 'row comes',
  'removed-row': 'row goes',
  'changed-cell': '',
} as const;

/** What bringing the file in would change in the newest version of the panel, cell by cell. */
@Component({
  selector: 'kv-change-table',
  template: `
    <p>{{ words() }}</p>
    @if (changes().listed.length > 0) {
      <div class="kv-table-scroll" tabindex="0" role="region" aria-label="What would change">
        <table class="kv-table">
          <caption>
            Figures as the panel would hold them;
            {{
              money()
            }}
          </caption>
          <thead>
            <tr>
              <th scope="col">Company</th>
              <th scope="col">Year</th>
              <th scope="col">Column</th>
              <th scope="col" class="kv-number">Before</th>
              <th scope="col" class="kv-number">After</th>
            </tr>
          </thead>
          <tbody>
            @for (each of shown(); track $index) {
              <tr>
                <th scope="row">{{ each.company }}</th>
                <td>{{ each.year }}</td>
                <td>{{ each.column ?? rowWords[each.kind] }}</td>
                <td class="kv-number">{{ figure(each, each.before) }}</td>
                <td class="kv-number">{{ figure(each, each.after) }}</td>
              </tr>
            }
          </tbody>
        </table>
      </div>
      @if (hidden() > 0) {
        <button type="button" class="kv-link" (click)="limit.set(limit() + 50)">
          Show more of the other {{ hidden() }}
        </button>
      }
      @if (unlisted() > 0) {
        <p class="kv-caption">
          The first {{ changes().listed.length }} are listed; {{ unlisted().toLocaleString('en') }}
          more are counted above.
        </p>
      }
    }
  `,
  styleUrl: './entries.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ChangeTable {
  readonly #numbers = inject(NumberFormat);

  readonly changes = input.required<ImportChanges>();

  readonly mapping = input.required<Partial<ImportMapping>>();

  protected readonly rowWords = rowWords;
  protected readonly money = computed(() => moneyWords(this.mapping()));
  protected readonly words = computed(() => changeWords(this.changes()));
  protected readonly limit = linkedSignal({
    source: this.changes,
    computation: () => shownAtOnce,
  });
  protected readonly shown = computed(() => this.changes().listed.slice(0, this.limit()));
  protected readonly hidden = computed(() => this.changes().listed.length - this.shown().length);
  protected readonly unlisted = computed(() => {
    const { addedRows, removedRows, changedCells, listed } = this.changes();
    return addedRows + removedRows + changedCells - listed.length;
  });

  protected figure({ column }: CellDifference, value: number | null): string {
    return column === null ? '' : this.#numbers.figure(value, 'plain');
  }
}
