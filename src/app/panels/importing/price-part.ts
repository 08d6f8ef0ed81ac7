import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { BlockEntry } from './block-entry';
import type { IndexEntry, MappingEntry } from './mapping-entry';
import { ProblemList } from './problem-list';
import { indexOfTable } from './rate-table';

/** Real terms, off unless chosen: the year whose prices count, and a price index by year. */
@Component({
  selector: 'kv-price-part',
  imports: [BlockEntry, ProblemList],
  template: `
    <label class="choice">
      <input
        #real
        type="checkbox"
        [checked]="entry().isReal"
        (change)="entryChanged.emit({ isReal: real.checked })"
      />
      Bring money in at the prices of one year
    </label>
    @if (entry().isReal) {
      <p>
        Money of a year is multiplied by the index of the chosen year and divided by the index of
        its own. The index stays with the panel version.
      </p>
      <div class="fields">
        <label class="field">
          Prices of the year
          <input
            #base
            inputmode="numeric"
            autocomplete="off"
            [value]="entry().baseYear"
            (change)="entryChanged.emit({ baseYear: base.value.trim() })"
          />
        </label>
      </div>
      @if (entry().index.length > 0) {
        <div class="kv-table-scroll typed" tabindex="0" role="region" aria-label="Price index">
          <table class="kv-table">
            <thead>
              <tr>
                <th scope="col">Year</th>
                <th scope="col">Index</th>
                <th scope="col"><span class="kv-visually-hidden">Remove</span></th>
              </tr>
            </thead>
            <tbody>
              @for (each of entry().index; track $index; let place = $index) {
                <tr>
                  <td>
                    <input
                      #year
                      class="short"
                      inputmode="numeric"
                      [attr.aria-label]="'Row ' + (place + 1) + ', year'"
                      [value]="each.year"
                      (change)="set(place, { year: year.value.trim() })"
                    />
                  </td>
                  <td>
                    <input
                      #value
                      inputmode="decimal"
                      [attr.aria-label]="'Row ' + (place + 1) + ', index'"
                      [value]="each.value"
                      (change)="set(place, { value: value.value.trim() })"
                    />
                  </td>
                  <td>
                    <button
                      type="button"
                      class="kv-link"
                      [attr.aria-label]="'Remove row ' + (place + 1)"
                      (click)="remove(place)"
                    >
                      Remove
                    </button>
                  </td>
                </tr>
              }
            </tbody>
          </table>
        </div>
      }
      <div class="actions">
        <button type="button" class="kv-link" (click)="add()">Add a year</button>
      </div>
      <kv-block-entry
        label="Paste a price index from a spreadsheet: year, index"
        example="2023  104.2"
        (tableTaken)="entryChanged.emit({ index: indexOfTable($event) })"
      />
      <kv-problem-list [problems]="problems()" />
    }
  `,
  styleUrls: ['./entries.css', './typed-table.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PricePart {
  readonly entry = input.required<MappingEntry>();
  readonly problems = input<readonly string[]>([]);
  readonly entryChanged = output<Partial<Pick<MappingEntry, 'isReal' | 'baseYear' | 'index'>>>();

  protected readonly indexOfTable = indexOfTable;

  protected set(place: number, change: Partial<IndexEntry>): void {
    const index = this.entry().index.map((each, at) =>
      at === place ? { ...each, ...change } : each,
    );
    this.entryChanged.emit({ index });
  }

  protected add(): void {
    const last = Number(this.entry().index.at(-1)?.year);
    const year = Number.isInteger(last) && last > 0 ? String(last + 1) : '';
    this.entryChanged.emit({ index: [...this.entry().index, { year, value: '' }] });
  }

  protected remove(place: number): void {
    this.entryChanged.emit({ index: this.entry().index.filter((_, at) => at !== place) });
  }
}
