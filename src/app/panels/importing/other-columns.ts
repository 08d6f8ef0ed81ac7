import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { type Conversion, type ImportReply, type Measure, Unit } from '@contract';
import { type MappingEntry, columnChoices, freeColumns } from './mapping-entry';

export type ColumnUse = 'none' | 'figure' | 'text';
type ColumnTerms = Conversion['columns'][number];

const measures: readonly { readonly value: Measure; readonly words: string }[] = [
  { value: 'no-money', words: 'no money' },
  { value: 'flow', words: 'money over the year' },
  { value: 'stock', words: 'money at the year’s end' },
];

/** What else comes along, and the unit and kind of each column of figures. */
@Component({
  selector: 'kv-other-columns',
  templateUrl: './other-columns.html',
  styleUrls: ['./entries.css', './other-columns.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OtherColumns {
  readonly draft = input.required<ImportReply>();
  readonly entry = input.required<MappingEntry>();
  readonly entryChanged = output<Pick<MappingEntry, 'others' | 'attributes' | 'columns'>>();

  protected readonly units = Unit.options;
  protected readonly measures = measures;
  protected readonly rows = computed(() => {
    const entry = this.entry();
    const model = columnChoices
      .slice(2)
      .filter(
        ({ key }, place, choices) =>
          entry[key] !== '' &&
          !choices.slice(0, place).some((earlier) => entry[earlier.key] === entry[key]),
      )
      .map(({ key, label }) => ({ header: entry[key], role: label.toLowerCase() }));
    const free = freeColumns(this.draft().headers, entry).map((header) => ({ header, role: '' }));
    return [...model, ...free].map(({ header, role }) => ({
      header,
      role,
      isCurrency: header === entry.currencyColumn,
      use: useOf(header, role, entry),
      sample: this.#sampleOf(header),
      terms: this.#termsOf(header),
    }));
  });

  protected use(header: string, use: ColumnUse): void {
    const { others, attributes } = this.entry();
    this.#emit({
      others: use === 'figure' ? [...without(others, header), header] : without(others, header),
      attributes:
        use === 'text' ? [...without(attributes, header), header] : without(attributes, header),
    });
  }

  protected setTerms(header: string, change: Partial<ColumnTerms>): void {
    const rest = this.entry().columns.filter(({ column }) => column !== header);
    this.#emit({ columns: [...rest, { ...this.#termsOf(header), ...change }] });
  }

  #emit(change: Partial<Pick<MappingEntry, 'others' | 'attributes' | 'columns'>>): void {
    const { others, attributes, columns } = this.entry();
    this.entryChanged.emit({ others, attributes, columns, ...change });
  }

  #termsOf(header: string): ColumnTerms {
    const found = this.entry().columns.find(({ column }) => column === header);
    return found ?? { column: header, unit: null, measure: null };
  }

  #sampleOf(header: string): string {
    const { headers, firstRows } = this.draft();
    const column = headers.indexOf(header);
    const cells = firstRows.slice(0, 3).map(({ cells: row }) => row[column] || 'empty');
    return cells.join(', ');
  }
}

function useOf(
  header: string,
  role: string,
  { others, attributes }: Pick<MappingEntry, 'others' | 'attributes'>,
): ColumnUse {
  if (role !== '' || others.includes(header)) return 'figure';
  return attributes.includes(header) ? 'text' : 'none';
}

function without(names: readonly string[], name: string): string[] {
  return names.filter((one) => one !== name);
}
