import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { RouterLink } from '@angular/router';
import type { FitState } from '@contract';
import { NumberFormat } from '../ui/number-format';
import { ProblemNotice } from '../ui/problem-notice';
import { placesText, specificationText } from './fit-words';
import { FitsListStore, type ListedFit } from './fits-list-store';
import { standingOf } from './panel-money';
import { shortHash } from '../ui/phrases';

const stateWords: Readonly<Record<Exclude<FitState, 'done'>, string>> = {
  queued: 'waiting to run',
  running: 'running',
  failed: 'could not be fitted',
  cancelled: 'cancelled',
};

/** Every fit of the workspace, newest first; two of them can be compared. */
@Component({
  selector: 'kv-fit-list',
  imports: [DatePipe, MatButton, MatCheckbox, ProblemNotice, RouterLink],
  templateUrl: './fit-list.html',
  styleUrl: './fit-list.css',
  providers: [FitsListStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FitList {
  readonly #numbers = inject(NumberFormat);
  protected readonly store = inject(FitsListStore);

  /** The fit of the page, where there is one. */
  readonly shownId = input<string>();
  /** Its state: the list is read again when that changes. */
  readonly shownState = input<FitState>();

  protected readonly unit = computed(() => {
    const isAnyLog = this.rows().some(({ form }) => form === 'log');
    return `${this.#numbers.unitLabel()}${isAnyLog ? ', of fits in logs in percent' : ''}`;
  });
  protected readonly chosen = signal<readonly string[]>([]);
  protected readonly rows = computed(() => {
    const view = this.store.view();
    return view.kind === 'ready' ? view.fits.map((listed) => this.#toRow(listed)) : [];
  });
  /** In the order of the list turned round: the older one is the one compared against. */
  protected readonly compared = computed(() => {
    const chosen = this.chosen();
    const [first, second] = this.rows().filter(({ id }) => chosen.includes(id));
    return second === undefined ? null : { a: first.id, b: second.id };
  });

  constructor() {
    effect(() => {
      this.shownId();
      this.shownState();
      untracked(() => void this.store.load());
    });
  }

  protected choose(id: string, isChosen: boolean): void {
    this.chosen.update((chosen) =>
      isChosen ? [...chosen, id] : chosen.filter((other) => other !== id),
    );
  }

  #toRow({ fit, peerGroup, panelVersion }: ListedFit) {
    const { standing, rankSet } = fit;
    return {
      id: fit.id,
      name: fit.hash === null ? 'Fit' : shortHash(fit.hash),
      isDone: fit.state === 'done',
      state: fit.state === 'done' ? '' : stateWords[fit.state],
      ownCompany: fit.ownCompany,
      panel: panelVersion === undefined ? 'n/a' : `v${panelVersion.number}`,
      peers: peerGroup === undefined ? 'n/a' : `v${peerGroup.number}`,
      form: fit.form,
      specification: specificationText(fit),
      standing:
        standing === null || panelVersion === undefined
          ? 'n/a'
          : standingOf(standing, { form: fit.form, panel: panelVersion }, this.#numbers),
      places: rankSet === null ? 'n/a' : placesText(rankSet, null),
      companies: fit.companies,
      createdBy: fit.createdBy,
      createdAt: fit.createdAt,
    };
  }
}
