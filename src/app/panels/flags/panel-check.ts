import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  output,
  viewChild,
} from '@angular/core';
import type { FlagDismissal, PanelVersionReply } from '@contract';
import type { CoverageCell } from '@figures';
import type { Flag } from '@panel-data';
import type { ChartText } from '../../charts/chart-text';
import { CoverageMap } from '../../charts/coverage-map/coverage-map';
import { NumberFormat } from '../../ui/number-format';
import { rowKey } from '../editing/panel-edits';
import { shorterCompanies, span } from '../panel-gaps';
import { type PanelRow, columnTitle, missingIn } from '../panel-rows';
import { withinWindow } from '../rows-within';
import { AskDismissal } from './ask-dismissal';
import { DismissalsStore } from './dismissals-store';
import { alike } from './flag-groups';
import { FlagList } from './flag-list';
import { flagLine } from './flag-words';
import { FlagsStore } from './flags-store';
import { WindowLine } from './window-line';

/** A cell, or a row where `column` is null. */
export interface WantedPlace {
  readonly company: string;
  readonly year: number;
  readonly column?: number | null;
}

/** Is the data complete and right? The map of what is there, what stands out beside it, and what is fully covered. */
@Component({
  selector: 'kv-panel-check',
  imports: [CoverageMap, FlagList, WindowLine],
  templateUrl: './panel-check.html',
  styleUrl: './panel-check.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PanelCheck {
  readonly #numbers = inject(NumberFormat);
  readonly #askDismissal = inject(AskDismissal);
  protected readonly store = inject(FlagsStore);
  protected readonly dismissals = inject(DismissalsStore);

  readonly text = input.required<ChartText>();
  readonly panel = input.required<PanelVersionReply>();
  /** As they stand, with what is not saved. */
  readonly rows = input.required<readonly PanelRow[]>();
  /** As the version has them. */
  readonly savedRows = input.required<readonly PanelRow[]>();
  readonly ownCompany = input<string | null>(null);
  readonly mayDismiss = input(false);

  readonly placeWanted = output<WantedPlace>();

  private readonly list = viewChild.required(FlagList);

  protected readonly titles = computed(() => this.panel().columns.map(columnTitle));
  /** The column that the map looks at; null for all. */
  protected readonly variable = linkedSignal<PanelVersionReply, string | null>({
    source: this.panel,
    computation: () => null,
  });
  readonly #flaggedTitles = computed(() => {
    const titles = new Map<string, Map<number, string[]>>();
    for (const list of this.store.byCell().values()) {
      const flag = list.find(({ facts }) => facts.code !== 'missing');
      if (flag === undefined) continue;
      const { company, year, column } = flag;
      const title = column === null ? 'company name' : this.titles()[column];
      const ofYear = titles.get(company) ?? new Map<number, string[]>();
      titles.set(company, ofYear.set(year, [...(ofYear.get(year) ?? []), title]));
    }
    return titles;
  });
  protected readonly cells = computed((): readonly CoverageCell[] => {
    const [flagged, titles, only] = [this.#flaggedTitles(), this.titles(), this.store.only()];
    const rows = only === null ? this.rows() : this.rows().filter(withinWindow(only));
    return rows.map((row) => ({
      company: row.company,
      year: row.year,
      missing: missingIn(row, titles),
      flagged: flagged.get(row.company)?.get(row.year) ?? [],
    }));
  });
  /** Years without a row in between are flags; this is who comes late or leaves early. */
  protected readonly shorter = computed(() => {
    const [first, last] = span(this.rows().map(({ year }) => year));
    return shorterCompanies(this.rows()).filter(
      ({ firstYear, lastYear }) => firstYear > first || lastYear < last,
    );
  });
  readonly #saved = computed(() => new Map(this.savedRows().map((row) => [rowKey(row), row])));
  protected readonly isSaved = computed((): ((flag: Flag) => boolean) => {
    if (this.rows() === this.savedRows()) return () => true;
    const saved = this.#saved();
    return (flag) =>
      flag.column === null
        ? saved.has(rowKey(flag)) === (flag.facts.code !== 'year-gap')
        : saved.get(rowKey(flag))?.values[flag.column] === flag.value;
  });

  protected lookAt(title: string): void {
    this.variable.set(title === '' ? null : title);
  }

  protected async dismiss(flag: Flag): Promise<void> {
    const from = this.list().placeOf(flag);
    const open = this.store.flags()?.open ?? [];
    const count = await this.#askDismissal.ask({
      flag,
      alike: alike(flag, open).filter(this.isSaved()),
      line: (each) => flagLine(each, this.titles(), this.#numbers),
      dismiss: (flags, reason) => this.dismissals.dismiss(flags, reason),
    });
    if (count > 0) this.list().goOnFrom(from, count);
  }

  protected async takeBack(dismissal: FlagDismissal): Promise<void> {
    const dismissed = this.store.flags()?.dismissed ?? [];
    const from = dismissed.findIndex((each) => each.dismissal.id === dismissal.id);
    if (await this.dismissals.takeBack(dismissal))
      this.list().goOnAfterTakingBack(dismissed[from].flag, from);
  }
}
