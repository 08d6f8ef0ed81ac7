import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { ImportReply } from '@contract';
import { type MappingEntry, columnChoices } from './mapping-entry';

/** Enough to see what a column holds, and few enough to keep the choices below in sight. */
const shownRows = 6;

/** The file's header and first rows as they stand, with line numbers and what each column is taken for. */
@Component({
  selector: 'kv-first-rows',
  template: `
    <div class="kv-table-scroll" tabindex="0" role="region" aria-label="First rows of the table">
      <table class="kv-table">
        <thead>
          <tr>
            <th scope="col" class="kv-number">Line</th>
            @for (column of columns(); track column.header) {
              <th scope="col" [class.taken]="column.taken !== ''">
                <span class="header">{{ column.header }}</span>
                <span class="use">{{ column.taken || 'left out' }}</span>
              </th>
            }
          </tr>
        </thead>
        <tbody>
          @for (row of rows(); track row.row) {
            <tr>
              <td class="kv-number line">{{ row.row }}</td>
              @for (cell of row.cells; track $index) {
                <td [class.empty]="cell === ''">{{ cell === '' ? 'empty' : cell }}</td>
              }
            </tr>
          }
        </tbody>
      </table>
    </div>
  `,
  styles: `
    :host {
      display: block;
      min-inline-size: 0;
    }
    td {
      max-inline-size: 240px;
      overflow: hidden;
      text-overflow: ellipsis;
      white-space: nowrap;
      font-family: var(--kv-figures);
    }
    td.kv-number.line,
    th.kv-number {
      inline-size: 1px;
    }
    .line,
    .empty {
      color: var(--kv-soft-ink);
    }
    th {
      white-space: nowrap;
    }
    .header {
      display: block;
      color: var(--kv-ink);
      font-weight: 500;
    }
    .taken .use {
      color: var(--kv-spruce);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FirstRows {
  readonly draft = input.required<ImportReply>();
  readonly entry = input.required<MappingEntry>();

  protected readonly rows = computed(() => this.draft().firstRows.slice(0, shownRows));
  protected readonly columns = computed(() => {
    const entry = this.entry();
    return this.draft().headers.map((header) => {
      const uses = columnChoices.filter(({ key }) => entry[key] === header);
      const taken = uses.map(({ label }) => label.toLowerCase()).join(', ');
      return { header, taken: taken || furtherUse(header, entry) };
    });
  });
}

function furtherUse(header: string, entry: MappingEntry): string {
  if (entry.others.includes(header)) return 'further figure';
  if (entry.attributes.includes(header)) return 'text about the company';
  return entry.currencyColumn === header ? 'currency of the row' : '';
}
