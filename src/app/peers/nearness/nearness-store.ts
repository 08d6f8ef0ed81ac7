import { Injectable, computed, inject, signal } from '@angular/core';
import type { Scatter } from '@panel-data';
import { SessionStore } from '../../api/session-store';
import { PeersStore } from '../peers-store';
import { modelMeasures, peerMeasures } from './peer-measures';
import { peerNearnessOf } from './peer-nearness-of';
import { type NearnessChoice, RememberedNearness } from './remembered-nearness';

const usual: NearnessChoice = { measures: null, scatter: 'classical' };

/** How near the companies of the panel are to the own one, by the measures that the analyst lets count. */
@Injectable()
export class NearnessStore {
  readonly #peers = inject(PeersStore);
  readonly #remembered = inject(RememberedNearness);
  readonly #workspaceId = inject(SessionStore).workspace()?.id ?? '';
  readonly #choice = signal(this.#remembered.recall(this.#workspaceId) ?? usual);

  readonly scatter = computed((): Scatter => this.#choice().scatter);
  /** Every measure of the panel: the five of the model first. */
  readonly measures = computed(() => peerMeasures(this.#peers.companies()));
  /** Those that are to count. */
  readonly chosen = computed(() => {
    const keys = this.#choice().measures ?? modelMeasures.map(({ key }) => key);
    return this.measures().filter(({ key }) => keys.includes(key));
  });
  readonly nearness = computed(() =>
    peerNearnessOf({
      companies: this.#peers.companies(),
      ownCompany: this.#peers.ownCompany(),
      measures: this.chosen(),
      scatter: this.scatter(),
    }),
  );

  /** Lets a measure count, or count no longer. */
  toggle(key: string): void {
    const keys = this.chosen().map((measure) => measure.key);
    const measures = keys.includes(key) ? keys.filter((each) => each !== key) : [...keys, key];
    this.#choose({ ...this.#choice(), measures });
  }

  chooseScatter(scatter: Scatter): void {
    this.#choose({ ...this.#choice(), scatter });
  }

  #choose(choice: NearnessChoice): void {
    this.#choice.set(choice);
    this.#remembered.remember(this.#workspaceId, choice);
  }
}
