import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { EditionContent } from '@contract';
import { GapPath } from '../charts/gap-path/gap-path';
import { StandingChart } from '../charts/standing-chart/standing-chart';

import { labelsOf } from './edition-words';
import { listed } from '../ui/phrases';

/** Where every company of an edition stands, and how the own company's gap to its peers went over the years. */
@Component({
  selector: 'kv-edition-levels',
  imports: [GapPath, StandingChart],
  template: `
    <kv-standing-chart
      [text]="levelsText()"
      [intercepts]="content().fit.intercepts"
      [ownCompany]="content().ownCompany"
      [meanOfPeers]="meanOfPeers()"
      (companySelected)="openCompany($event)"
    >
      <h2 chartHeading>{{ levelsText().title }}</h2>
    </kv-standing-chart>
    @if (content().fit.gapPath; as path) {
      <kv-gap-path
        [text]="gapText()"
        [years]="path"
        [standing]="content().fit.standing"
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
  readonly content = input.required<EditionContent>();
  /** Unit and confidence level: `EUR m · 95 % intervals`. */
  readonly caption = input.required<string>();
  /** The key of the figure whose lineage is wanted. */
  readonly figureOpened = output<string>();

  readonly #source = computed(() => {
    const { number, fit } = this.content();
    return `Edition ${number}, fit ${fit.hash.slice(0, 6)}`;
  });
  protected readonly levelsText = computed(() => ({
    title: `Company levels, ${listed(labelsOf(this.content()))} taken out`,
    caption: this.caption(),
    source: this.#source(),
  }));
  protected readonly gapText = computed(() => ({
    title: 'Gap to the peers, year by year',
    caption: this.caption(),
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
