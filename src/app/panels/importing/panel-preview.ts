import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { ImportCheck, ImportMapping } from '@contract';
import { NumberFormat } from '../../ui/number-format';
import { moneyWords } from './check-words';

/** The first rows as the panel would hold them: converted, renamed, in calendar years. */
@Component({
  selector: 'kv-panel-preview',
  template: `
    <div class="kv-table-scroll" tabindex="0" role="region" aria-label="First rows of the panel">
      <table class="kv-table">
        <caption>
          {{
            caption()
          }}
        </caption>
        <thead>
          <tr>
            <th scope="col">Company</th>
            <th scope="col">Year</th>
            @for (column of columns(); track column) {
              <th scope="col" class="kv-number">{{ column }}</th>
            }
            <th scope="col" class="kv-number">Line</th>
          </tr>
        </thead>
        <tbody>
          @for (each of rows(); track $index) {
            <tr>
              <th scope="row">{{ each.company }}</th>
              <td>{{ each.year }}</td>
              @for (text of each.texts; track $index) {
                <td class="kv-number">{{ text }}</td>
              }
              <td class="kv-number">{{ each.row }}</td>
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
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PanelPreview {
  readonly #numbers = inject(NumberFormat);

  readonly check = input.required<ImportCheck>();
  readonly mapping = input.required<Partial<ImportMapping>>();

  protected readonly caption = computed(
    () => `First rows as the panel would hold them; ${moneyWords(this.mapping())}`,
  );
  protected readonly columns = computed(() => {
    const { marketValue, capex, bookEquity, others = [] } = this.mapping();
    return [marketValue ?? '', capex ?? '', bookEquity ?? '', ...others];
  });
  protected readonly rows = computed(() => {
    const rows = this.check().firstRows.slice(0, 8);
    const digits = this.columns().map((_, column) =>
      this.#numbers.columnDigits(
        rows.map(({ values }) => values[column] ?? null),
        'plain',
      ),
    );
    return rows.map(({ row, company, year, values }) => ({
      row,
      company,
      year,
      texts: values.map((value, column) => this.#numbers.figure(value, 'plain', digits[column])),
    }));
  });
}
