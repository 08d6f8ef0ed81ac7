import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelectModule } from '@angular/material/select';
import { NumberFormat } from '../../ui/number-format';
import { isNarrowed, unknownValue } from './candidate-filters';
import { CandidatesStore } from './candidates-store';
import { FigureFilter } from './figure-filter';

/** Narrows the candidates by name, imported attributes, size and years covered. */
@Component({
  selector: 'kv-filter-bar',
  imports: [FigureFilter, MatFormFieldModule, MatInput, MatSelectModule],
  templateUrl: './filter-bar.html',
  styleUrl: './filter-bar.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FilterBar {
  readonly #numbers = inject(NumberFormat);
  protected readonly store = inject(CandidatesStore);

  protected readonly unit = this.#numbers.unitLabel;
  protected readonly sizeFrom = computed(() => this.#shown(this.store.filters().sizeFrom));
  protected readonly sizeTo = computed(() => this.#shown(this.store.filters().sizeTo));
  protected readonly years = computed(() => String(this.store.filters().years ?? ''));
  protected readonly isNarrowed = computed(
    () => isNarrowed(this.store.filters()) || this.store.filters().name !== '',
  );
  protected readonly count = computed(
    () =>
      `${this.store.candidates().length} of ${this.store.candidateCount()} ${this.store.candidateCount() === 1 ? 'candidate' : 'candidates'}`,
  );

  /** The button leaves with the filters: the focus goes to the first of their fields. */
  protected showAll(nameBox: HTMLElement): void {
    this.store.showAll();
    nameBox.focus();
  }

  protected chosen(header: string): readonly string[] {
    return this.store.filters().attributes[header] ?? [];
  }

  protected choose(header: string, values: unknown): void {
    if (!Array.isArray(values)) return;
    const attributes = { ...this.store.filters().attributes, [header]: values.map(String) };
    this.store.filter({ attributes });
  }

  protected name(value: string): string {
    return value === unknownValue ? 'not known' : value;
  }

  protected setSize(bound: 'sizeFrom' | 'sizeTo', shown: number | null): void {
    this.store.filter({ [bound]: shown === null ? null : this.#numbers.toPanelUnit(shown) });
  }

  protected setYears(years: number | null): void {
    this.store.filter({ years: years === null || years < 1 ? null : Math.ceil(years) });
  }

  /** Without thousands separators and to twelve digits, so that the unit's factor leaves no trace. */
  #shown(value: number | null): string {
    return value === null ? '' : String(Number(this.#numbers.shown(value).toPrecision(12)));
  }
}
