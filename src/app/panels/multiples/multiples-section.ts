import {
  ChangeDetectionStrategy,
  Component,
  computed,
  input,
  linkedSignal,
  output,
  signal,
} from '@angular/core';
import type { PanelColumn } from '@contract';
import type { CompanySeries } from '@figures';
import type { ChartText } from '../../charts/chart-text';
import {
  type ChosenFigure,
  CompanyMultiples,
  type MultiplesVariable,
} from '../../charts/company-multiples/company-multiples';
import { counted, yearsText } from '../../ui/phrases';
import { cellKey } from '../editing/panel-edits';
import type { CellFlags } from '../editing/row-filter';
import type { WantedPlace } from '../flags/panel-check';
import { modelColumns } from '../flags/panel-cells';
import { span } from '../panel-gaps';
import { type PanelRow, columnTitle, kindOf } from '../panel-rows';

const companiesAtOnce = 24;

/** Every company's figures over time: searched, and turned over by the two dozen where there are more. */
@Component({
  selector: 'kv-multiples-section',
  imports: [CompanyMultiples],
  templateUrl: './multiples-section.html',
  styleUrl: './multiples-section.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MultiplesSection {
  readonly rows = input.required<readonly PanelRow[]>();
  readonly columns = input.required<readonly PanelColumn[]>();
  readonly flags = input.required<CellFlags>();
  readonly ownCompany = input<string | null>(null);
  /** Where the figures come from, for the export. */
  readonly source = input.required<string>();

  readonly placeWanted = output<WantedPlace>();

  protected readonly atOnce = companiesAtOnce;
  protected readonly scale = signal<'common' | 'own'>('own');
  protected readonly search = signal('');
  /** Empty for all of the model's variables. */
  protected readonly chosen = signal('');

  readonly #model = computed(() => modelColumns(this.columns()));
  protected readonly titles = computed(() =>
    this.#model().map((column) => columnTitle(this.columns()[column])),
  );
  /** Positions of the columns that are shown. */
  readonly #shownColumns = computed(() => {
    const place = this.titles().indexOf(this.chosen());
    return place === -1 ? this.#model() : [this.#model()[place]];
  });
  protected readonly variables = computed((): readonly MultiplesVariable[] =>
    this.#shownColumns().map((column) => ({
      name: columnTitle(this.columns()[column]).toLowerCase(),
      kind: kindOf(this.columns()[column]),
    })),
  );
  protected readonly years = computed(() => span(this.rows().map(({ year }) => year)));
  readonly #rowsOf = computed(() => {
    const rows = new Map<string, PanelRow[]>();
    for (const row of this.rows()) {
      const list = rows.get(row.company);
      if (list === undefined) rows.set(row.company, [row]);
      else list.push(row);
    }
    return rows;
  });
  protected readonly all = computed(() => this.#rowsOf().size);
  /** The own company first. */
  protected readonly found = computed(() => {
    const [own, wanted] = [this.ownCompany(), this.search().trim().toLowerCase()];
    // One collator for all: asked name by name, a panel of thousands takes long to sort.
    const { compare } = new Intl.Collator('en');
    return [...this.#rowsOf().keys()]
      .filter((company) => company.toLowerCase().includes(wanted))
      .sort((left, right) => Number(right === own) - Number(left === own) || compare(left, right));
  });
  protected readonly first = linkedSignal({ source: this.found, computation: () => 0 });
  readonly #shown = computed(() =>
    this.found().slice(this.first(), this.first() + companiesAtOnce),
  );
  protected readonly series = computed((): readonly CompanySeries[] => {
    const [columns, flags] = [this.#shownColumns(), this.flags()];
    return this.#shown()
      .flatMap((company) => this.#rowsOf().get(company) ?? [])
      .map(({ company, year, values }) => ({
        company,
        year,
        values: columns.map((column) => values[column]),
        flagged: columns.flatMap((column, variable) =>
          flags
            .get(cellKey({ company, year, column }))
            ?.some(({ facts }) => facts.code !== 'missing') === true
            ? [variable]
            : [],
        ),
      }));
  });
  protected readonly place = computed(() => {
    const last = Math.min(this.first() + companiesAtOnce, this.found().length);
    return `${this.first() + 1} to ${last} of ${counted(this.found().length, 'company', 'companies')}`;
  });
  protected readonly text = computed((): ChartText => ({
    title: 'Every company over time',
    caption: `${this.variables()
      .map(({ name }) => name)
      .join(', ')} · ${yearsText(...this.years())}`,
    source: this.source(),
  }));

  /** At either end the button stays for the focus, and does nothing. */
  protected turn(companies: number): void {
    const first = this.first() + companies;
    if (first >= 0 && first < this.found().length) this.first.set(first);
  }

  protected choose(title: string): void {
    this.chosen.set(title);
  }

  protected open({ company, year, variable }: ChosenFigure): void {
    this.placeWanted.emit({ company, year, column: this.#shownColumns()[variable] });
  }
}
