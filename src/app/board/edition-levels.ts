import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import type { EditionContent } from '@contract';
import { GapPath } from '../charts/gap-path/gap-path';
import { StandingChart } from '../charts/standing-chart/standing-chart';
import {
  asDifference,
  asShownGaps,
  differenceKind,
  differenceUnit,
  levelKind,
  levelUnit,
} from '../ui/model-form';
import { NumberFormat } from '../ui/number-format';
import { shareText, takenOut } from './edition-words';

/** Where every company of an edition stands, and how the own company's gap to its peers went over the years. */
@Component({
  selector: 'kv-edition-levels',
  imports: [GapPath, StandingChart],
  template: `
    <kv-standing-chart
      [text]="levelsText()"
      [intercepts]="content().fit.intercepts"
      [kind]="levelKind()"
      [ownCompany]="content().ownCompany"
      [meanOfPeers]="meanOfPeers()"
      (companySelected)="openCompany($event)"
    >
      <h2 chartHeading>{{ levelsText().title }}</h2>
    </kv-standing-chart>
    @if (gapPath(); as path) {
      <kv-gap-path
        [text]="gapText()"
        [years]="path"
        [standing]="standing()"
        [kind]="differenceKind()"
        (yearSelected)="figureOpened.emit('gap.' + $event)"
      >
        <h2 chartHeading>{{ gapText().title }}</h2>
      </kv-gap-path>
    }
  `,
  styles: `
    :host {
      display: grid;
      grid-template-columns: minmax(0, 1fr) minmax(0, 1fr);
      gap: 24px 32px;
      align-items: start;
    }
    @media (width < 960px) {
      :host {
        grid-template-columns: minmax(0, 1fr);
      }
    }
    @media print {
      :host {
        grid-template-columns: minmax(0, 1fr) minmax(0, 1fr);
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EditionLevels {
  readonly #numbers = inject(NumberFormat);

  readonly content = input.required<EditionContent>();
  /** The key of the figure whose lineage is wanted. */
  readonly figureOpened = output<string>();

  readonly #source = computed(() => {
    const { number, fit } = this.content();
    return `Edition ${number}, fit ${fit.hash.slice(0, 6)}`;
  });
  readonly #form = computed(() => this.content().fit.specification.form);
  readonly #confidence = computed(
    () => `${shareText(this.content().fit.specification.confidence)} intervals`,
  );
  protected readonly levelKind = computed(() => levelKind(this.#form()));
  protected readonly differenceKind = computed(() => differenceKind(this.#form()));
  protected readonly standing = computed(() => {
    const { standing } = this.content().fit;
    return standing === null ? null : asDifference(standing, this.#form());
  });
  protected readonly gapPath = computed(() =>
    asShownGaps(this.content().fit.gapPath, this.#form()),
  );
  protected readonly levelsText = computed(() => ({
    title: `Company levels${this.#form() === 'log' ? ' in logs' : ''}, ${takenOut(this.content())} taken out`,
    caption: `${levelUnit(this.#form(), this.#numbers)} · ${this.#confidence()}`,
    source: this.#source(),
  }));
  protected readonly gapText = computed(() => ({
    title: 'Gap to the peers, year by year',
    caption: `${differenceUnit(this.#form(), this.#numbers)} · ${this.#confidence()}`,
    source: this.#source(),
  }));
  protected readonly meanOfPeers = computed(() => {
    const { intercepts, standing } = this.content().fit;
    const own = intercepts.find(({ company }) => company === standing?.company);
    return own === undefined || standing === null ? null : own.estimate - standing.estimate;
  });

  protected openCompany(company: string): void {
    const index = this.content().fit.intercepts.findIndex((each) => each.company === company);
    if (index !== -1) this.figureOpened.emit(`intercept.${index}`);
  }
}
