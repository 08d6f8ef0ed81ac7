import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  output,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { CompanyPlane } from '../../charts/company-plane/company-plane';
import type { PlaneRow } from '../../charts/company-plane/plane-words';
import type { ChartText } from '../../charts/chart-text';
import { NumberFormat } from '../../ui/number-format';
import { counted, listed } from '../../ui/phrases';
import { CandidatesStore } from '../candidates/candidates-store';
import { NearnessStore } from '../nearness/nearness-store';
import { type PeerMeasure, modelMeasures } from '../nearness/peer-measures';
import { nearestFirst } from '../nearness/peer-nearness-of';
import type { PanelCompany } from '../peer-draft';
import { planeAxisOf, planeValue } from './plane-axes';
import { planeFinding } from './plane-finding';

/** The companies on two measures of the analyst's choice, and what to do with those selected. */
@Component({
  selector: 'kv-plane-section',
  imports: [CompanyPlane, MatButton, MatFormFieldModule, MatInput],
  templateUrl: './plane-section.html',
  styleUrl: './plane-section.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlaneSection {
  readonly #numbers = inject(NumberFormat);
  readonly #candidates = inject(CandidatesStore);
  protected readonly nearness = inject(NearnessStore);

  readonly own = input<PanelCompany>();
  /** Panel, version and years. */
  readonly source = input('');
  readonly isReadOnly = input(false);
  /** Several companies are to go to one side. */
  readonly moved = output<{
    readonly companies: readonly string[];
    readonly isIncluded: boolean;
  }>();
  /** Asks for a company's row. */
  readonly companyAsked = output<string>();

  readonly #across = signal(modelMeasures[0].key);
  readonly #up = signal(modelMeasures[3].key);
  protected readonly across = computed(() => this.#measure(this.#across(), 0));
  protected readonly up = computed(() => this.#measure(this.#up(), 3));
  protected readonly acrossAxis = computed(() => planeAxisOf(this.across(), this.#numbers));
  protected readonly upAxis = computed(() => planeAxisOf(this.up(), this.#numbers));

  readonly #members = computed(() => new Set(this.#candidates.members().map(({ name }) => name)));
  /** Own company, members and candidates as they are listed, nearest first. */
  readonly #companies = computed(() => {
    const others = [...this.#candidates.members(), ...this.#candidates.candidates()];
    const own = this.own();
    const near = nearestFirst(others, this.nearness.nearness());
    return own === undefined ? near : [own, ...near];
  });
  readonly #rows = computed((): readonly PlaneRow[] => {
    const { byCompany } = this.nearness.nearness();
    return this.#companies().map((company) => ({
      company: company.name,
      side: company === this.own() ? 'own' : this.#members().has(company.name) ? 'in' : 'out',
      x: planeValue(this.across(), company),
      y: planeValue(this.up(), company),
      distance: byCompany.get(company.name)?.distance.toFixed(2) ?? '',
      exactDistance: byCompany.get(company.name)?.distance ?? null,
    }));
  });
  protected readonly rows = computed(() =>
    this.#rows().filter(({ x, y }) => Number.isFinite(x) && Number.isFinite(y)),
  );
  protected readonly missing = computed(() => this.#rows().length - this.rows().length);
  protected readonly title = computed(() => {
    const others = this.#companies().filter((company) => company !== this.own());
    const { byCompany } = this.nearness.nearness();
    const listedOnes = new Map(
      others.flatMap(({ name }) => {
        const found = byCompany.get(name);
        return found === undefined ? [] : [[name, found] as const];
      }),
    );
    return planeFinding(this.own()?.name ?? '', others.length, { byCompany: listedOnes });
  });
  protected readonly caption = computed(() => {
    const { measures } = this.nearness.nearness();
    const how = this.nearness.scatter() === 'robust' ? ', spread robust to outliers' : '';
    return measures.length === 0
      ? ''
      : `Distance over ${listed(measures.map(({ label }) => label))}${how}`;
  });
  protected readonly text = computed((): ChartText => ({
    title: this.title(),
    caption: this.caption(),
    source: this.source(),
  }));

  /** Selected companies that are shown; a company that left the picture is no longer selected. */
  protected readonly selected = linkedSignal<readonly PlaneRow[], ReadonlySet<string>>({
    source: this.rows,
    computation: (rows, before) =>
      new Set(
        rows.map(({ company }) => company).filter((company) => before?.value.has(company) === true),
      ),
  });
  protected readonly chosen = computed(() => {
    const rows = this.rows().filter(({ company }) => this.selected().has(company));
    const on = (side: string) =>
      rows.filter((row) => row.side === side).map(({ company }) => company);
    return { all: rows.map(({ company }) => company), inside: on('in'), outside: on('out') };
  });

  protected readonly counted = counted;

  /** The buttons leave with the selection: the focus goes to the line that told it. */
  protected selectNone(told: HTMLElement): void {
    this.selected.set(new Set());
    told.focus();
  }

  protected setAcross(key: string): void {
    this.#across.set(key);
  }

  protected setUp(key: string): void {
    this.#up.set(key);
  }

  #measure(key: string, otherwise: number): PeerMeasure {
    return (
      this.nearness.measures().find((measure) => measure.key === key) ?? modelMeasures[otherwise]
    );
  }
}
