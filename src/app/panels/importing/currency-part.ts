import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { ImportCheck } from '@contract';
import { Mark } from '../../ui/mark';
import { BlockEntry } from './block-entry';
import type { MappingEntry, RateEntry } from './mapping-entry';
import { ProblemList } from './problem-list';
import { missingRateWords, ratesOfTable } from './rate-table';

const noRate: RateEntry = { currency: '', year: '', average: '', yearEnd: '' };

/** Which column names the currency of a row, and what each currency costs in the panel's. */
@Component({
  selector: 'kv-currency-part',
  imports: [BlockEntry, Mark, ProblemList],
  templateUrl: './currency-part.html',
  styleUrls: ['./entries.css', './typed-table.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CurrencyPart {
  readonly headers = input.required<readonly string[]>();
  readonly entry = input.required<MappingEntry>();
  readonly problems = input<readonly string[]>([]);
  /** What the last check found to lack a rate. */
  readonly missing = input<ImportCheck['missingRates']>([]);
  readonly entryChanged = output<Partial<Pick<MappingEntry, 'currencyColumn' | 'rates'>>>();

  protected readonly panelCurrency = computed(
    () => this.entry().currency || 'the panel’s currency',
  );
  protected readonly missingWords = computed(() => this.missing().map(missingRateWords).join('; '));
  protected readonly fields = [
    { key: 'currency', label: 'currency' },
    { key: 'year', label: 'year' },
    { key: 'average', label: 'average rate' },
    { key: 'yearEnd', label: 'year-end rate' },
  ] as const;

  protected set(place: number, key: keyof RateEntry, text: string): void {
    const rates = this.entry().rates.map((rate, at) =>
      at === place ? { ...rate, [key]: text } : rate,
    );
    this.entryChanged.emit({ rates });
  }

  protected add(): void {
    const last = this.entry().rates.at(-1);
    this.entryChanged.emit({
      rates: [...this.entry().rates, { ...noRate, currency: last?.currency ?? '' }],
    });
  }

  protected remove(place: number): void {
    this.entryChanged.emit({ rates: this.entry().rates.filter((_, at) => at !== place) });
  }

  /** Of two rates for one currency and year the pasted one counts. */
  protected paste(table: readonly (readonly string[])[]): void {
    const pasted = ratesOfTable(table);
    const keys = new Set(pasted.map(({ currency, year }) => `${currency} ${year}`));
    const rest = this.entry().rates.filter(
      ({ currency, year }) => !keys.has(`${currency} ${year}`),
    );
    this.entryChanged.emit({ rates: [...rest, ...pasted] });
  }
}
